/**
 * The confidence that each of `m` intervals needs, so that all hold together with at least `confidence` in (0, 1): by
 * Bonferroni 1 − (1 − confidence) / m, by Šidák (independent or positively orthant dependent estimates) confidence^(1/m).
 * Example: 6 intervals at 95% need 99.17% each. Throws RangeError for confidence outside (0, 1) and m that is no
 * positive integer.
 */
export function simultaneousConfidence(
  confidence: number,
  m: number,
  procedure: 'bonferroni' | 'sidak' = 'bonferroni',
): number {
  if (!(confidence > 0 && confidence < 1)) {
    throw new RangeError(`the confidence lies between 0 and 1, not at ${confidence}`)
  }
  if (!(Number.isSafeInteger(m) && m >= 1)) throw new RangeError(`m is a positive integer, not ${m}`)
  return procedure === 'bonferroni' ? 1 - (1 - confidence) / m : confidence ** (1 / m)
}
