import { chiSquareLogUpper } from './chi-square'
import { correlationLogTwoSided, correlationLogUpper } from './correlation'
import { fLogUpper } from './f'
import { normalLogUpper, normalUpper } from './normal'
import { studentizedRangeUpper } from './studentized-range'
import { tLogTwoSided, tLogUpper } from './student-t'

export type TailTest = 't' | 'F' | 'chi2' | 'z' | 'r' | 'q'

const DF_COUNT: Record<TailTest, number> = { t: 1, F: 2, chi2: 1, z: 0, r: 1, q: 2 }

/**
 * The p-value of a test statistic: for z, t and r the two-sided one (`sides` 2, default) or the upper tail
 * (`sides` 1); for F, χ² and the studentized range 'q' the upper tail, whatever `sides` is. `df`: [] for z, [df] for
 * t and χ², [df1, df2] for F, [n − 2] for r, [groups, df] for q; each above 0 (for q at least 1), Infinity allowed
 * for t, q and F's second; groups an integer >= 2. Below 0 the upper tail of F, χ² and q is 1.
 * Relative accuracy 1e-11 down to 1e-300 (q: to 1e-120). NaN for a value that is NaN, and for χ² on
 * more than 1e9 degrees of freedom where it does not settle.
 * Throws RangeError for another number of df, for df outside their range and for |r| > 1.
 */
export function tail(test: TailTest, value: number, df: readonly number[], sides: 1 | 2 = 2): number {
  checkDf(test, df)
  if (Number.isNaN(value)) return NaN
  const [first = Infinity, second = Infinity] = df
  switch (test) {
    case 'z':
      return sides === 2 ? 2 * normalUpper(Math.abs(value)) : normalUpper(value)
    case 'q':
      return studentizedRangeUpper(value, first, second)
    default:
      return Math.min(1, Math.exp(logTail(test, value, df, sides)))
  }
}

/** log of `tail` for the tests whose tail is known in logarithms; it does not underflow. Errors as in `tail`. */
export function logTail(
  test: Exclude<TailTest, 'q'>,
  value: number,
  df: readonly number[],
  sides: 1 | 2 = 2,
): number {
  checkDf(test, df)
  if (Number.isNaN(value)) return NaN
  const [first = Infinity, second = Infinity] = df
  switch (test) {
    case 'z':
      return sides === 2 ? Math.LN2 + normalLogUpper(Math.abs(value)) : normalLogUpper(value)
    case 't':
      return sides === 2 ? tLogTwoSided(value, first) : tLogUpper(value, first)
    case 'r':
      if (Math.abs(value) > 1) throw new RangeError(`a correlation lies in [−1, 1], not at ${value}`)
      return sides === 2 ? correlationLogTwoSided(value, first) : correlationLogUpper(value, first)
    case 'F':
      return value <= 0 ? 0 : fLogUpper(value, first, second)
    case 'chi2':
      return value <= 0 ? 0 : chiSquareLogUpper(value, first)
  }
}

function checkDf(test: TailTest, df: readonly number[]) {
  const count = DF_COUNT[test]
  if (df.length !== count) {
    throw new RangeError(`${test} takes ${count} degrees of freedom, not ${df.length}`)
  }
  df.forEach((value, i) => {
    const mayBeInfinite = test === 't' || (i === 1 && (test === 'F' || test === 'q'))
    if (!(value > 0) || (value === Infinity && !mayBeInfinite)) {
      throw new RangeError(`${value} degrees of freedom are out of range for ${test}`)
    }
  })
}
