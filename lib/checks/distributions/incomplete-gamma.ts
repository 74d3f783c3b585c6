import type { LogTails } from './incomplete-beta'
import { deviance, HALF_LOG_TWO_PI, logOneMinusExp, stirlingError } from './special'

const MAX_STEPS = 200_000

/**
 * Logarithms of the regularised incomplete gamma functions P(a, x) (`lower`) and Q(a, x) (`upper`), a > 0, x >= 0.
 * Relative accuracy of exp(result) about 1e-12, 1e-11 for
 * a >= 1e4. NaN where a is too large for them to settle (above 1e9 near the mean).
 * Source: series and continued fraction, Abramowitz and Stegun (1964), 6.5.29 and 6.5.31, the latter by Lentz's
 * method; the factor before them by Loader's deviance.
 */
export function logGammaTails(a: number, x: number): LogTails {
  if (x === 0) return { lower: -Infinity, upper: 0 }
  if (x === Infinity) return { lower: 0, upper: -Infinity }
  const factor = -deviance(a, x) + 0.5 * Math.log(a) - HALF_LOG_TWO_PI - stirlingError(a)
  if (x < a + 1) {
    const lower = Math.min(0, factor - Math.log(a) + Math.log(gammaSeries(a, x)))
    return { lower, upper: logOneMinusExp(lower) }
  }
  const upper = Math.min(0, factor + Math.log(gammaFraction(a, x)))
  return { lower: logOneMinusExp(upper), upper }
}

function gammaSeries(a: number, x: number): number {
  let term = 1
  let sum = 1
  for (let j = 1; j <= MAX_STEPS; j++) {
    term *= x / (a + j)
    sum += term
    if (term < sum * 1e-17) return sum
  }
  return NaN
}

function gammaFraction(a: number, x: number): number {
  let b = x + 1 - a
  let c = Infinity
  let d = 1 / b
  let value = d
  for (let j = 1; j <= MAX_STEPS; j++) {
    const numerator = -j * (j - a)
    b += 2
    d = 1 / (numerator * d + b)
    c = b + numerator / c
    value *= c * d
    if (Math.abs(c * d - 1) < 1e-15) return value
  }
  return NaN
}
