import { logBetaTails } from './incomplete-beta'

/**
 * log P(|R| > |r|) for the product-moment correlation of n pairs without association, `df` = n − 2 > 0, r in
 * [−1, 1]. It equals Student's t at r √(df / (1 − r²)); 1 − r² is taken as (1 − r)(1 + r).
 */
export function correlationLogTwoSided(r: number, df: number): number {
  return logBetaTails(0.5, 0.5 * df, r * r, (1 - r) * (1 + r)).upper
}

/** log P(R > r). */
export function correlationLogUpper(r: number, df: number): number {
  const both = correlationLogTwoSided(r, df)
  return r >= 0 ? both - Math.LN2 : Math.log1p(-0.5 * Math.exp(both))
}
