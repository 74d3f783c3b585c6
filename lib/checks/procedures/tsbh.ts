import { adjustInTwoStages } from './two-stage'

/**
 * Adaptive Benjamini–Hochberg in two stages: the first stage is Benjamini–Hochberg at `alpha` itself, adjusted p =
 * BH m0 / m, to be held against that alpha only. A common variant of the two-stage procedure of Benjamini, Krieger
 * and Yekutieli (2006), Biometrika 93, 491–507, without the lowered level by which theirs controls the false
 * discovery rate exactly; it controls that rate approximately for independent tests. Not monotone (see two-stage.ts).
 */
export function tsbh(sorted: Float64Array, m: number, alpha: number): Float64Array {
  return adjustInTwoStages(sorted, m, alpha, 1)
}
