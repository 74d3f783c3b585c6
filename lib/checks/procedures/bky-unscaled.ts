import { firstStageLevel } from './bky'
import { adjustInTwoStages } from './two-stage'

/**
 * The same two-stage procedure as 'bky' in its other convention: first stage at alpha / (1 + alpha), adjusted p =
 * BH m0 / m, to be held against alpha / (1 + alpha) instead of alpha. Rejects the same hypotheses.
 * Source: Benjamini, Krieger and Yekutieli (2006), Biometrika 93, 491–507, definition 6.
 */
export function bkyUnscaled(sorted: Float64Array, m: number, alpha: number): Float64Array {
  return adjustInTwoStages(sorted, m, firstStageLevel(alpha), 1)
}
