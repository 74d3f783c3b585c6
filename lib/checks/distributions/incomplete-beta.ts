import { deviance, HALF_LOG_TWO_PI, logOneMinusExp, stirlingError } from './special'

/** Logarithms of the two tails of one distribution at one point; exp of them sums to 1. */
export type LogTails = { lower: number; upper: number }

const TINY = 1e-300
const MAX_STEPS = 200_000

/**
 * Logarithms of the regularised incomplete beta function I_x(a, b) (`lower`) and of 1 − I_x(a, b) (`upper`), for
 * a, b > 0 and x in [0, 1], where `y` = 1 − x. Both x and y are given, so that neither is lost beside the other, and
 * `logX`, `logY` where one of them underflows. Relative accuracy of exp(result) about 1e-13, 1e-11 for a, b >= 1e5.
 * Source: continued fraction of Didonato and Morris (1992), ACM TOMS 18, 360–373, by Lentz's method; the factor
 * before it by Loader's deviances.
 */
export function logBetaTails(
  a: number,
  b: number,
  x: number,
  y: number,
  logX: number = Math.log(x),
  logY: number = Math.log(y),
): LogTails {
  if (logX === -Infinity) return { lower: -Infinity, upper: 0 }
  if (logY === -Infinity) return { lower: 0, upper: -Infinity }
  const n = a + b
  const factor =
    -deviance(a, n * x, Math.log(n) + logX) -
    deviance(b, n * y, Math.log(n) + logY) +
    0.5 * (Math.log(a) + Math.log(b) - Math.log(n)) -
    HALF_LOG_TWO_PI +
    stirlingError(n) -
    stirlingError(a) -
    stirlingError(b)
  if (x * (n + 2) < a + 1) {
    const lower = Math.min(0, factor - Math.log(a) + Math.log(betaFraction(a, b, x)))
    return { lower, upper: logOneMinusExp(lower) }
  }
  const upper = Math.min(0, factor - Math.log(b) + Math.log(betaFraction(b, a, y)))
  return { lower: logOneMinusExp(upper), upper }
}

/** The continued fraction of I_x(a, b) a B(a, b) / (x^a (1 − x)^b), for x below (a + 1) / (a + b + 2). */
function betaFraction(a: number, b: number, x: number): number {
  let c = 1
  let d = 1 / away(1 - ((a + b) * x) / (a + 1))
  let value = d
  for (let j = 1; j <= MAX_STEPS; j++) {
    const even = (j * (b - j) * x) / ((a + 2 * j - 1) * (a + 2 * j))
    d = 1 / away(1 + even * d)
    c = away(1 + even / c)
    value *= c * d
    const odd = (-(a + j) * (a + b + j) * x) / ((a + 2 * j) * (a + 2 * j + 1))
    d = 1 / away(1 + odd * d)
    c = away(1 + odd / c)
    value *= c * d
    if (Math.abs(c * d - 1) < 1e-16) return value
  }
  return value
}

const away = (value: number) => (Math.abs(value) < TINY ? TINY : value)
