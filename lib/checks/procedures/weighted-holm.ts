import type { AdjustInOrder } from './in-order'
import { sortOrder } from './sort-order'
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
  const levels = p.map((value, i) => levelOf(value, shares[i] ?? 0))
  const order = sortOrder(levels)

  // Summed from the end, so that no small remainder is the difference of large sums.
  const remaining = new Float64Array(p.length)
  let held = 0
  for (let rank = order.length - 1; rank >= 0; rank--) {
    held += shares[order[rank] ?? 0] ?? 0
    remaining[rank] = held
  }
  const unspent = Math.max(0, 1 - held)

  const adjusted = new Float64Array(p.length)
  let largest = 0
  order.forEach((i, rank) => {
    const level = levels[i] ?? Infinity
    const value = level === Infinity ? 1 : level * Math.min(1, (remaining[rank] ?? 0) + unspent)
    largest = Math.min(1, Math.max(largest, value))
    adjusted[i] = largest
  })
  return adjusted
}
