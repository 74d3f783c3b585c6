import { expect, test } from 'vitest'
import { adjust, adjustShafferS2, listTrueCounts, type CatalogueProcedure } from '@/lib/checks'
import { readReference } from '../reference'

// Closed testing by brute force in base R 4.2.2 (comparisons.R beside the file): every intersection, its weights by the
// rule of the procedure; Shaffer by every partition of the groups. Tolerance there and here: absolute 1e-12.
const IN_ORDER = [
  'weighted-bonferroni',
  'weighted-holm',
  'fixed-sequence',
  'fallback',
  'graphical',
] as const satisfies readonly CatalogueProcedure[]
type Closed = { p: number[]; weights: number[]; transitions: number[][] } & Record<
  (typeof IN_ORDER)[number],
  number[]
>
type Pairwise = { groups: number; p: number[]; pairs: [number, number][]; s1: number[]; s2: number[] }
const { closed, pairwise } = readReference<{ closed: Closed[]; pairwise: Pairwise[] }>('comparisons.json')

const largestMiss = (found: readonly number[], wanted: readonly number[]) => {
  expect(found.length).toBe(wanted.length)
  return Math.max(...found.map((value, i) => Math.abs(value - (wanted[i] ?? NaN))))
}

for (const procedure of IN_ORDER) {
  test(`${procedure} agrees with closed testing by brute force in R`, () => {
    expect(closed.length).toBeGreaterThanOrEqual(240)
    for (const item of closed) {
      const { p, weights, transitions } = item
      const options = {
        ...(procedure === 'fixed-sequence' ? {} : { weights }),
        ...(procedure === 'graphical' ? { transitions } : {}),
      }
      expect(largestMiss(adjust(procedure, p, options), item[procedure]), `${p}`).toBeLessThan(1e-12)
    }
  })
}

test('Shaffer’s S1 and S2 agree with a search of all partitions in R', () => {
  expect(pairwise.length).toBeGreaterThanOrEqual(200)
  for (const { groups, p, pairs, s1, s2 } of pairwise) {
    expect(largestMiss(adjust('shaffer', p, { groups }), s1), `${groups} groups, ${p}`).toBeLessThan(1e-12)
    expect(largestMiss(adjustShafferS2(p, pairs, groups), s2), `${groups} groups, ${p}`).toBeLessThan(1e-12)
  }
})

test('the possible numbers of equal pairs are the published ones', () => {
  // Shaffer (1986), J Am Stat Assoc 81, 826–831; the sets from memory, computed again by recursion in R.
  expect(listTrueCounts(3)).toEqual([0, 1, 3])
  expect(listTrueCounts(4)).toEqual([0, 1, 2, 3, 6])
  expect(listTrueCounts(5)).toEqual([0, 1, 2, 3, 4, 6, 10])
  expect(listTrueCounts(6)).toEqual([0, 1, 2, 3, 4, 6, 7, 10, 15])
})

test('the possible numbers of equal pairs follow Shaffer’s recursion up to 40 groups', () => {
  // S(k) is the union over j of j (j − 1) / 2 + S(k − j): the same article, its equation for S(k).
  const sets: Set<number>[] = [new Set([0])]
  for (let k = 1; k <= 40; k++) {
    const next = new Set<number>()
    for (let j = 1; j <= k; j++) for (const t of sets[k - j] ?? []) next.add((j * (j - 1)) / 2 + t)
    sets.push(next)
    if (k >= 2) expect(listTrueCounts(k)).toEqual([...next].sort((a, b) => a - b))
  }
})
