/** Room for rounding errors where m p meets alpha exactly, as .05/6 times 6 does. */
const SLACK = 1 + 1e-12

/** The largest integer m >= 0 with m p <= bound, Infinity for p = 0. */
function largestMultiple(p: number, bound: number): number {
  if (p === 0) return Infinity
  let m = Math.floor(bound / p)
  // From here on neighbouring integers are one and the same number.
  if (m >= Number.MAX_SAFE_INTEGER) return m
  while ((m + 1) * p <= bound * SLACK) m++
  while (m > 0 && m * p > bound * SLACK) m--
  return m
}

function checkLevel(alpha: number) {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
}

/**
 * The largest family size m at which Bonferroni keeps a p-value at `alpha`: the largest m with m p <= alpha. 0 where
 * the p-value is above alpha, Infinity for p = 0, NaN for NaN. Give the upper end of a printed p-value for what is
 * certain, the lower end for what is possible.
 */
export function survivesUpTo(p: number, alpha: number): number {
  checkLevel(alpha)
  return Number.isNaN(p) ? NaN : largestMultiple(p, alpha)
}

/**
 * For each of the p-values of a family, in input order: the largest family size at which Holm keeps it, where the
 * members that are added are larger than all given. 0 where it is not kept at the number of p-values given; NaN
 * stays NaN and does not count. Holm keeps p(i) at size m when (m − j + 1) p(j) <= alpha for every j <= i.
 */
export function survivesUpToByHolm(p: readonly number[], alpha: number): number[] {
  checkLevel(alpha)
  let most = Infinity
  return byRank(p, (value, rank) => {
    most = Math.min(most, largestMultiple(value, alpha) + rank - 1)
    return most
  })
}

/**
 * The same for Benjamini–Hochberg, which keeps p(i) at size m when m p(j) <= j alpha for some j >= i.
 */
export function survivesUpToByBh(p: readonly number[], alpha: number): number[] {
  checkLevel(alpha)
  let most = 0
  return byRank(
    p,
    (value, rank) => {
      most = Math.max(most, largestMultiple(value, rank * alpha))
      return most
    },
    true,
  )
}

/** Runs `find` over the known values by rank, upwards or from the largest down, and puts the answers in input order. */
function byRank(
  p: readonly number[],
  find: (value: number, rank: number) => number,
  downwards = false,
): number[] {
  const order = p
    .flatMap((value, i) => (Number.isNaN(value) ? [] : [{ value, i }]))
    .sort((a, b) => a.value - b.value)
  const ranked = order.map(({ value, i }, position) => ({ value, i, rank: position + 1 }))
  const answers = p.map(() => NaN)
  for (const { value, i, rank } of downwards ? ranked.reverse() : ranked) {
    const largest = find(value, rank)
    answers[i] = largest < order.length ? 0 : largest
  }
  return answers
}
