import { roundingInterval, type Interval } from '../numbers/printed-interval'
import type { SummaryGroup } from './groups'

/** What the printed numbers of one group stand for; `variance` is the squared standard deviation. */
export type GroupBox = { group: string; n: number; mean: Interval; variance: Interval }

/**
 * The rounding intervals of all groups: half a unit of the last printed digit to either side of the mean and of the
 * sd or se (cut at 0). Null where no group carries decimals.
 */
export function getBox(groups: readonly SummaryGroup[]): GroupBox[] | null {
  if (groups.every(({ meanDecimals, spreadDecimals }) => (meanDecimals ?? spreadDecimals) === undefined))
    return null
  return groups.map(({ group, n, mean, sd, se, meanDecimals, spreadDecimals }) => {
    const spread = getInterval(sd ?? se ?? NaN, spreadDecimals)
    const square = (value: number) => Math.max(0, value) ** 2 * (sd === undefined ? n : 1)
    return {
      group,
      n,
      mean: getInterval(mean, meanDecimals),
      variance: { low: square(spread.low), high: square(spread.high) },
    }
  })
}

const getInterval = (value: number, decimals: number | undefined): Interval =>
  decimals === undefined ? { low: value, high: value } : roundingInterval(value, decimals)

/** The mean square within groups over the box; both ends are attained. */
export function boundWithin(box: readonly GroupBox[]): Interval {
  const df = box.reduce((total, { n }) => total + n - 1, 0)
  const at = (end: 'low' | 'high') =>
    box.reduce((total, { n, variance }) => total + (n - 1) * variance[end], 0) / df
  return { low: at('low'), high: at('high') }
}

/** Smallest and largest size of a number in the interval. */
export const getSizes = ({ low, high }: Interval): { least: number; most: number } => ({
  least: low <= 0 && high >= 0 ? 0 : Math.min(Math.abs(low), Math.abs(high)),
  most: Math.max(Math.abs(low), Math.abs(high)),
})
