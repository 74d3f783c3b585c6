import { adjustInTwoStages } from './two-stage'

/** The level of the first stage, alpha / (1 + alpha). */
export function firstStageLevel(alpha: number): number {
  return alpha / (1 + alpha)
}

/**
 * Two-stage linear step-up at level `alpha`, scaled: first stage at alpha / (1 + alpha), adjusted p = min(1, BH
 * (m0 / m) (1 + alpha)), to be held against that alpha only. Controls the false discovery rate for independent tests.
 * Not monotone (see two-stage.ts).
 * Source: Benjamini, Krieger and Yekutieli (2006), Biometrika 93, 491–507, definition 6.
 */
export function bky(sorted: Float64Array, m: number, alpha: number): Float64Array {
  return adjustInTwoStages(sorted, m, firstStageLevel(alpha), 1 + alpha)
}
