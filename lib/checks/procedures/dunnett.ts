import { dunnettUpper } from '../distributions/dunnett'

/**
 * λ_i = √(n_i / (n_i + n_0)): the correlations of the comparisons with one control are λ_i λ_j. `control` and every
 * element of `treatments` are group sizes above 0.
 */
export function dunnettLoadings(control: number, treatments: readonly number[]): number[] {
  return treatments.map((n) => Math.sqrt(n / (n + control)))
}

/**
 * Dunnett: P(max |T_i| > |t|) over `loadings.length` comparisons with one control, or P(max T_i > t) for `sides` 1.
 * `loadings` from the group sizes, or their number for equal groups; `df` > 0 of the pooled variance.
 * Source: Dunnett (1955), J Am Stat Assoc 50, 1096–1121.
 */
export function pDunnettFromT(
  t: number,
  loadings: readonly number[] | number,
  df: number,
  sides: 1 | 2 = 2,
): number {
  const list = typeof loadings === 'number' ? new Array<number>(loadings).fill(Math.SQRT1_2) : loadings
  return dunnettUpper(t, list, df, sides)
}
