/**
 * 1 − (1 − p)^m without cancellation: p in [0, 1], m >= 1. The probability that the smallest of m independent
 * uniform p-values is at most p.
 */
export function atLeastOneOf(m: number, p: number): number {
  return -Math.expm1(m * Math.log1p(-p))
}

/**
 * Šidák: 1 − (1 − p)^m. Controls the family-wise error rate for independent tests and for positively orthant
 * dependent ones. Source: Šidák (1967), J Am Stat Assoc 62, 626–633.
 */
export function sidak(p: number, m: number): number {
  return atLeastOneOf(m, p)
}
