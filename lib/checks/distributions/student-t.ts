import { logBetaTails } from './incomplete-beta'
import { normalLogUpper } from './normal'

/**
 * log P(|T| > |t|) for Student's t with `df` > 0 degrees of freedom, Infinity for the normal.
 * Source: 1 − I of the incomplete beta function, Abramowitz and Stegun (1964), 26.7.1.
 */
export function tLogTwoSided(t: number, df: number): number {
  const size = Math.abs(t)
  if (df === Infinity) return Math.LN2 + normalLogUpper(size)
  if (size === Infinity) return -Infinity
  if (size > 1e150) return tLogFar(size, df)
  const square = size * size
  const sum = df + square
  return logBetaTails(0.5, 0.5 * df, square / sum, df / sum).upper
}

/** As above where t² overflows: df / (df + t²) is df / t² to all digits. */
function tLogFar(size: number, df: number): number {
  const logY = Math.log(df) - 2 * Math.log(size)
  return logBetaTails(0.5, 0.5 * df, 1, Math.exp(logY), 0, logY).upper
}

/** log P(T > t). */
export function tLogUpper(t: number, df: number): number {
  const both = tLogTwoSided(t, df)
  return t >= 0 ? both - Math.LN2 : Math.log1p(-0.5 * Math.exp(both))
}
