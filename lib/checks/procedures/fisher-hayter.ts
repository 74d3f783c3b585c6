import { studentizedRangeUpper } from '../distributions/studentized-range'
import { tail } from '../distributions/tail'
import { pLsd } from './lsd'

/**
 * Fisher–Hayter: once the omnibus F test is significant, pairs are held against the studentized range of one group
 * less: max(P(Q_(k−1) > √2 |t|), p of the omnibus test) for the t of a pair (pooled variance), `groups` k >= 2 and
 * `df` >= 1. With two groups the pair is the omnibus test itself. Controls the family-wise error rate over all
 * pairs; normal, equal variances; conservative for unequal sizes.
 * Throws RangeError for `groups` that is no integer or below 2, df below 1 and an omnibus p outside [0, 1].
 * Source: Hayter (1986), J Am Stat Assoc 81, 1000–1004.
 */
export function pFisherHayterFromT(t: number, groups: number, df: number, omnibus: number): number {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`pairs take an integer number of groups, at least 2, not ${groups}`)
  }
  const p =
    groups === 2 ? tail('t', t, [df]) : studentizedRangeUpper(Math.SQRT2 * Math.abs(t), groups - 1, df)
  return pLsd(p, omnibus)
}
