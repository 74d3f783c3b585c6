import type { AdjustInOrder } from './in-order'
import { levelInTurn, readWeights } from './weights'

/**
 * Fallback: the hypotheses are tested in the order given, each with its own share of the level and, where the one
 * before it was rejected, with all that this one had. Weights as in weighted Bonferroni (default 1 / m each); all
 * weight on the first gives the fixed sequence. Controls the family-wise error rate under any dependence where order
 * and weights were fixed beforehand. This is the procedure as first published, the closed test whose intersections
 * pass the weight of what they leave out on to the next member; later refinements also pass weight back.
 *
 * H_i is rejected at a level if, for some s <= i, all from s to i − 1 are and p_i <= level (w_s + … + w_i): the adjusted
 * p_i is the smallest over s of max(adjusted p_s … p_(i−1), p_i / (w_s + … + w_i)). The first term grows as s moves
 * back, the second falls, and the first takes a new value only at the suffix maxima, which are kept on a stack and
 * searched by bisection: O(n log n).
 * Source: Wiens (2003), Pharm Stat 2, 211–215; as a closed test Wiens and Dmitrienko (2005), J Biopharm Stat 15, 929–942.
 */
export const fallback: AdjustInOrder = (p, { m, weights }) => {
  const shares = readWeights(weights, p.length, m)
  const adjusted = new Float64Array(p.length)
  /** The suffix maxima of the adjusted values before i, and the weight up to and including where they stand. */
  const maxima = new Float64Array(p.length)
  const before = new Float64Array(p.length)
  let held = 0
  let total = 0

  for (let i = 0; i < p.length; i++) {
    const value = p[i] ?? 1
    const share = shares[i] ?? 0
    total += share

    // The first of the maxima, which fall from the bottom up, that is below what the weight since the one under it asks for.
    let low = 0
    let high = held
    while (low < high) {
      const middle = (low + high) >> 1
      const since = total - (middle > 0 ? (before[middle - 1] ?? 0) : 0)
      if ((maxima[middle] ?? 1) >= levelInTurn(value, since)) low = middle + 1
      else high = middle
    }
    const since = low < held ? total - (low > 0 ? (before[low - 1] ?? 0) : 0) : share
    const found = Math.min(1, low > 0 ? (maxima[low - 1] ?? 1) : 1, levelInTurn(value, since))

    adjusted[i] = found
    while (held > 0 && (maxima[held - 1] ?? 1) <= found) held--
    maxima[held] = found
    before[held] = total
    held++
  }
  return adjusted
}
