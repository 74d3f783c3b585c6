import { tail } from '../distributions/tail'
import type { PrintedStatistic } from '../extract/grammar/statistic'
import { pBounds } from '../numbers/p-bounds'
import { roundingInterval, type Interval } from '../numbers/printed-interval'
import type { EntryStatistic, Sides } from './entry'

/** Digits after the point with which the p-value of a statistic is shown. */
export const STATISTIC_DECIMALS = 3

const DF_COUNT = { t: 1, F: 2, chi2: 1, z: 0, r: 1 } as const

export type ReadStatisticP = Interval & { value: number; statistic: EntryStatistic }

/**
 * The p-value of a printed statistic, and the interval over its rounding; `sides` for t, z and r, the upper tail for
 * F and χ². Null where the statistic has no p-value without more (U, W, missing degrees of freedom, a relation).
 */
export function readStatisticP(
  statistic: Pick<PrintedStatistic, 'test' | 'df' | 'value' | 'decimals' | 'relation'>,
  sides: Sides,
): ReadStatisticP | null {
  const { test, df, value, decimals, relation } = statistic
  if (test === 'other' || relation !== '=' || df.length !== DF_COUNT[test]) return null
  if (df.some((one) => !(one > 0))) return null
  const directed = sides !== 'two-sided' && (test === 't' || test === 'z' || test === 'r')
  const given = roundingInterval(value, decimals)
  const print: EntryStatistic = {
    test,
    df,
    value,
    decimals,
    sides: directed ? sides : 'two-sided',
    alone: true,
  }
  const { low, high } = pBounds(test, given.low, given.high, df, directed ? sides : 2)
  const at = clipTo(test, sides === 'less' && directed ? -value : value)
  return { value: tail(test, at, df, directed ? 1 : 2), low, high, statistic: print }
}

function clipTo(test: PrintedStatistic['test'], value: number): number {
  return test === 'r' ? Math.max(-1, Math.min(1, value)) : value
}
