import type { TailTest } from '../distributions/tail'
import { pBounds } from '../numbers/p-bounds'
import { roundingInterval, type Interval } from '../numbers/printed-interval'
import { pDunnettFromT } from '../procedures/dunnett'
import { pGamesHowellFromWelch } from '../procedures/games-howell'
import { pScheffeFromT } from '../procedures/scheffe'
import { pTukeyFromT } from '../procedures/tukey'
import type { Fit } from '../types'
import { fits, type FitOptions } from './fits'
import { findFirst } from './find-first'
import { SLACK } from './intervals'

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

/** Procedures over all pairs or against a control: the tests that k groups give room for, and the adjusted p of a t. */
type FromT = {
  procedure: 'tukey' | 'scheffe' | 'dunnett' | 'games-howell'
  count: (groups: number) => number
  p: (t: number, groups: number, df: number) => number
}

const allPairs = (groups: number) => (groups * (groups - 1)) / 2

const FROM_ONE_DF: readonly FromT[] = [
  { procedure: 'tukey', count: allPairs, p: pTukeyFromT },
  { procedure: 'scheffe', count: allPairs, p: pScheffeFromT },
  {
    procedure: 'dunnett',
    count: (groups) => groups - 1,
    p: (t, groups, df) => pDunnettFromT(t, groups - 1, df),
  },
]
const FROM_OWN_DF: readonly FromT[] = [
  { procedure: 'games-howell', count: allPairs, p: pGamesHowellFromWelch },
]

/**
 * As `fits`, from the printed test statistics: raw p-values over the rounding interval of each statistic; and where
 * all are two-sided t tests on at least one df, the procedures that work on t for k = 2 … `groupsMax` groups that have
 * at least as many comparisons as there are items: with one and the same df Tukey and Scheffé (m = k (k − 1) / 2) and
 * Dunnett with equal groups (m = k − 1); where the df differ or are fractions, as Welch's are, Games–Howell (m =
 * k (k − 1) / 2), over the rounding of the df too.
 * RangeError where printed values and statistics differ in number, and as `pBounds`.
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

/** One item: what is printed, its raw p, the sizes of its t, and the df that its print stands for. */
type Item = { print: Interval; raw: Interval; t: Interval; df: number[] }

function findFromT(
  printed: readonly Interval[],
  statistics: readonly PrintedStatistic[],
  raw: readonly Interval[],
  groupsMax: number,
): StatisticFit[] {
  const first = statistics[0]?.df[0]
  const twoSided = statistics.every(({ test, sides = 2 }) => test === 't' && sides === 2)
  const own = statistics.map(({ df }) => df[0] ?? NaN)
  if (first === undefined || !twoSided || !own.every((df) => df >= 1)) return []
  const alike = own.every((df) => df === first)
  const welch = !alike || !(Number.isInteger(first) || first === Infinity)

  // "6.0" arrives as 6: where others carry decimals, so does it
  const decimals = Math.max(...own.map(countDecimals))
  const items = statistics.flatMap(({ low, high }, i) => {
    const [print, p, df] = [printed[i], raw[i], own[i]]
    if (print === undefined || p === undefined || df === undefined) return []
    const least = low <= 0 && high >= 0 ? 0 : Math.min(Math.abs(low), Math.abs(high))
    const t = { low: least, high: Math.max(Math.abs(low), Math.abs(high)) }
    return [{ print, raw: p, t, df: welch ? listDf(df, decimals) : [df] }]
  })
  const candidates = [...(alike ? FROM_ONE_DF : []), ...(welch ? FROM_OWN_DF : [])]
  return candidates.flatMap((candidate) => findGroups(candidate, items, groupsMax))
}

function countDecimals(df: number): number {
  return String(df).split('.')[1]?.length ?? 0
}

/** The df as printed and, as a printed fraction, the ends of its rounding interval. */
function listDf(df: number, decimals: number): number[] {
  if (decimals === 0 || df === Infinity) return [df]
  const { low, high } = roundingInterval(df, decimals)
  return [Math.max(1, low), df, high]
}

/** Adjusted values grow with the number of groups: the numbers that fit are consecutive. */
function findGroups(
  { procedure, count, p }: FromT,
  items: readonly Item[],
  groupsMax: number,
): StatisticFit[] {
  let fewest = 2
  while (count(fewest) < items.length) fewest++
  // all but Scheffé lie between the raw p and Bonferroni's: what misses that needs no quadrature
  const within =
    (groups: number) =>
    ({ print, raw }: Item) =>
      procedure === 'scheffe' || print.low <= Math.min(1, count(groups) * raw.high) + SLACK
  const highFits = (groups: number) =>
    items.every(within(groups)) &&
    items.every(({ print, t, df }) => df.some((value) => print.low <= p(t.low, groups, value) + SLACK))
  const lowFits = (groups: number) =>
    items.every(({ print, t, df }) => df.some((value) => p(t.high, groups, value) <= print.high + SLACK))

  if (!items.every(({ print, raw }) => raw.low <= print.high + SLACK)) return []
  const from = findFirst(fewest, groupsMax, highFits)
  if (from > groupsMax) return []
  const to = findFirst(from, groupsMax, (groups) => !lowFits(groups)) - 1
  return Array.from({ length: Math.max(0, to - from + 1) }, (_, i) => ({
    procedure,
    m: count(from + i),
    groups: from + i,
  }))
}
