import { checkGroups } from './shaffer'

/** Bell(8) = 4140 partitions are searched; beyond that it is no longer done at once. */
const MOST_GROUPS = 8

/** Which pairs are equal, one bit each, and how many. */
type State = { equal: number; count: number }

/**
 * Shaffer's S2 for pairwise comparisons: as S1, but t_j is the largest number of equal pairs among the partitions of
 * the groups in which every pair that is already rejected differs. It is at most S1 and needs to know the pairs:
 * `pairs[i]` holds the two groups of `p[i]`, numbered from 0. Equal p-values are rejected together. Pairs that are not
 * shown act as p = 1. NaN stays NaN and counts as not shown.
 * Controls the family-wise error rate under any dependence of the pairwise tests.
 * Throws RangeError for a number of groups outside 2 … 8, for lists that differ in length, for a pair that is none or
 * stands twice, and for p outside [0, 1].
 * Source: Shaffer (1986), J Am Stat Assoc 81, 826–831, modification 2; partitions by restricted growth strings,
 * Knuth, The Art of Computer Programming 4A, 7.2.1.5.
 */
export function adjustShafferS2(
  p: readonly number[],
  pairs: readonly (readonly [number, number])[],
  groups: number,
): number[] {
  const bits = readPairs(p, pairs, groups)
  const states = listStates(groups).sort((a, b) => b.count - a.count)
  const order = p.flatMap((value, i) => (Number.isNaN(value) ? [] : [{ value, i, bit: bits[i] ?? 0 }]))
  order.sort((a, b) => a.value - b.value)

  const adjusted = p.map(() => NaN)
  let rejected = 0
  let held = 0
  let at = 0
  let largest = 0
  order.forEach(({ value, i, bit }, rank) => {
    if (value !== order[rank - 1]?.value) {
      rejected |= held
      held = 0
      while (((states[at]?.equal ?? 0) & rejected) !== 0) at++
    }
    held |= bit
    largest = Math.min(1, Math.max(largest, (states[at]?.count ?? 1) * value))
    adjusted[i] = largest
  })
  return adjusted
}

function readPairs(
  p: readonly number[],
  pairs: readonly (readonly [number, number])[],
  groups: number,
): number[] {
  checkGroups(groups)
  if (groups > MOST_GROUPS)
    throw new RangeError(`S2 is computed for at most ${MOST_GROUPS} groups, not ${groups}`)
  if (pairs.length !== p.length) throw new RangeError('p-values and pairs differ in number')
  for (const value of p) {
    if (value < 0 || value > 1) throw new RangeError(`a p-value lies in [0, 1], not at ${value}`)
  }
  const seen = new Set<number>()
  return pairs.map(([a, b]) => {
    const within = (group: number) => Number.isSafeInteger(group) && group >= 0 && group < groups
    if (!within(a) || !within(b) || a === b)
      throw new RangeError(`${a} and ${b} are no pair of ${groups} groups`)
    const bit = bitOf(a, b)
    if (seen.has(bit)) throw new RangeError(`the pair of ${a} and ${b} stands twice`)
    seen.add(bit)
    return bit
  })
}

/** Pairs in the order (0,1), (0,2), (1,2), (0,3) …: 28 bits for 8 groups. */
function bitOf(a: number, b: number): number {
  const [low, high] = a < b ? [a, b] : [b, a]
  return 1 << ((high * (high - 1)) / 2 + low)
}

/** Every partition of the groups, by the pairs that it makes equal. */
function listStates(groups: number): State[] {
  let partitions: { blocks: number[]; equal: number; count: number }[] = [{ blocks: [], equal: 0, count: 0 }]
  for (let group = 0; group < groups; group++) {
    partitions = partitions.flatMap(({ blocks, equal, count }) => {
      const used = Math.max(-1, ...blocks)
      return Array.from({ length: used + 2 }, (_, block) => {
        const mates = blocks.flatMap((own, mate) => (own === block ? [mate] : []))
        const pairs = mates.reduce((set, mate) => set | bitOf(mate, group), 0)
        return { blocks: [...blocks, block], equal: equal | pairs, count: count + mates.length }
      })
    })
  }
  return partitions
}
