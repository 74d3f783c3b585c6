import { normalDensity, normalLogUpper, normalUpper } from './normal'
import { averageOverScale } from './scale-mixture'
import { UNDERFLOW } from './special'
import { tLogTwoSided } from './student-t'

/** Grid of the trapezoidal rule for the largest of `groups` normals: its values do not depend on the range. */
type Grid = { start: number; step: number; weight: Float64Array; inverse: Float64Array }

const FIRST = -9
const LAST = 39
const grids = new Map<number, Grid>()

/** The step falls with √groups, so that the rule's error, exp(−2π² / (groups step²)), stays below 1e-15. */
function getGrid(groups: number): Grid {
  const known = grids.get(groups)
  if (known !== undefined) return known
  const step = Math.min(0.3, 0.74 / Math.sqrt(groups))
  const size = Math.ceil((LAST - FIRST) / step)
  const inverse = new Float64Array(size)
  const weight = new Float64Array(size)
  for (let j = 0; j < size; j++) {
    const z = FIRST + j * step
    const log = normalLogUpper(-z)
    inverse[j] = Math.exp(-log)
    weight[j] = step * groups * normalDensity(z) * Math.exp((groups - 1) * log)
  }
  const grid = { start: FIRST, step, weight, inverse }
  grids.set(groups, grid)
  return grid
}

/**
 * P(range of `groups` independent standard normals > w), groups >= 2, w >= 0, with relative accuracy:
 * ∫ k φ(z) [Φ(z)^(k−1) − (Φ(z) − Φ(z − w))^(k−1)] dz over the largest value z.
 * Source: Hartley (1942), Biometrika 32, 334–348; the difference of powers written so that it does not cancel.
 */
export function rangeUpper(w: number, groups: number): number {
  if (w > 60) return 0
  const { start, step, weight, inverse } = getGrid(groups)
  const from = Math.max(0, Math.floor((w / 2 - 7.5 - start) / step))
  const to = Math.min(weight.length - 1, Math.ceil((Math.max(9, w / 2 + 7.5) - start) / step))
  let sum = 0
  for (let j = from; j <= to; j++) {
    const share = Math.min(1, normalUpper(w - (start + j * step)) * (inverse[j] ?? 1))
    sum += (weight[j] ?? 0) * (share === 1 ? 1 : -Math.expm1((groups - 1) * Math.log1p(-share)))
  }
  return Math.min(1, sum)
}

/**
 * P(Q > q) for the studentized range of `groups` >= 2 means on `df` >= 1 degrees of freedom (Infinity: known
 * variance). Relative accuracy about 1e-11 down to 1e-100. NaN for q that is NaN. Throws RangeError for `groups` that
 * is no integer or below 2, and for df below 1.
 */
export function studentizedRangeUpper(q: number, groups: number, df: number): number {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`the studentized range takes an integer number of groups, at least 2, not ${groups}`)
  }
  if (!(df >= 1)) throw new RangeError(`the studentized range takes at least 1 degree of freedom, not ${df}`)
  if (Number.isNaN(q)) return NaN
  if (q <= 0) return 1
  if (q === Infinity) return 0
  // Bonferroni's bound: where it is below what a double holds, so is the probability.
  if (Math.log(0.5 * groups * (groups - 1)) + tLogTwoSided(q * Math.SQRT1_2, df) < UNDERFLOW) return 0
  const pairs = Math.log(groups * (groups - 1))
  const logBound = (s: number) => Math.min(0, pairs + normalLogUpper(q * s * Math.SQRT1_2))
  return Math.min(
    1,
    averageOverScale(df, (s) => rangeUpper(q * s, groups), logBound),
  )
}
