import { HALF_LOG_TWO_PI, stirlingError } from './special'

/** How many nats below its peak an integrand may be left out. */
const REACH = 42

/**
 * E f(S) for S = √(χ²_df / df), df >= 1 (Infinity: S = 1): what turns a probability at known variance into one with
 * the variance estimated on `df` degrees of freedom. `f` is a smooth function of s > 0 in [0, 1]. `logBound(s)` is a
 * concave upper bound of log f(s) in log s, by which the stretch is found where density times f is not negligible,
 * so that the relative accuracy holds far into the tail (about 1e-11). `slope`: about the largest slope of f in
 * log s, where it exceeds 1. Throws RangeError for df below 1.
 * Source: trapezoidal rule in log s, which converges geometrically for an analytic integrand that dies away at both
 * ends; Trefethen and Weideman (2014), SIAM Review 56, 385–458.
 */
export function averageOverScale(
  df: number,
  f: (s: number) => number,
  logBound: (s: number) => number = () => 0,
  slope: number = 1,
): number {
  if (!(df >= 1)) throw new RangeError(`the variance takes at least 1 degree of freedom, not ${df}`)
  if (df === Infinity) return f(1)
  const a = 0.5 * df
  const constant = Math.LN2 + 0.5 * Math.log(a) - HALF_LOG_TWO_PI - stirlingError(a)
  const logDensity = (u: number) => constant - a * expExcess(2 * u)
  const bound = (u: number) => logDensity(u) + logBound(Math.exp(u))

  const peak = findPeak(bound, -700, 3, Math.min(0.01, 0.05 / Math.sqrt(df)))
  const floor = bound(peak) - REACH
  // The spectra of the density, variance 2 df, and of an edge in f, variance slope², add up: an error of exp(−36).
  const step = Math.min(0.1, 0.42 / Math.sqrt(df), 0.74 / Math.sqrt(2 * df + slope * slope))
  let sum = 0
  for (let u = peak; bound(u) > floor; u -= step) sum += Math.exp(logDensity(u)) * f(Math.exp(u))
  for (let u = peak + step; bound(u) > floor; u += step) sum += Math.exp(logDensity(u)) * f(Math.exp(u))
  return sum * step
}

/** exp(x) − 1 − x, to full accuracy near 0 too. */
function expExcess(x: number): number {
  return Math.abs(x) < 1e-4 ? x * x * (0.5 + x * (1 / 6 + x / 24)) : Math.expm1(x) - x
}

/** Where a concave function on [low, high] is largest, to within `width`. */
function findPeak(f: (u: number) => number, low: number, high: number, width: number): number {
  const golden = (Math.sqrt(5) - 1) / 2
  let a = low
  let b = high
  while (b - a > width) {
    const left = b - golden * (b - a)
    const right = a + golden * (b - a)
    if (f(left) < f(right)) a = left
    else b = right
  }
  return 0.5 * (a + b)
}
