import { fLogUpper } from '../distributions/f'

/**
 * Scheffé: P(F > t² / (groups − 1)) on groups − 1 and `df` degrees of freedom, for the t of any contrast of
 * `groups` >= 2 means (pooled variance). Controls the family-wise error rate over all contrasts.
 * Source: Scheffé (1953), Biometrika 40, 87–104.
 */
export function pScheffeFromT(t: number, groups: number, df: number): number {
  return Math.exp(fLogUpper((t * t) / (groups - 1), groups - 1, df))
}
