import { normalLogUpper, normalUpper } from './normal'
import { averageOverScale } from './scale-mixture'

/**
 * P(T > t) for T = (Z + ncp) / √(χ²_df / df): noncentral t with `df` >= 1 degrees of freedom (Infinity: normal) and
 * any finite noncentrality `ncp`. Absolute accuracy 1e-13; for t > 0 relative accuracy 1e-10 too, down to 1e-290.
 * NaN for t that is NaN. Throws RangeError for df below 1 and for ncp that is not finite.
 * Source: the normal tail averaged over the scale; Johnson, Kotz and Balakrishnan (1995), Continuous Univariate
 * Distributions 2, chapter 31.
 */
export function noncentralTUpper(t: number, df: number, ncp: number): number {
  if (!(df >= 1)) throw new RangeError(`noncentral t takes at least 1 degree of freedom, not ${df}`)
  if (!Number.isFinite(ncp)) throw new RangeError(`the noncentrality is a finite number, not ${ncp}`)
  if (Number.isNaN(t)) return NaN
  if (t === Infinity) return 0
  if (t === -Infinity) return 1
  if (t === 0) return normalUpper(-ncp)
  const beyond = (s: number) => normalUpper(t * s - ncp)
  // Only for t > 0 is the logarithm of the tail concave in log s.
  const logBound = t > 0 ? (s: number) => normalLogUpper(t * s - ncp) : () => 0
  return Math.min(1, averageOverScale(df, beyond, logBound, 1 + Math.abs(ncp)))
}

/** P(T < t); accuracy as above, relative for t < 0. Errors as in `noncentralTUpper`. */
export function noncentralTLower(t: number, df: number, ncp: number): number {
  return noncentralTUpper(-t, df, -ncp)
}

/** P(|T| > critical) for critical >= 0: the power of a two-sided t test. Errors as in `noncentralTUpper`. */
export function noncentralTBeyond(critical: number, df: number, ncp: number): number {
  return Math.min(1, noncentralTUpper(critical, df, ncp) + noncentralTLower(-critical, df, ncp))
}
