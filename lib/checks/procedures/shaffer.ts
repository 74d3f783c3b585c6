import type { AdjustInOrder } from './in-order'
import { rankValues } from './rank-values'

const pairsOf = (groups: number) => (groups * (groups - 1)) / 2

/** The least number of groups among which `pairs` pairs can be equal if all of them are one block. */
const blockFor = (pairs: number) => Math.ceil((1 + Math.sqrt(1 + 8 * pairs)) / 2 - 1e-9)

/**
 * The numbers of pairs of `groups` means that can be equal at the same time, ascending: sums of b (b − 1) / 2 over the
 * blocks b of a partition of the groups. For 4 groups 0, 1, 2, 3 and 6: if four of the six are equal, all are.
 *
 * A number t is possible when the fewest groups that hold t equal pairs are at most `groups`: f(t) = min over the
 * largest block b of b + f(t − b (b − 1) / 2). From the largest b downwards the search ends once even a single block
 * for the rest would take too many groups, so that a million pairs take less than a second.
 * Throws RangeError for `groups` that is no integer or below 2. Source: Shaffer (1986), J Am Stat Assoc 81, 826–831.
 */
export function listTrueCounts(groups: number): number[] {
  checkGroups(groups)
  const fewest = new Uint32Array(pairsOf(groups) + 1)
  const possible = [0]
  for (let t = 1; t < fewest.length; t++) {
    let least = Infinity
    for (let block = Math.floor((1 + Math.sqrt(1 + 8 * t)) / 2 + 1e-9); block >= 2; block--) {
      const rest = t - pairsOf(block)
      const bound = rest === 0 ? 0 : blockFor(rest)
      least = Math.min(least, block + (fewest[rest] ?? 0))
      const smaller = bound <= block ? block + bound > least : (2 * t) / (block - 1) > least
      if (smaller) break
    }
    fewest[t] = least
    if (least <= groups) possible.push(t)
  }
  return possible
}

/**
 * Shaffer's S1 for pairwise comparisons: Holm's step-down order with the largest number of hypotheses that can still
 * be true in place of all that are left: max over j <= i of t_j p(j), t_j the largest possible number of equal pairs
 * of `groups` means that is at most k (k − 1) / 2 − j + 1. `p`: the pairs in any order, at most k (k − 1) / 2 of them;
 * those that are not shown act as p = 1. S1 does not look at which pairs are rejected (see `adjustShafferS2` for that).
 * Controls the family-wise error rate under any dependence of the pairwise tests.
 * Throws RangeError for a missing or wrong number of groups, for more p-values than pairs and for another m.
 * Source: Shaffer (1986), J Am Stat Assoc 81, 826–831, modification 1.
 */
export const shaffer: AdjustInOrder = (p, { m, groups }) => {
  if (groups === undefined) throw new RangeError('Shaffer takes the number of groups')
  checkGroups(groups)
  const pairs = pairsOf(groups)
  if (p.length > pairs) throw new RangeError(`${groups} groups have ${pairs} pairs, not ${p.length}`)
  if (m !== p.length && m !== pairs)
    throw new RangeError(`all pairs of ${groups} groups are ${pairs}, not ${m}`)

  const counts = listTrueCounts(groups)
  const { values, places } = rankValues(p)
  const adjusted = new Float64Array(p.length)
  let top = counts.length - 1
  let largest = 0
  for (let rank = 0; rank < values.length; rank++) {
    while (top > 0 && (counts[top] ?? 0) > pairs - rank) top--
    largest = Math.min(1, Math.max(largest, (counts[top] ?? 1) * (values[rank] ?? 1)))
    adjusted[places[rank] ?? 0] = largest
  }
  return adjusted
}

export function checkGroups(groups: number) {
  if (!(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`pairwise comparisons take an integer number of groups, at least 2, not ${groups}`)
  }
}
