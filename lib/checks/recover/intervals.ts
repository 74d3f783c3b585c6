import type { Interval } from '../numbers/printed-interval'

/** Room for rounding errors at the closed ends. */
export const SLACK = 1e-12

/** Whether two closed intervals have a point in common. */
export function meet(a: Interval, b: Interval): boolean {
  return a.low <= b.high + SLACK && b.low <= a.high + SLACK
}
