import { logBetaTails } from './incomplete-beta'
import { logGammaTails } from './incomplete-gamma'

/**
 * log P(F > x) for F with `df1`, `df2` > 0 degrees of freedom (df2 may be Infinity) and x >= 0.
 * Source: incomplete beta function, Abramowitz and Stegun (1964), 26.6.2.
 */
export function fLogUpper(x: number, df1: number, df2: number): number {
  if (x === Infinity) return -Infinity
  if (df2 === Infinity) return logGammaTails(0.5 * df1, 0.5 * df1 * x).upper
  const ratio = (df1 / df2) * x
  if (ratio > 1e300) {
    const logY = -Math.log(df1 / df2) - Math.log(x)
    return logBetaTails(0.5 * df1, 0.5 * df2, 1, Math.exp(logY), 0, logY).upper
  }
  return logBetaTails(0.5 * df1, 0.5 * df2, ratio / (1 + ratio), 1 / (1 + ratio)).upper
}
