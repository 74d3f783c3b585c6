import type { TailTest } from '../distributions/tail'
import { pBounds } from '../numbers/p-bounds'
import type { Interval } from '../numbers/printed-interval'
import { pDunnettFromT } from '../procedures/dunnett'
import { pScheffeFromT } from '../procedures/scheffe'
import { pTukeyFromT } from '../procedures/tukey'
import type { Fit } from '../types'
import { fits, type FitOptions } from './fits'
import { meet } from './intervals'

/** A printed statistic: its rounding interval and its df as in `tail`; `sides` default 2. */
export type PrintedStatistic = {
  test: Exclude<TailTest, 'q'>
  low: number
  high: number
  df: readonly number[]
  sides?: 1 | 2
}

/** `groups` is null for procedures that know only a number of tests. */
export type StatisticFit = Fit & { groups: number | null }

/** `groupsMax`: largest number of groups tried, default 12. */
export type StatisticFitOptions = FitOptions & { groupsMax?: number }

/** Procedures that work on t statistics with one df: the tests that k groups give room for, and the adjusted p. */
const FROM_T = [
  { procedure: 'tukey', count: (k: number) => (k * (k - 1)) / 2, p: pTukeyFromT },
  { procedure: 'scheffe', count: (k: number) => (k * (k - 1)) / 2, p: pScheffeFromT },
  {
    procedure: 'dunnett',
    count: (k: number) => k - 1,
    p: (t: number, k: number, df: number) => pDunnettFromT(t, k - 1, df),
  },
] as const

/**
 * As `fits`, from the printed test statistics: raw p-values over the rounding interval of each statistic; and where
 * all are two-sided t tests with one df, also Tukey, Scheffé (m = k (k − 1) / 2) and Dunnett with equal groups
 * (m = k − 1) for k = 2 … `groupsMax` groups that have at least as many comparisons as there are items.
 */
export function fitsFromStatistics(
  printed: readonly Interval[],
  statistics: readonly PrintedStatistic[],
  options: StatisticFitOptions = {},
): StatisticFit[] {
  const raw = statistics.map(({ test, low, high, df, sides }) => pBounds(test, low, high, df, sides))
  const fromP = fits(printed, raw, options).map((fit) => ({ ...fit, groups: null }))
  return [...fromP, ...findFromT(printed, statistics, raw, options.groupsMax ?? 12)]
}

function findFromT(
  printed: readonly Interval[],
  statistics: readonly PrintedStatistic[],
  raw: readonly Interval[],
  groupsMax: number,
): StatisticFit[] {
  const df = statistics[0]?.df[0]
  const alike = statistics.every(
    ({ test, df: own, sides = 2 }) => test === 't' && sides === 2 && own[0] === df,
  )
  if (df === undefined || !alike) return []

  const sizes = statistics.map(({ low, high }) => ({
    low: low <= 0 && high >= 0 ? 0 : Math.min(Math.abs(low), Math.abs(high)),
    high: Math.max(Math.abs(low), Math.abs(high)),
  }))
  const found: StatisticFit[] = []
  for (const { procedure, count, p } of FROM_T) {
    for (let k = 2; k <= groupsMax; k++) {
      if (count(k) < statistics.length) continue
      // Tukey and Dunnett lie between the raw p and Bonferroni's: what misses that needs no quadrature.
      const bounded = procedure === 'scheffe' || isWithinBonferroni(printed, raw, count(k))
      const all =
        bounded &&
        printed.every((print, i) => {
          const size = sizes[i] ?? { low: NaN, high: NaN }
          const low = p(size.high, k, df)
          return meet(print, { low, high: 1 }) && meet(print, { low, high: p(size.low, k, df) })
        })
      if (all) found.push({ procedure, m: count(k), groups: k })
    }
  }
  return found
}

function isWithinBonferroni(printed: readonly Interval[], raw: readonly Interval[], m: number): boolean {
  return printed.every((print, i) => {
    const { low, high } = raw[i] ?? { low: NaN, high: NaN }
    return meet(print, { low, high: Math.min(1, m * high) })
  })
}
