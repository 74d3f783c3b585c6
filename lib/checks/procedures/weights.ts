/** Room for rounding errors in a sum of weights. */
const SLACK = 1e-9

/**
 * The weights of `size` hypotheses: those given, or 1 / m each. What they leave of 1 stays with members that are not
 * shown, or unspent. Throws RangeError where their number is not `size`, where one is negative or no number, and
 * where they add up to more than 1.
 */
export function readWeights(given: readonly number[] | undefined, size: number, m: number): Float64Array {
  if (given === undefined) return new Float64Array(size).fill(1 / m)
  if (given.length !== size) {
    throw new RangeError(`there are ${given.length} weights for ${size} p-values: each takes one`)
  }
  let sum = 0
  for (const weight of given) {
    if (!(weight >= 0)) throw new RangeError(`a weight is at least 0, not ${weight}`)
    sum += weight
  }
  if (sum > 1 + SLACK) throw new RangeError(`the weights add up to ${sum}, which is more than 1`)
  return Float64Array.from(given)
}

/** The smallest level at which p is rejected by its share `weight`: p / weight; without a share only p = 0 is. */
export function levelOf(p: number, weight: number): number {
  return p === 0 ? 0 : p / weight
}

/** The same where a hypothesis without a share is not tested at all, whatever its p: it waits for those before it. */
export function levelInTurn(p: number, weight: number): number {
  return weight > 0 ? p / weight : Infinity
}
