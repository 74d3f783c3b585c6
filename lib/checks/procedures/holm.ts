import { stepDown } from './sorted-family'

/**
 * Holm, step-down: max over j <= i of (m − j + 1) p(j). Controls the family-wise error rate under any dependence.
 * Source: Holm (1979), A simple sequentially rejective multiple test procedure, Scand J Stat 6, 65–70.
 */
export function holm(sorted: Float64Array, m: number): Float64Array {
  return stepDown(sorted, (p, i) => (m - i) * p)
}
