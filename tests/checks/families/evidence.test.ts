import { expect, test } from 'vitest'
import { adjustRanges, invert } from '@/lib/checks/families/adjusted'
import { combine } from '@/lib/checks/families/interval'
import { canonicalNames, isSameName } from '@/lib/checks/families/names'

test('consistent evidence is intersected, contradictory evidence is joined', () => {
  expect(combine([])).toBeNull()
  expect(
    combine([
      { low: 0.01, high: 0.03 },
      { low: 0.02, high: 0.04 },
    ]),
  ).toEqual({
    range: { low: 0.02, high: 0.03 },
    conflict: false,
  })
  expect(
    combine([
      { low: 0.01, high: 0.02 },
      { low: 0.1, high: 0.2 },
      { low: 0.01, high: 0.2 },
    ]),
  ).toEqual({
    range: { low: 0.01, high: 0.2 },
    conflict: true,
  })
})

// 1 - (1 - p)^m and min(1, m p): arithmetic; Holm by R's p.adjust for p = .001, .008, .012, .021, .039, .2
// (.006, .04, .048, .063, .078, .2), as the reference vector of the procedures has it.
test('ranges are adjusted end by end', () => {
  const raw = [0.001, 0.008, 0.012, 0.021, 0.039, 0.2].map((p) => ({ low: p, high: p }))
  const holm = adjustRanges('holm', raw, 6, 0.05).map(({ high }) => Number(high.toFixed(4)))
  expect(holm).toEqual([0.006, 0.04, 0.048, 0.063, 0.078, 0.2])
  expect(adjustRanges('bonferroni', [{ low: 0.0075, high: 0.0085 }], 6, 0.05)).toEqual([
    { low: 0.045, high: expect.closeTo(0.051, 12) },
  ])
})

test('a single-step procedure takes an m below the number of tests as it is', () => {
  const raw = [0.01, 0.02, 0.03].map((p) => ({ low: p, high: p }))
  expect(adjustRanges('bonferroni', raw, 2, 0.05).map(({ low }) => low)).toEqual([0.02, 0.04, 0.06])
  expect(adjustRanges('holm', raw, 2, 0.05)[0]?.low).toBeCloseTo(0.03, 12)
})

test('a member of which nothing is known may have any p', () => {
  const [first, second] = adjustRanges('holm', [{ low: 0.02, high: 0.02 }, null], 2, 0.05)
  expect(first).toEqual({ low: expect.closeTo(0.02, 12), high: expect.closeTo(0.04, 12) })
  expect(second?.high).toBe(1)
})

test('an adjusted value at the cap leaves every larger raw p possible', () => {
  expect(invert('bonferroni', { low: 0.9995, high: 1 }, 6)).toEqual({ low: 0.9995 / 6, high: 1 })
  expect(invert('holm', { low: 0.0395, high: 0.0405 }, 4)).toEqual({ low: 0.0395 / 4, high: 0.0405 })
})

test('names of one group are brought together, names that are compared stay apart', () => {
  const canon = canonicalNames(
    [
      ['untreated control', 'red lamp'],
      ['kelp', 'kelp + sand'],
    ],
    [['control', 'blue lamp']],
  )
  expect(canon('the untreated control')).toBe('control')
  expect(canon('Kelp')).toBe('kelp')
  expect(canon('kelp + sand')).toBe('kelp + sand')
  expect(isSameName('-20 °C', '20 °C')).toBe(false)
})
