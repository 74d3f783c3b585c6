import { productNormalUpper } from '../distributions/dunnett'
import { studentizedRangeUpper } from '../distributions/studentized-range'
import { upperQuantile } from '../distributions/upper-quantile'
import { atLeastOneOf } from '../procedures/sidak'
import { negativelyCorrelatedUpper } from './negative-correlation'

/**
 * `rho`: common correlation of two-sided z tests, in (−1 / (m − 1), 1]. `allPairsOf`: number of equal groups whose
 * pairs are all compared by two-sided t tests with the pooled variance on `df` degrees of freedom (default Infinity,
 * z tests); m is then ignored.
 */
export type DependenceOptions = { rho?: number; allPairsOf?: number; df?: number }

/**
 * The probability of at least one false rejection among m true null hypotheses, each tested at `alpha` without
 * correction. Independent tests by default: 1 − (1 − alpha)^m; otherwise exact under the dependence of `options`
 * (about 1e-10 absolute, 1e-8 for rho below 0).
 * Throws RangeError for alpha outside (0, 1), m not a positive integer, and options out of range.
 */
export function familyWiseError(alpha: number, m: number, options: DependenceOptions = {}): number {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  const { rho, allPairsOf, df = Infinity } = options
  if (allPairsOf !== undefined) return allPairsError(alpha, allPairsOf, df)
  if (!(Number.isSafeInteger(m) && m >= 1)) throw new RangeError(`m is a positive integer, not ${m}`)
  return rho === undefined ? atLeastOneOf(m, alpha) : equicorrelatedError(alpha, m, rho)
}

/** P(Q > √2 t) with t the two-sided critical value of one pair: exact for equal groups. */
function allPairsError(alpha: number, groups: number, df: number): number {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`the number of groups is an integer of at least 2, not ${groups}`)
  }
  return studentizedRangeUpper(Math.SQRT2 * upperQuantile('t', alpha, [df]), groups, df)
}

function equicorrelatedError(alpha: number, m: number, rho: number): number {
  if (!(rho <= 1) || (m > 1 && !(rho > -1 / (m - 1)) && !(m === 2 && rho === -1))) {
    throw new RangeError(`${m} tests cannot all have the correlation ${rho}`)
  }
  // Two tests: turning the sign of one leaves the two-sided tests as they are.
  const correlation = m === 2 ? Math.abs(rho) : rho
  if (m === 1 || correlation === 1) return alpha
  if (correlation === 0) return atLeastOneOf(m, alpha)
  const critical = upperQuantile('z', alpha, [])
  return correlation > 0
    ? productNormalUpper(critical, new Array<number>(m).fill(Math.sqrt(correlation)))
    : negativelyCorrelatedUpper(critical, m, -correlation)
}
