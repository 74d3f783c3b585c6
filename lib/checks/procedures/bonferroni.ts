/**
 * Bonferroni: min(1, m p). Controls the family-wise error rate under any dependence.
 * Source: Dunn (1961), Multiple comparisons among means, J Am Stat Assoc 56, 52–64.
 */
export function bonferroni(p: number, m: number): number {
  const bound = m * p
  return bound < 1 ? bound : 1
}
