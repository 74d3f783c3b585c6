import { erfc, erfcx, HALF_LOG_TWO_PI } from './special'

/** P(Z > x) for a standard normal Z and any x; relative accuracy 1e-12 down to 1e-300. */
export function normalUpper(x: number): number {
  return 0.5 * erfc(x * Math.SQRT1_2)
}

/** log P(Z > x), which does not underflow. */
export function normalLogUpper(x: number): number {
  if (x > 1) return Math.log(0.5 * erfcx(x * Math.SQRT1_2)) - 0.5 * x * x
  return x < -1 ? Math.log1p(-normalUpper(-x)) : Math.log(normalUpper(x))
}

/** Density of the standard normal. */
export function normalDensity(x: number): number {
  return Math.exp(-0.5 * x * x - HALF_LOG_TWO_PI)
}
