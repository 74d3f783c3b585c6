import { expect, test } from 'vitest'
import { summarize, type SummaryGroup } from '@/lib/checks'

const good: SummaryGroup = { group: 'low tide', n: 8, mean: 3.2, sd: 0.7 }
const other = (given: Partial<{ group: string; n: number; mean: number; sd: number }>): SummaryGroup[] => [
  good,
  { group: 'high tide', n: 8, mean: 4.1, sd: 0.8, ...given },
]

test('what no summary of a group can be is refused by the name of the group', () => {
  for (const [given, message] of [
    [{ n: 1 }, /high tide.*at least 2.*1/],
    [{ n: 7.5 }, /high tide.*integer/],
    [{ n: NaN }, /high tide.*integer/],
    [{ mean: NaN }, /high tide.*mean/],
    [{ mean: Infinity }, /high tide.*mean/],
    [{ mean: -1e200 }, /high tide.*mean/],
    [{ sd: 1e-200 }, /high tide.*sd/],
    [{ sd: 1e200 }, /high tide.*sd/],
    [{ sd: -0.1 }, /high tide.*sd/],
    [{ sd: NaN }, /high tide.*sd/],
    [{ group: 'low tide' }, /two groups are called 'low tide'/],
  ] as const) {
    expect(() => summarize(other(given)), JSON.stringify(given)).toThrow(RangeError)
    expect(() => summarize(other(given)), JSON.stringify(given)).toThrow(message)
  }
})

test('designs that cannot be compared are refused', () => {
  expect(() => summarize([])).toThrow(/at least two groups/)
  expect(() => summarize([good])).toThrow(/at least two groups/)
  expect(() =>
    summarize([
      { ...good, sd: 0 },
      { group: 'b', n: 3, mean: 1, se: 0 },
    ]),
  ).toThrow(/spread of every group is 0/)
  expect(() => summarize(other({}), { control: 'slack water' })).toThrow(/slack water/)
  expect(() => summarize(other({}), { alpha: 0 })).toThrow(RangeError)
  expect(() => summarize(other({}), { confidence: 1 })).toThrow(RangeError)
})

test('a group needs either the sd or the se', () => {
  const both = { group: 'both', n: 4, mean: 1, sd: 1, se: 0.5 } as unknown as SummaryGroup
  const none = { group: 'none', n: 4, mean: 1 } as unknown as SummaryGroup
  expect(() => summarize([good, both])).toThrow(/both.*either/)
  expect(() => summarize([good, none])).toThrow(/none.*either/)
})

test('equal means give t = 0, and very small groups still have every test', () => {
  const equal = summarize(other({ mean: 3.2 }))
  expect(equal.anova.f).toBe(0)
  expect(equal.comparisons[0]?.pooled.p).toBe(1)
  const smallest = summarize([
    { group: 'a', n: 2, mean: 1, sd: 0.1 },
    { group: 'b', n: 2, mean: 2, sd: 3 },
    { group: 'c', n: 2, mean: 5, sd: 0.0001 },
  ])
  for (const { adjusted } of smallest.comparisons) {
    for (const { procedure, p } of adjusted) {
      expect(Number.isFinite(p) && (p ?? NaN) > 0 && (p ?? NaN) <= 1, `${procedure} ${p}`).toBe(true)
    }
  }
})
