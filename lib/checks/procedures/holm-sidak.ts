import { atLeastOneOf } from './sidak'
import { stepDown } from './sorted-family'

/**
 * Holm's step-down order with Šidák's bound: max over j <= i of 1 − (1 − p(j))^(m − j + 1). Controls the
 * family-wise error rate where Šidák's inequality holds.
 * Source: Holland and Copenhaver (1987), An improved sequentially rejective Bonferroni test procedure,
 * Biometrics 43, 417–423.
 */
export function holmSidak(sorted: Float64Array, m: number): Float64Array {
  return stepDown(sorted, (p, i) => atLeastOneOf(m - i, p))
}
