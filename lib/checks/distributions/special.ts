/** The one place where the packages for special functions enter: the rest of the folder imports from here. */
import erfcOf from '@stdlib/math-base-special-erfc'
import erfcxOf from '@stdlib/math-base-special-erfcx'
import gammalnOf from '@stdlib/math-base-special-gammaln'

/** 1 − erf(x) for any x. */
export const erfc = (x: number): number => erfcOf(x)

/** exp(x²) erfc(x), which does not underflow for large x. */
export const erfcx = (x: number): number => erfcxOf(x)

/** log Γ(x) for x > 0. */
export const gammaln = (x: number): number => gammalnOf(x)

/** exp of anything below is 0. */
export const UNDERFLOW = -745.2

export const HALF_LOG_TWO_PI = 0.9189385332046727

/**
 * What Stirling's formula lacks of log Γ(a): log Γ(a) − [(a − 1/2) log a − a + log √(2π)], a > 0. By its series
 * from a = 15 (error below 1e-17). Source: Abramowitz and Stegun (1964), 6.1.41.
 */
export function stirlingError(a: number): number {
  if (a < 15) return gammaln(a) - ((a - 0.5) * Math.log(a) - a + HALF_LOG_TWO_PI)
  const r = 1 / (a * a)
  return (1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r * (1 / 1188 - (r * 691) / 360360))))) / a
}

/**
 * a log(a / x) + x − a for a > 0 and x >= 0, without cancellation where x is near a. `logX` may be given where x
 * underflows. Source: Loader (2000), Fast and accurate computation of binomial probabilities.
 */
export function deviance(a: number, x: number, logX: number = Math.log(x)): number {
  const gap = a - x
  if (Math.abs(gap) > 0.1 * (a + x)) return a * (Math.log(a) - logX) + x - a
  const v = gap / (a + x)
  let sum = gap * v
  let term = 2 * a * v
  for (let j = 3; ; j += 2) {
    term *= v * v
    const next = sum + term / j
    if (next === sum) return sum
    sum = next
  }
}

/** log(1 − exp(x)) for x <= 0. Source: Mächler (2012), Accurately computing log(1 − exp(−|a|)). */
export function logOneMinusExp(x: number): number {
  return x > -Math.LN2 ? Math.log(-Math.expm1(x)) : Math.log1p(-Math.exp(x))
}
