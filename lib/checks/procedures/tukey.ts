import { studentizedRangeUpper } from '../distributions/studentized-range'

/**
 * Tukey and Tukey–Kramer: P(Q > √2 |t|) for the t of a pair (pooled variance), `groups` >= 2 means and `df` > 0.
 * Controls the family-wise error rate over all pairs; normal, equal variances; conservative for unequal sizes.
 * Source: Kramer (1956), Biometrics 12, 307–310.
 */
export function pTukeyFromT(t: number, groups: number, df: number): number {
  return studentizedRangeUpper(Math.SQRT2 * Math.abs(t), groups, df)
}
