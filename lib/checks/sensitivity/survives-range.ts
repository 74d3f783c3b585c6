import type { Interval } from '../numbers/printed-interval'
import { survivesUpTo, survivesUpToByBh, survivesUpToByHolm } from './survives-up-to'

/**
 * For a p-value known within an interval: the largest family size at which it is `certain` to be kept, the largest at
 * which that is `possible` (between them the print cannot decide), and the smallest at which it is certain to fail.
 * All are Infinity for p = 0.
 */
export type SurvivalRange = { certain: number; possible: number; failsFrom: number }

const toRange = (certain: number, possible: number): SurvivalRange => ({
  certain,
  possible,
  failsFrom: possible + 1,
})

/**
 * By Bonferroni. Example: p printed .008 is [.0075, .0085]; at alpha = .05 it is certain to m = 5, undecided at 6 and
 * fails from 7. Throws RangeError for alpha outside (0, 1) and low above high; NaN gives NaN.
 */
export function survivesRange({ low, high }: Interval, alpha: number): SurvivalRange {
  if (low > high) throw new RangeError(`a p-value's interval runs upwards, not from ${low} to ${high}`)
  return toRange(survivesUpTo(high, alpha), survivesUpTo(low, alpha))
}

/**
 * By Holm or Benjamini–Hochberg, for each value of a family in input order, with `survivesUpToByHolm` and
 * `survivesUpToByBh`: both fall as any p-value of the family grows, so that the upper ends together give what is certain
 * and the lower ends what is possible. 0 and 0 where a value is not kept at the number of values given. Errors as above.
 */
export function survivesRanges(
  procedure: 'holm' | 'bh',
  intervals: readonly Interval[],
  alpha: number,
): SurvivalRange[] {
  const wrong = intervals.find(({ low, high }) => low > high)
  if (wrong) throw new RangeError(`a p-value's interval runs upwards, not from ${wrong.low} to ${wrong.high}`)
  const find = procedure === 'holm' ? survivesUpToByHolm : survivesUpToByBh
  const possible = find(
    intervals.map(({ low }) => low),
    alpha,
  )
  const certain = find(
    intervals.map(({ high }) => high),
    alpha,
  )
  return intervals.map((_, i) => toRange(certain[i] ?? NaN, possible[i] ?? NaN))
}
