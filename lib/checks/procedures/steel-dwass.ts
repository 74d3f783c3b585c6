import { studentizedRangeUpper } from '../distributions/studentized-range'
import { checkSizes, listPairs, type PairResult } from './pairs'
import { rankWithTies } from './ranks'

/**
 * Steel–Dwass–Critchlow–Fligner: all pairs (in the order of `listPairs`) of at least two `groups`, each ranked by
 * itself: q = √2 (W − E W) / √(Var W), W the rank sum of the second group, Var W corrected for ties, and p = P(Q > |q|) for
 * the range of as many normals as there are groups. Without continuity correction; q is 0 and p 1 where all values of a
 * pair are tied. Controls the family-wise error rate over all pairs of distributions of the same shape in large samples.
 * Throws RangeError for fewer than two groups, an empty one, and values that are no numbers.
 * Source: Steel (1960), Technometrics 2, 197–207; Dwass (1960), in: Contributions to Probability and Statistics,
 * 198–202; Critchlow and Fligner (1991), Commun Stat Theory Methods 20, 127–139; ties: Hollander and Wolfe (1999),
 * Nonparametric Statistical Methods, section 6.5.
 */
export function compareBySteelDwass(groups: readonly (readonly number[])[]): PairResult[] {
  checkSizes(groups.map(({ length }) => length))
  return listPairs(groups.length).map((pair) => {
    const statistic = rangeOfRanks(groups[pair[0]] ?? [], groups[pair[1]] ?? [])
    return { pair, statistic, p: studentizedRangeUpper(Math.abs(statistic), groups.length, Infinity) }
  })
}

function rangeOfRanks(first: readonly number[], second: readonly number[]): number {
  const { ranks, ties } = rankWithTies([...first, ...second])
  const total = ranks.length
  const rankSum = ranks.slice(first.length).reduce((sum, rank) => sum + rank, 0)
  const expected = (second.length * (total + 1)) / 2
  const variance = ((first.length * second.length) / 12) * (total + 1 - ties / (total * (total - 1)))
  return variance > 0 ? (Math.SQRT2 * (rankSum - expected)) / Math.sqrt(variance) : 0
}
