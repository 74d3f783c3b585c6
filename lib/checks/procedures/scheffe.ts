import { fLogUpper } from '../distributions/f'

/**
 * Scheffé: P(F > t² / (groups − 1)) on groups − 1 and `df` degrees of freedom, for the t of any contrast of
 * `groups` >= 2 means (pooled variance). Controls the family-wise error rate over all contrasts.
 * Throws RangeError for `groups` that is no integer or below 2. Source: Scheffé (1953), Biometrika 40, 87–104.
 */
export function pScheffeFromT(t: number, groups: number, df: number): number {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`a contrast takes an integer number of groups, at least 2, not ${groups}`)
  }
  return Math.exp(fLogUpper((t * t) / (groups - 1), groups - 1, df))
}
