import { checkSizes, listPairs, type PairResult } from './pairs'

/**
 * One-way layout: `means` and `sizes` of the groups, `error` the pooled variance (mean square within groups) on `df`
 * degrees of freedom. With unequal sizes a pair's standard error comes from the harmonic mean of its own two sizes
 * ('pair', default; Kramer 1956) or from that of all ('all').
 */
export type RangeLayout = {
  means: readonly number[]
  sizes: readonly number[]
  error: number
  df: number
  harmonic?: 'pair' | 'all'
}

/**
 * Multiple range tests: the means in order; two that are r places apart, ends counted, span r means. `pOfSpan(q, r)`
 * is the p-value of their range q = |difference| / √(error / n). A pair is rejected only where every stretch of the
 * order that holds it is: its adjusted p is the largest over these stretches. All pairs, as in `listPairs`, with q.
 * Equal means stand in input order. Throws RangeError for sizes that are no integers of at least 1, for fewer than two
 * groups, lists that differ in length, means that are no numbers, and an error that is not above 0.
 */
export function adjustBySpan(
  { means, sizes, error, harmonic = 'pair' }: RangeLayout,
  pOfSpan: (q: number, span: number) => number,
): PairResult[] {
  checkSizes(sizes)
  if (means.length !== sizes.length) throw new RangeError('means and sizes differ in number')
  if (!means.every(Number.isFinite)) throw new RangeError('each group takes a mean')
  if (!(error > 0 && error < Infinity)) throw new RangeError(`the pooled variance is above 0, not ${error}`)

  const order = means.map((mean, group) => ({ mean, group })).sort((a, b) => a.mean - b.mean)
  const rank = new Map(order.map(({ group }, position) => [group, position]))
  const overall = sizes.length / sizes.reduce((sum, n) => sum + 1 / n, 0)
  const rangeOf = (a: number, b: number) => {
    const n = harmonic === 'all' ? overall : 2 / (1 / (sizes[a] ?? NaN) + 1 / (sizes[b] ?? NaN))
    return Math.abs((means[a] ?? NaN) - (means[b] ?? NaN)) / Math.sqrt(error / n)
  }

  // adjusted[i][j]: the largest p over all stretches from i or before to j or after, widest first
  const count = order.length
  const adjusted = new Float64Array(count * count)
  for (let span = count; span >= 2; span--) {
    for (let i = 0; i + span <= count; i++) {
      const j = i + span - 1
      const p = pOfSpan(rangeOf(order[i]?.group ?? 0, order[j]?.group ?? 0), span)
      const before = i > 0 ? (adjusted[(i - 1) * count + j] ?? 0) : 0
      const after = j + 1 < count ? (adjusted[i * count + j + 1] ?? 0) : 0
      adjusted[i * count + j] = Math.max(p, before, after)
    }
  }
  return listPairs(count).map((pair) => {
    const [a, b] = pair
    const ranks = [rank.get(a) ?? 0, rank.get(b) ?? 0]
    const p = adjusted[Math.min(...ranks) * count + Math.max(...ranks)] ?? NaN
    return { pair, statistic: rangeOf(a, b), p }
  })
}
