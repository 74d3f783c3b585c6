/**
 * Bonferroni: min(1, m p). Controls the family-wise error rate under any dependence.
 * Source: Dunn (1961), Multiple comparisons among means, J Am Stat Assoc 56, 52–64.
 */
export function bonferroni(sorted: Float64Array, m: number): Float64Array {
  return sorted.map((p) => Math.min(1, m * p))
}
