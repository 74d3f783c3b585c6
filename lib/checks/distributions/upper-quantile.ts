import { dunnettUpper } from './dunnett'
import { solveDecreasing } from './solve'
import { studentizedRangeUpper } from './studentized-range'
import { logTail, tail, type TailTest } from './tail'

/**
 * The critical value x with tail(test, x, df, sides) = p, for p in (0, 1]; degrees of freedom and errors as in
 * `tail`. For one-sided z and t it is negative from p = 1/2. Relative accuracy 1e-10 (1e-9 for q).
 * Throws RangeError for p outside (0, 1] and for r, which has no use for it here.
 */
export function upperQuantile(
  test: Exclude<TailTest, 'r'>,
  p: number,
  df: readonly number[],
  sides: 1 | 2 = 2,
): number {
  if (!(p > 0 && p <= 1)) throw new RangeError(`p lies in (0, 1], not at ${p}`)
  if (sides === 1 && (test === 'z' || test === 't') && p >= 0.5) {
    return p === 0.5 ? 0 : -upperQuantile(test, 1 - p, df, 1)
  }
  if (p === 1) return 0
  const log =
    test === 'q' ? (x: number) => Math.log(tail('q', x, df)) : (x: number) => logTail(test, x, df, sides)
  return solveInLog(log, p)
}

/** Critical value of the studentized range: `groups`, `df` as in `studentizedRangeUpper`, p in (0, 1). */
export function studentizedRangeQuantile(p: number, groups: number, df: number): number {
  const bound = Math.SQRT2 * boundByBonferroni(p, (groups * (groups - 1)) / 2, df)
  return solveInLog((q) => Math.log(studentizedRangeUpper(q, groups, df)), p, bound)
}

/** Critical value of Dunnett's test: `loadings`, `df`, `sides` as in `dunnettUpper`, p in (0, 1), below 1/2 for one side. */
export function dunnettQuantile(
  p: number,
  loadings: readonly number[],
  df: number,
  sides: 1 | 2 = 2,
): number {
  const bound = boundByBonferroni(p, sides === 2 ? loadings.length : loadings.length / 2, df)
  return solveInLog((t) => Math.log(dunnettUpper(t, loadings, df, sides)), p, bound)
}

/** The two-sided critical value of t at p / count: a little above the exact one of `count` joint comparisons. */
function boundByBonferroni(p: number, count: number, df: number): number {
  return upperQuantile('t', Math.min(0.9, p / count), [df])
}

/** Starts from `near`, where one is known. */
function solveInLog(logUpper: (x: number) => number, p: number, near?: number): number {
  const target = Math.log(p)
  const f = (y: number) => Math.max(logUpper(Math.exp(y)), -1e6) - target
  return Math.exp(
    near === undefined ? solveDecreasing(f, 0) : solveDecreasing(f, Math.log(near), 0.02, 1e-13),
  )
}
