import { deviance, HALF_LOG_TWO_PI, logOneMinusExp, stirlingError } from './special'

/** Logarithms of the two tails of one distribution at one point; exp of them sums to 1. */
export type LogTails = { lower: number; upper: number }

const TINY = 1e-300
const MAX_STEPS = 200_000

/**
 * Logarithms of the regularised incomplete beta function I_x(a, b) (`lower`) and of 1 − I_x(a, b) (`upper`), for
 * a, b > 0 and x in [0, 1], where `y` = 1 − x. Both x and y are given, so that neither is lost beside the other, and
 * `logX`, `logY` where one of them underflows. Relative accuracy of exp(result) about 1e-12.
 * Source: the continued fraction of DiDonato and Morris (1992), ACM TOMS 18, 360–373, by Lentz's method; the factor
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
    const lower = Math.min(0, factor + Math.log(betaFraction(a, b, x, y)))
    return { lower, upper: logOneMinusExp(lower) }
  }
  const upper = Math.min(0, factor + Math.log(betaFraction(b, a, y, x)))
  return { lower: logOneMinusExp(upper), upper }
}

/**
 * I_x(a, b) B(a, b) / (x^a (1 − x)^b) for x below (a + 1) / (a + b + 2). λ = a − (a + b) x is taken as a y − b x, so
 * that a large a or b costs no digits. NaN where the fraction has not settled.
 */
function betaFraction(a: number, b: number, x: number, y: number): number {
  const lambda = a * y - b * x
  let d = 1 / away((a * (lambda + 1)) / (a + 1))
  let c = Infinity
  let value = d
  for (let n = 1; n <= MAX_STEPS; n++) {
    const s = a + 2 * n - 1
    const alpha = ((a + n - 1) / s) * ((a + b + n - 1) / s) * n * (b - n) * x * x
    const beta = n + (n * (b - n) * x) / s + ((a + n) / (s + 2)) * (lambda + 1 + n * (1 + y))
    d = 1 / away(beta + alpha * d)
    c = away(beta + alpha / c)
    const change = c * d
    value *= change
    if (Math.abs(change - 1) < 1e-15) return value
  }
  return NaN
}

const away = (value: number) => (Math.abs(value) < TINY ? TINY : value)
