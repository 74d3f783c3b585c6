import type { AdjustInOrder } from './in-order'
import { rankValues } from './rank-values'
import { levelOf, readWeights } from './weights'

/**
 * Weighted Holm, step-down by p / w: max over j <= i of (p(j) / w(j)) times the weight that is not yet spent on
 * rejected hypotheses. It is the closure of weighted Bonferroni with the weights of an intersection in proportion.
 * Weights as in weighted Bonferroni (default 1 / m each, which gives Holm); what they leave of 1 counts as held by
 * members that are never rejected. A hypothesis without weight is rejected only for p = 0. Controls the family-wise
 * error rate under any dependence. O(n log n). Source: Holm (1979), Scand J Stat 6, 65–70, section 4.
 */
export const weightedHolm: AdjustInOrder = (p, { m, weights }) => {
  const shares = readWeights(weights, p.length, m)
  const levels = new Float64Array(p.length)
  for (let i = 0; i < p.length; i++) levels[i] = levelOf(p[i] ?? 1, shares[i] ?? 0)
  const { values, places } = rankValues(levels)
  const adjusted = new Float64Array(p.length)
  const held = sumFromEnd(shares, places, adjusted)
  const unspent = Math.max(0, 1 - held)

  let largest = 0
  for (let rank = 0; rank < values.length; rank++) {
    const i = places[rank] ?? 0
    const level = values[rank] ?? Infinity
    const value = level === Infinity ? 1 : level * Math.min(1, (adjusted[i] ?? 0) + unspent)
    if (value > largest) largest = Math.min(1, value)
    adjusted[i] = largest
  }
  return adjusted
}

/**
 * Into `sums`, at each place, the shares of this rank and all later ones: summed from the end, so that no small
 * remainder is the difference of large sums. Answers the sum of all.
 */
function sumFromEnd(shares: Float64Array, places: Uint32Array, sums: Float64Array): number {
  let held = 0
  for (let rank = places.length - 1; rank >= 0; rank--) {
    const i = places[rank] ?? 0
    held += shares[i] ?? 0
    sums[i] = held
  }
  return held
}
