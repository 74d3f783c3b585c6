import { logBetaTails, type LogTails } from './incomplete-beta'
import { logGammaTails } from './incomplete-gamma'
import { deviance, HALF_LOG_TWO_PI, stirlingError } from './special'

/** A term this much smaller than the sum no longer counts. */
const NEGLIGIBLE = 1e-18

/**
 * P(F > x) and P(F < x) for noncentral F with `df1`, `df2` > 0 degrees of freedom (df2 Infinity: noncentral χ²_df1
 * over df1) and noncentrality `ncp` >= 0 (R's convention: the sum of the squared shifts, not its half). Relative
 * accuracy 1e-10 where the tail is above 1e-290. Both NaN for x that is NaN.
 * Throws RangeError for df1 or df2 not above 0, df1 that is not finite, and ncp below 0 or not finite.
 * Source: Poisson mixture of central tails, Johnson, Kotz and Balakrishnan (1995), Continuous Univariate
 * Distributions 2, chapter 30; summed from the largest weight to both sides, all terms positive.
 */
export function noncentralFTails(
  x: number,
  df1: number,
  df2: number,
  ncp: number,
): { lower: number; upper: number } {
  if (!(df1 > 0 && df1 < Infinity && df2 > 0)) {
    throw new RangeError(`noncentral F takes degrees of freedom above 0, not ${df1} and ${df2}`)
  }
  if (!(ncp >= 0 && ncp < Infinity)) throw new RangeError(`the noncentrality is at least 0, not ${ncp}`)
  if (Number.isNaN(x)) return { lower: NaN, upper: NaN }
  if (x <= 0) return { lower: 0, upper: 1 }
  if (x === Infinity) return { lower: 1, upper: 0 }

  const mean = 0.5 * ncp
  const tailsAt = getCentralTails(x, df1, df2)
  const mode = Math.floor(mean)
  let lower = 0
  let upper = 0
  const add = (j: number): number => {
    const weight = poisson(j, mean)
    const tails = tailsAt(j)
    lower += weight * Math.exp(tails.lower)
    upper += weight * Math.exp(tails.upper)
    return weight
  }
  add(mode)
  // Upwards the upper tails grow towards 1, downwards the lower ones.
  for (let j = mode + 1; add(j) > NEGLIGIBLE * upper; j++);
  for (let j = mode - 1; j >= 0 && add(j) > NEGLIGIBLE * lower; j--);
  return { lower: Math.min(1, lower), upper: Math.min(1, upper) }
}

/** Logarithms of the central tails with df1 + 2j in place of df1, at the same point of the beta or gamma function. */
function getCentralTails(x: number, df1: number, df2: number): (j: number) => LogTails {
  if (df2 === Infinity) return (j) => logGammaTails(0.5 * df1 + j, 0.5 * df1 * x)
  const ratio = (df1 / df2) * x
  const inside = ratio > 1e300 ? 1 : ratio / (1 + ratio)
  const logOutside = ratio > 1e300 ? Math.log(df2 / df1) - Math.log(x) : -Math.log1p(ratio)
  return (j) =>
    logBetaTails(0.5 * df1 + j, 0.5 * df2, inside, Math.exp(logOutside), Math.log(inside), logOutside)
}

function poisson(j: number, mean: number): number {
  if (j === 0) return Math.exp(-mean)
  return Math.exp(-stirlingError(j) - deviance(j, mean) - HALF_LOG_TWO_PI) / Math.sqrt(j)
}
