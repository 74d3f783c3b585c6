import { stepUp } from './sorted-family'

/**
 * Benjamini–Hochberg, step-up: min over j >= i of (m / j) p(j). Controls the false discovery rate for independent
 * tests and under positive regression dependence.
 * Source: Benjamini and Hochberg (1995), J R Stat Soc B 57, 289–300.
 */
export function bh(sorted: Float64Array, m: number): Float64Array {
  return stepUp(sorted, (p, i) => (m / (i + 1)) * p)
}
