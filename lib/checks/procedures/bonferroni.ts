import { singleStep } from './sorted-family'

/**
 * Bonferroni: min(1, m p). Controls the family-wise error rate under any dependence.
 * Source: Dunn (1961), Multiple comparisons among means, J Am Stat Assoc 56, 52–64.
 */
export function bonferroni(sorted: Float64Array, m: number): Float64Array {
  return singleStep(sorted, (p) => m * p)
}
