import { dunnettUpper } from '../distributions/dunnett'
import { tail } from '../distributions/tail'
import { adjustBounds } from '../procedures/adjust-bounds'
import { procedureTable } from '../procedures/table'
import type { Procedure } from '../vocabulary'
import type { ReadStatistic } from '../types'
import { rangeOfStatistic } from './agreement'
import { clip, combine, type Interval } from './interval'

const unknown: Interval = { low: 0, high: 1 }

/** Whether each p is adjusted by itself, whatever the others are. */
export function isSingleStep(procedure: Procedure): boolean {
  return procedure === 'bonferroni' || procedure === 'sidak'
}

/** Whether the procedure is a function of the p-values alone, so that any family of them can be adjusted. */
export function worksOnP(procedure: Procedure): boolean {
  return procedureTable[procedure].adjust !== null
}

/** Whether adjusted values follow from t statistics, their df and the number of groups. */
export function worksOnT(procedure: Procedure): boolean {
  return ['tukey', 'games-howell', 'dunnett', 'scheffe'].includes(procedure)
}

/**
 * Adjusted p-values of a whole family as ranges, in input order. `raw`: ranges of the raw p; null for a member of
 * which nothing is known, which then may have any p. An `m` below the number of members is taken as it is by
 * single-step procedures, and raised to the number by all others.
 */
export function adjustRanges(
  procedure: Procedure,
  raw: readonly (Interval | null)[],
  m: number,
  alpha: number,
): Interval[] {
  const known = raw.map((range) => clip(range ?? unknown))
  if (m < known.length && isSingleStep(procedure)) {
    return known.flatMap((range) => adjustRanges(procedure, [range], Math.max(1, m), alpha))
  }
  // members that are not shown may have any p too: by a step-wise procedure they bear on all others
  const bounds = adjustBounds(
    procedure,
    known.map(({ low }) => low),
    known.map(({ high }) => high),
    { m: Math.max(m, known.length), alpha, unprinted: Math.max(0, m - known.length) },
  )
  return known.map((_, i) => ({ low: bounds.low[i] ?? 0, high: bounds.high[i] ?? 1 }))
}

/**
 * The adjusted p-value of one comparison by a procedure on statistics, over the rounding of all statistics printed
 * of it; null where there is no t (or F with one numerator df, z) among them. `groups`: number of groups. Dunnett is
 * taken with equal group sizes, as these are seldom printed; unequal ones change the third digit.
 */
export function adjustStatistics(
  procedure: Procedure,
  statistics: readonly ReadStatistic[],
  groups: number,
): Interval | null {
  const ranges = statistics.flatMap((statistic) => {
    const t = toT(statistic)
    if (!t || groups < 2) return []
    const low = tailOf(procedure, t.high, t.df, groups)
    const high = tailOf(procedure, t.low, t.df, groups)
    return [clip({ low, high })]
  })
  return combine(ranges)?.range ?? null
}

function toT(statistic: ReadStatistic): { low: number; high: number; df: number } | null {
  const { low, high } = rangeOfStatistic(statistic)
  const [first, second] = statistic.df
  if (statistic.test === 't' && isDf(first)) return { low, high, df: first }
  if (statistic.test === 'z') return { low, high, df: Infinity }
  if (statistic.test === 'F' && first === 1 && isDf(second))
    return { low: Math.sqrt(low), high: Math.sqrt(high), df: second }
  return null
}

function isDf(df: number | undefined): df is number {
  return df !== undefined && df > 0
}

function tailOf(procedure: Procedure, t: number, df: number, groups: number): number {
  if (procedure === 'dunnett') return dunnettUpper(t, new Array<number>(groups - 1).fill(Math.SQRT1_2), df)
  if (procedure !== 'scheffe') return tail('q', Math.SQRT2 * t, [groups, df])
  const f = (t * t) / (groups - 1)
  return df === Infinity ? tail('chi2', f * (groups - 1), [groups - 1]) : tail('F', f, [groups - 1, df])
}

/**
 * The range of raw p-values that an adjusted p-value leaves possible: exact for single-step procedures on p, else
 * between p / m and p.
 */
export function invert(procedure: Procedure | null, adjusted: Interval, m: number): Interval {
  const { low, high } = clip(adjusted)
  const whole = high >= 1 ? 1 : null
  if (procedure === 'bonferroni') return { low: low / m, high: whole ?? high / m }
  if (procedure === 'sidak')
    return { low: 1 - (1 - low) ** (1 / m), high: whole ?? 1 - (1 - high) ** (1 / m) }
  return { low: low / m, high }
}
