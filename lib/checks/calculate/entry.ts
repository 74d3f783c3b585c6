import type { Interval } from '../numbers/printed-interval'
import type { Relation, Test } from '../vocabulary'

/** How one-sided statistics point: 'greater' takes the upper tail, 'less' the lower. F and χ² have one tail only. */
export const SIDES = ['two-sided', 'greater', 'less'] as const
export type Sides = (typeof SIDES)[number]

/**
 * One test of a pasted list. `line`: 1-based line of the text; `name`: '' where none is given; `printed`: the number as
 * it stands there, with its statistic where it has one; `value`: the p-value itself (of '<' and '>' the bound; of a
 * statistic the p-value of the printed value); `low`, `high`: the closed interval in [0, 1] that the print stands for;
 * `relation`: '=' also for a statistic; `decimals`: digits after the point of the p-value, of a statistic those that
 * its p-value is shown with. `statistic`: the printed statistic that the p-value rests on, alone where `decimals` are
 * its own, else beside the printed p-value (`alone` tells). `adjusted`: a printed adjusted value of the same test;
 * `weight`: its weight, if any.
 */
export type Entry = Interval & {
  line: number
  name: string
  printed: string
  value: number
  relation: Relation
  decimals: number
  statistic: EntryStatistic | null
  adjusted: (Interval & { printed: string; decimals: number }) | null
  weight: number | null
}

/** A printed statistic with a p-value; `sides`: as it was taken, 'two-sided' for F and χ². */
export type EntryStatistic = {
  test: Exclude<Test, 'other'>
  df: number[]
  value: number
  decimals: number
  sides: Sides
  alone: boolean
}

/** A stretch of the text that is no test, with its 1-based line and the reason in a few words. */
export type Unread = { line: number; text: string; why: string }
