import { tail } from '../distributions/tail'
import { checkSizes, listPairs, type PairResult } from './pairs'
import { rankGroups } from './ranks'

/**
 * Dunn's comparisons after Kruskal–Wallis, unadjusted: all pairs (in the order of `listPairs`) with z = (R_a − R_b) /
 * √(σ² (1 / n_a + 1 / n_b)), R the mean ranks among all N values and σ² = N (N + 1) / 12 − `ties` / (12 (N − 1)), and
 * the two-sided p; adjust them by the procedure that is stated. `sizes` of the groups, `meanRanks` of the same, `ties`
 * the sum of t³ − t over groups of t tied values, default 0. z is 0 and p 1 where all values are tied. Large samples.
 * Throws RangeError for sizes that are no integers of at least 1, for fewer than two groups, for mean ranks that are
 * not as many or that do not belong to these sizes, and for ties outside [0, N³ − N].
 * Source: Dunn (1964), Technometrics 6, 241–252.
 */
export function compareByDunn(
  sizes: readonly number[],
  meanRanks: readonly number[],
  ties = 0,
): PairResult[] {
  checkSizes(sizes)
  if (meanRanks.length !== sizes.length) throw new RangeError('sizes and mean ranks differ in number')
  const total = sizes.reduce((sum, n) => sum + n, 0)
  checkMeanRanks(sizes, meanRanks, total)
  if (!(ties >= 0 && ties <= total ** 3 - total))
    throw new RangeError(`ties lie in [0, N³ − N], not at ${ties}`)

  const variance = (total * (total + 1)) / 12 - ties / (12 * (total - 1))
  return listPairs(sizes.length).map((pair) => {
    const [a, b] = pair
    const spread = Math.sqrt(variance * (1 / (sizes[a] ?? NaN) + 1 / (sizes[b] ?? NaN)))
    const difference = (meanRanks[a] ?? NaN) - (meanRanks[b] ?? NaN)
    const statistic = spread > 0 ? difference / spread : 0
    return { pair, statistic, p: tail('z', statistic, []) }
  })
}

/** The same from the values of each group. */
export function compareDataByDunn(groups: readonly (readonly number[])[]): PairResult[] {
  const sizes = groups.map(({ length }) => length)
  checkSizes(sizes)
  const { meanRanks, ties } = rankGroups(groups)
  return compareByDunn(sizes, meanRanks, ties)
}

/** Mean ranks may be rounded, but their weighted mean is (N + 1) / 2 to within half a rank. */
function checkMeanRanks(sizes: readonly number[], meanRanks: readonly number[], total: number) {
  const mean = meanRanks.reduce((sum, rank, i) => sum + rank * (sizes[i] ?? NaN), 0) / total
  if (!(Math.abs(mean - (total + 1) / 2) <= 0.5)) {
    throw new RangeError(`the mean rank of ${total} values is ${(total + 1) / 2}, not ${mean}`)
  }
}
