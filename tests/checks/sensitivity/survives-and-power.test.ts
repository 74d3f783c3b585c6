import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  adjust,
  powerCost,
  powerOfTTest,
  sampleSizeOfTTest,
  survivesUpTo,
  survivesUpToByBh,
  survivesUpToByHolm,
} from '@/lib/checks'
import { readReference } from '../reference'

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

// R 4.2.2, power.t.test(strict = TRUE) and quadrature (header of fwer.json); absolute 1e-8, sample sizes exact.
type Power = {
  type: string
  n: number
  delta: number
  sd: number
  alpha_per_test: number
  power_strict: number
}
type Size = {
  type: string
  delta: number
  sd: number
  power_wanted: number
  alpha_per_test: number
  n_per_group: number | null
}
const reference = readReference<{ power_t: (Power & { m: number })[]; sample_size: Size[] }>('fwer.json')
const designOf = (type: string) => (type === 'paired' ? 'paired' : 'two-sample')

test('power of t tests agrees with R', () => {
  expect(reference.power_t.length).toBeGreaterThanOrEqual(280)
  for (const row of reference.power_t) {
    const found = powerOfTTest(designOf(row.type), row.n, row.delta / row.sd, row.alpha_per_test)
    expect(Math.abs(found - row.power_strict), JSON.stringify(row)).toBeLessThan(1e-8)
  }
})

test('sample sizes agree with R', () => {
  let compared = 0
  for (const row of reference.sample_size) {
    if (row.n_per_group === null) continue
    const found = sampleSizeOfTTest(
      designOf(row.type),
      row.power_wanted,
      row.delta / row.sd,
      row.alpha_per_test,
    )
    expect(found, JSON.stringify(row)).toBe(row.n_per_group)
    compared++
  }
  expect(compared).toBeGreaterThanOrEqual(60)
})

test('64 in each group find half a standard deviation with 80%, and with 60% after Bonferroni for 5 tests', () => {
  // R's help page of power.t.test, from memory: 0.8014586 (far tail left out, which is below 1e-6 here).
  const cost = powerCost('two-sample', 64, 0.5, 0.05, 5)
  expect(cost.without).toBeCloseTo(0.8014586, 5)
  // A test designed for 80%: .712, .658, .619, .565, .498 at alpha / 2, 3, 4, 6, 10 (z approximation in R; t a little less).
  const left = [2, 3, 4, 6, 10].map((m) => powerCost('two-sample', 64, 0.5, 0.05, m).with)
  const wanted = [0.712, 0.658, 0.619, 0.565, 0.498]
  left.forEach((value, i) => expect(Math.abs(value - (wanted[i] ?? NaN))).toBeLessThan(0.01))
})

test('power refuses what is no design', () => {
  expect(() => powerOfTTest('paired', 1, 0.5, 0.05)).toThrow(RangeError)
  expect(() => powerOfTTest('paired', 10, 0.5, 0)).toThrow(RangeError)
  expect(() => sampleSizeOfTTest('paired', 1, 0.5, 0.05)).toThrow(RangeError)
  expect(() => sampleSizeOfTTest('paired', 0.8, 0, 0.05)).toThrow(RangeError)
  expect(sampleSizeOfTTest('paired', 0.8, 1e-5, 0.05)).toBe(Infinity)
})
