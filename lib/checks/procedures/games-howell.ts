import { studentizedRangeUpper } from '../distributions/studentized-range'

/**
 * Games–Howell: P(Q > √2 |t|) for Welch's t of a pair and its own Welch–Satterthwaite `df` > 0, `groups` >= 2.
 * Approximate control of the family-wise error rate over all pairs; variances may differ.
 * Source: Games and Howell (1976), J Educ Stat 1, 113–125.
 */
export function pGamesHowellFromWelch(t: number, groups: number, df: number): number {
  return studentizedRangeUpper(Math.SQRT2 * Math.abs(t), groups, df)
}
