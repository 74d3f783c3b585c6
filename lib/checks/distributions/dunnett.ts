import { normalDensity, normalLogUpper, normalUpper } from './normal'
import { averageOverScale } from './scale-mixture'
import { UNDERFLOW } from './special'
import { tLogTwoSided } from './student-t'

const WIDTH = 9.5

/** Loadings that occur several times are computed once. */
function countEqual(loadings: readonly number[]): [loading: number, times: number][] {
  const counts = new Map<number, number>()
  for (const loading of loadings) counts.set(loading, (counts.get(loading) ?? 0) + 1)
  return [...counts]
}

/**
 * P(max |Z_i| > d), or P(max Z_i > d) for `sides` 1, for standard normals with correlations λ_i λ_j, λ_i in (−1, 1):
 * ∫ φ(z) {1 − Π P(−d < λ_i z + √(1 − λ_i²) ε < d)} dz, by the trapezoidal rule. Any number of tests.
 * Source: Dunnett and Sobel (1955), Biometrika 42, 258–260.
 */
export function productNormalUpper(d: number, loadings: readonly number[], sides: 1 | 2 = 2): number {
  const distinct = countEqual(loadings)
  const growth = distinct.reduce((sum, [l, times]) => sum + (times * l * l) / (1 - l * l), 1)
  const step = Math.max(1e-4, Math.min(0.3, 0.74 / Math.sqrt(growth)))
  const steepest = distinct.reduce((largest, [l]) => Math.max(largest, Math.abs(l)), 0)
  const reach = WIDTH + Math.max(0, steepest * d)
  let sum = 0
  // Two-sided, the integrand is the same at z and −z.
  const first = sides === 2 ? 0 : -Math.ceil(reach / step)
  for (let j = first; j <= reach / step; j++) {
    const z = j * step
    let log = 0
    for (const [loading, times] of distinct) {
      const rest = Math.sqrt((1 - loading) * (1 + loading))
      const above = normalUpper((d - loading * z) / rest)
      const below = sides === 2 ? normalUpper((d + loading * z) / rest) : 0
      log += times * Math.log1p(-Math.min(1, above + below))
    }
    sum -= (sides === 2 && j > 0 ? 2 : 1) * normalDensity(z) * Math.expm1(log)
  }
  return Math.min(1, sum * step)
}

/**
 * Dunnett: P(max |T_i| > |t|) (`sides` 2) or P(max T_i > t) (`sides` 1) over the comparisons with one control,
 * `loadings` λ_i = √(n_i / (n_i + n_0)), `df` of the pooled variance. Equal groups: λ = √½. Relative accuracy about 1e-9.
 * NaN for t that is NaN. Throws RangeError for no loadings, loadings outside (−1, 1) and df below 1.
 * Source: Dunnett (1955), J Am Stat Assoc 50, 1096–1121.
 */
export function dunnettUpper(t: number, loadings: readonly number[], df: number, sides: 1 | 2 = 2): number {
  if (loadings.length === 0) throw new RangeError('Dunnett takes at least one comparison')
  if (!loadings.every((loading) => Math.abs(loading) < 1))
    throw new RangeError('loadings lie between −1 and 1')
  if (Number.isNaN(t)) return NaN
  const d = sides === 2 ? Math.abs(t) : t
  if (sides === 2 && d === 0) return 1
  // Bonferroni's bound: where it is below what a double holds, so is the probability.
  if (d > 0 && Math.log(loadings.length) + tLogTwoSided(d, df) < UNDERFLOW) return 0
  const count = Math.log(sides * loadings.length)
  const logBound = (s: number) => (d > 0 ? Math.min(0, count + normalLogUpper(d * s)) : 0)
  return Math.min(
    1,
    averageOverScale(df, (s) => productNormalUpper(d * s, loadings, sides), logBound),
  )
}
