import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjust, survivesUpTo, survivesUpToByBh, survivesUpToByHolm } from '@/lib/checks'

test('the largest family that a p-value survives under Bonferroni is alpha / p, rounded down', () => {
  // Common practice: p = .012 holds to 4 tests at 5%; p printed .008 holds to 5 for certain and to 6 at best.
  expect(survivesUpTo(0.012, 0.05)).toBe(4)
  expect(survivesUpTo(0.0085, 0.05)).toBe(5)
  expect(survivesUpTo(0.0075, 0.05)).toBe(6)
  expect(survivesUpTo(0.2, 0.05)).toBe(0)
  expect(survivesUpTo(0.05, 0.05)).toBe(1)
  expect(survivesUpTo(0, 0.05)).toBe(Infinity)
  expect(survivesUpTo(NaN, 0.05)).toBeNaN()
  expect(() => survivesUpTo(0.01, 1)).toThrow(RangeError)
})

test('thresholds divided evenly are met exactly', () => {
  for (const alpha of [0.05, 0.01, 0.1, 0.025]) {
    for (let m = 1; m <= 500; m++) expect(survivesUpTo(alpha / m, alpha), `${alpha} / ${m}`).toBe(m)
  }
  expect(survivesUpTo(0.005, 0.05)).toBe(10)
  expect(survivesUpTo(0.0001, 0.05)).toBe(500)
})

const vector = fc.array(fc.double({ min: 1e-4, max: 0.2, noNaN: true }), { minLength: 1, maxLength: 8 })

for (const [procedure, find] of [
  ['holm', survivesUpToByHolm],
  ['bh', survivesUpToByBh],
] as const) {
  test(`${procedure}: the value is kept at that size and not at the next`, () => {
    fc.assert(
      fc.property(vector, (p) => {
        find(p, 0.05).forEach((most, i) => {
          const at = (m: number) => adjust(procedure, p, { m })[i] ?? NaN
          if (most === 0) expect(at(p.length)).toBeGreaterThan(0.05)
          else {
            expect(at(most)).toBeLessThanOrEqual(0.05 * (1 + 1e-9))
            expect(at(most + 1)).toBeGreaterThan(0.05)
          }
        })
      }),
      { numRuns: 300 },
    )
  })

  test(`${procedure}: unknown values stay unknown and do not count`, () => {
    const [first, unknown, last] = find([0.001, NaN, 0.3], 0.05)
    expect(unknown).toBeNaN()
    expect(first).toBe(50)
    expect(last).toBe(0)
  })
}
