import { dunnettUpper, productNormalUpper } from '../distributions/dunnett'
import { studentizedRangeUpper } from '../distributions/studentized-range'
import { upperQuantile } from '../distributions/upper-quantile'
import { dunnettLoadings } from '../procedures/dunnett'
import { atLeastOneOf } from '../procedures/sidak'
import { negativelyCorrelatedUpper } from './negative-correlation'

/**
 * `rho`: common correlation of two-sided z tests, in (−1 / (m − 1), 1]. `allPairsOf`: number of equal groups whose
 * pairs are all compared by two-sided t tests with the pooled variance on `df` degrees of freedom (default Infinity,
 * z tests); m is then ignored. `manyToOneOf`: number of treatments that are each compared with one control by such t
 * tests; `sizes`: the group sizes, the control's first, by default equal; m is ignored too.
 */
export type DependenceOptions = {
  rho?: number
  allPairsOf?: number
  manyToOneOf?: number
  sizes?: readonly number[]
  df?: number
}

/**
 * The probability of at least one false rejection among m true null hypotheses, each tested at `alpha` without
 * correction. Independent tests by default: 1 − (1 − alpha)^m; otherwise exact under the dependence of `options`
 * (about 1e-10 absolute, 1e-8 for rho below 0).
 * Throws RangeError for alpha outside (0, 1), m not a positive integer, and options out of range.
 */
export function familyWiseError(alpha: number, m: number, options: DependenceOptions = {}): number {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  const { rho, allPairsOf, manyToOneOf, sizes, df = Infinity } = options
  if (allPairsOf !== undefined) return allPairsError(alpha, allPairsOf, df)
  if (manyToOneOf !== undefined) return manyToOneError(alpha, manyToOneOf, sizes, df)
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

/** P(max |T_i| > t) with t the two-sided critical value of one comparison. */
function manyToOneError(
  alpha: number,
  treatments: number,
  sizes: readonly number[] | undefined,
  df: number,
): number {
  if (!(Number.isSafeInteger(treatments) && treatments >= 1)) {
    throw new RangeError(`the number of treatments is a positive integer, not ${treatments}`)
  }
  const [control = 1, ...others] = sizes ?? new Array<number>(treatments + 1).fill(1)
  if (others.length !== treatments || ![control, ...others].every((n) => n > 0 && n < Infinity)) {
    throw new RangeError(`${treatments} treatments and a control take ${treatments + 1} sizes above 0`)
  }
  return dunnettUpper(upperQuantile('t', alpha, [df]), dunnettLoadings(control, others), df)
}

/**
 * The largest family-wise error that m tests at `alpha` can have under any dependence: min(1, m alpha). Attained by
 * tests that never err together. Source: Boole's inequality. Throws RangeError as `familyWiseError` does.
 */
export function familyWiseErrorAtMost(alpha: number, m: number): number {
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  if (!(Number.isSafeInteger(m) && m >= 1)) throw new RangeError(`m is a positive integer, not ${m}`)
  return Math.min(1, m * alpha)
}

/**
 * The largest family-wise error of the protected least significant difference over all configurations of `groups` >= 2
 * equal groups, F test and t tests both at `alpha` with `df` >= 1 (default Infinity) degrees of freedom: alpha for up
 * to three groups, else that of all pairs of groups − 1 groups, as one far group lets the F test always reject.
 * Source: Hayter (1986), J Am Stat Assoc 81, 1000–1004. Throws RangeError as `familyWiseError` does.
 */
export function protectedLsdError(alpha: number, groups: number, df: number = Infinity): number {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`the number of groups is an integer of at least 2, not ${groups}`)
  }
  return groups <= 3 ? familyWiseError(alpha, 1) : familyWiseError(alpha, 1, { allPairsOf: groups - 1, df })
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
