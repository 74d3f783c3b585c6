import { stepUp } from './sorted-family'

/**
 * Hochberg, step-up: min over j >= i of (m − j + 1) p(j). Controls the family-wise error rate for independent
 * tests and where Simes's inequality holds.
 * Source: Hochberg (1988), A sharper Bonferroni procedure for multiple tests of significance, Biometrika 75, 800–802.
 */
export function hochberg(sorted: Float64Array, m: number): Float64Array {
  return stepUp(sorted, (p, i) => (m - i) * p)
}
