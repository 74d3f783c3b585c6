import { tail } from '../distributions/tail'
import type { Interval } from '../numbers/printed-interval'
import { boundWelchDf, boundWelchP, type WelchBox } from './bound-welch'
import type { Pair } from './pairs'
import { boundWithin, getSizes, type GroupBox } from './rounding-box'
import { adjustTests, type Setting, type SummaryProcedure } from './simultaneous'

/**
 * Over the rounding of the print: `difference`, `t` and `p` of the pooled test, whose ends are attained; those of
 * Welch's test (p within 1e-6 relative above or below what is attained), null where both spreads can be 0; and the
 * adjusted p-values. These are attained but for 'holm', where the raw p-values are taken as if each had its range to
 * itself, and 'games-howell', where t and df are: outer bounds (for 'games-howell' and p above 1/2 nearly so, as
 * there p need not fall with df).
 */
export type ComparisonBounds = {
  difference: Interval
  pooled: { t: Interval; p: Interval }
  welch: { t: Interval; df: Interval; p: Interval } | null
  adjusted: { procedure: SummaryProcedure; p: Interval | null }[]
}

type Bounded = Omit<ComparisonBounds, 'adjusted'>

/** The bounds of every pair, in the order of the pairs; `procedures` and `setting` as for the values themselves. */
export function boundComparisons(
  box: readonly GroupBox[],
  pairs: readonly Pair[],
  procedures: readonly SummaryProcedure[],
  setting: Setting,
): ComparisonBounds[] {
  const within = boundWithin(box)
  const byName = new Map(box.map((each) => [each.group, each]))
  const tests = pairs.flatMap(({ first, second }) => {
    const [one, two] = [byName.get(first.group), byName.get(second.group)]
    return one && two ? [boundTests(one, two, within, setting.df)] : []
  })
  const columns = procedures.map((procedure) => boundAdjusted(procedure, tests, setting))
  return tests.map((test, i) => ({
    ...test,
    adjusted: procedures.map((procedure, j) => ({ procedure, p: columns[j]?.[i] ?? null })),
  }))
}

function boundTests(one: GroupBox, two: GroupBox, within: Interval, df: number): Bounded {
  const difference = { low: two.mean.low - one.mean.high, high: two.mean.high - one.mean.low }
  const unit = 1 / one.n + 1 / two.n
  const t = divide(difference, within.low * unit, within.high * unit)
  const { least, most } = getSizes(t)
  const p = { low: tail('t', most, [df]), high: tail('t', least, [df]) }
  return { difference, pooled: { t, p }, welch: boundWelch(one, two, difference) }
}

function boundWelch(one: GroupBox, two: GroupBox, difference: Interval): Bounded['welch'] {
  const scale = ({ n, variance }: GroupBox): Interval => ({ low: variance.low / n, high: variance.high / n })
  const box: WelchBox = { n1: one.n, n2: two.n, a: scale(one), b: scale(two), difference }
  if (box.a.low + box.b.low === 0) return null
  const t = divide(difference, box.a.low + box.b.low, box.a.high + box.b.high)
  return { t, df: boundWelchDf(box, box), p: boundWelchP(box) }
}

/** What a difference over the root of a squared error can be. */
function divide({ low, high }: Interval, least: number, most: number): Interval {
  const over = (value: number, squared: number) => (value === 0 ? 0 : value / Math.sqrt(squared))
  return { low: over(low, low < 0 ? least : most), high: over(high, high > 0 ? least : most) }
}

function boundAdjusted(
  procedure: SummaryProcedure,
  tests: readonly Bounded[],
  setting: Setting,
): (Interval | null)[] {
  const at = (end: 'most' | 'least', dfEnd: 'low' | 'high') =>
    adjustTests(
      procedure,
      tests.map(({ pooled, welch }) => {
        const raw = (p: Interval) => (end === 'most' ? p.low : p.high)
        if (procedure !== 'games-howell')
          return { t: getSizes(pooled.t)[end], df: setting.df, p: raw(pooled.p) }
        return welch && { t: getSizes(welch.t)[end], df: welch.df[dfEnd], p: raw(welch.p) }
      }),
      setting,
    )
  const corners = procedure === 'games-howell' ? (['low', 'high'] as const) : (['low'] as const)
  const lows = corners.map((df) => at('most', df))
  const highs = corners.map((df) => at('least', df))
  return tests.map((_, i) => {
    const pick = (values: (number | null)[][]) => values.map((column) => column[i] ?? NaN)
    const [low, high] = [Math.min(...pick(lows)), Math.max(...pick(highs))]
    return Number.isNaN(low) ? null : { low, high }
  })
}
