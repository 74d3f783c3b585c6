/**
 * What `adjustInOrder` of a procedure is given beside the p-values: `m` >= their number, the size of the whole family;
 * and, as far as the caller gave them, one weight a hypothesis, the transition matrix, the number of groups.
 */
export type InOrderOptions = {
  m: number
  weights: readonly number[] | undefined
  transitions: readonly (readonly number[])[] | undefined
  groups: number | undefined
}

/**
 * What every procedure implements that needs more than the set of p-values: `p` in input order, each in [0, 1], with
 * 1 for unknown ones, which thus hold their place and their weight. Answers the adjusted p-values in the same order,
 * each in [0, 1]. Throws RangeError for options that do not fit.
 */
export type AdjustInOrder = (p: Float64Array, options: InOrderOptions) => Float64Array
