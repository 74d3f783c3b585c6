import { expect, test } from 'vitest'
import {
  dunnettLoadings,
  dunnettQuantile,
  dunnettUpper,
  familyWiseError,
  studentizedRangeQuantile,
  tail,
} from '@/lib/checks'

const equal = (treatments: number) => new Array<number>(treatments).fill(Math.SQRT1_2)
const round = (value: number, decimals: number) => Number(value.toFixed(decimals))

test('one-sided 5% points are those of a reprinted table', () => {
  // A textbook's appendix (its table 11), equal groups; columns 2, 3, 4, 5, 6 treatments, as far as they were read.
  const table: [df: number, values: number[]][] = [
    [5, [2.44, 2.68, 2.85, 2.98, 3.08]],
    [10, [2.15, 2.34, 2.47, 2.56, 2.64]],
    [16, [2.06, 2.23, 2.34, 2.43, 2.5]],
    [20, [2.03, 2.19, 2.3, 2.39, 2.46]],
    [60, [1.95, 2.1, 2.21, 2.28]],
    [Infinity, [1.92, 2.06, 2.16, 2.23, 2.29]],
  ]
  for (const [df, values] of table) {
    const found = values.map((_, i) => round(dunnettQuantile(0.05, equal(i + 2), df, 1), 2))
    expect(found, `df ${df}`).toEqual(values)
  }
})

test('five entries of that table are out by one in their last digit', () => {
  // Double integration in R 4.2.2; the table prints 3.07, 2.33, 2.35, 2.39 and 2.56.
  for (const [df, treatments, computed, printed] of [
    [6, 8, 3.0643, 3.07],
    [30, 5, 2.3352, 2.33],
    [60, 6, 2.3448, 2.35],
    [60, 7, 2.3954, 2.39],
    [Infinity, 15, 2.5653, 2.56],
  ] as const) {
    const found = dunnettQuantile(0.05, equal(treatments), df, 1)
    expect(round(found, 4), `${treatments} on ${df}`).toBe(computed)
    expect(Math.abs(found - printed)).toBeLessThan(0.0065)
    expect(Math.abs(found - printed)).toBeGreaterThan(0.005)
  }
})

test('two-sided 5% points', () => {
  // Double integration in R 4.2.2, four decimals; Dunnett's tables print 3.03, 3.29, 3.48 and 2.57, 2.76, 2.89 for 5 and
  // 10 df (from memory).
  for (const [df, values] of [
    [5, [3.0302, 3.2932, 3.4759]],
    [10, [2.5683, 2.759, 2.8905]],
    [12, [2.5024, 2.6829, 2.8071]],
    [20, [2.3787, 2.5403, 2.651]],
    [60, [2.2653, 2.4099, 2.5084]],
  ] as const) {
    const found = values.map((_, i) => round(dunnettQuantile(0.05, equal(i + 2), df), 4))
    expect(found, `df ${df}`).toEqual(values)
  }
})

test('three doses of thirty against thirty controls, one-sided', () => {
  // Statistics FAQ of the MRC Cognition and Brain Sciences Unit prints 2.084034 by a quasi-random routine; double
  // integration in R 4.2.2 gives 2.0835354.
  const found = dunnettQuantile(0.05, equal(3), 116, 1)
  expect(found).toBeCloseTo(2.0835354, 6)
  expect(Math.abs(found - 2.084034)).toBeLessThan(0.0006)
})

test('one comparison is the t test, far into the tail and for any sizes', () => {
  for (const df of [1, 3, 17, 400, Infinity]) {
    for (const t of [0.2, 1.7, 4, 12, 30]) {
      for (const loadings of [dunnettLoadings(10, [10]), dunnettLoadings(3, [40])]) {
        for (const sides of [1, 2] as const) {
          const wanted = df === Infinity ? tail('z', t, [], sides) : tail('t', t, [df], sides)
          const found = dunnettUpper(t, loadings, df, sides)
          expect(Math.abs(found / wanted - 1), `t ${t}, df ${df}, ${sides} sides`).toBeLessThan(1e-9)
        }
      }
    }
  }
})

test('comparisons without correlation are independent', () => {
  for (const t of [0.5, 1.96, 3.5, 8, 25]) {
    const p = tail('z', t, [])
    const wanted = -Math.expm1(6 * Math.log1p(-p))
    expect(Math.abs(dunnettUpper(t, new Array<number>(6).fill(0), Infinity) / wanted - 1)).toBeLessThan(1e-9)
  }
})

test('the p-value lies between that of one comparison and Bonferroni’s', () => {
  const loadings = dunnettLoadings(12, [5, 8, 20, 30])
  for (const df of [4, 25, 70]) {
    for (const t of [1, 2.5, 6, 20]) {
      const raw = tail('t', t, [df])
      const found = dunnettUpper(t, loadings, df)
      expect(found).toBeGreaterThan(raw)
      expect(found).toBeLessThanOrEqual(Math.min(1, 4 * raw))
    }
  }
})

test('a one-sided p beyond one half of statistics in the wrong direction', () => {
  // With equal correlations 1/2 and known variance P(max Z_i > 0) of k is k / (k + 1): the control is the largest of
  // k + 1 alike with probability 1 / (k + 1).
  for (const treatments of [1, 2, 3, 7]) {
    const found = dunnettUpper(0, equal(treatments), Infinity, 1)
    expect(found).toBeCloseTo(treatments / (treatments + 1), 11)
    expect(dunnettUpper(-1, equal(treatments), 15, 1)).toBeGreaterThan(found)
  }
})

test('the critical value holds the level that it was made for', () => {
  for (const sizes of [
    [10, 10, 10],
    [20, 8, 5, 13],
    [6, 30, 30, 30, 30],
  ]) {
    const [control = NaN, ...treatments] = sizes
    const loadings = dunnettLoadings(control, treatments)
    for (const p of [0.2, 0.05, 1e-4]) {
      for (const sides of [1, 2] as const) {
        const critical = dunnettQuantile(p, loadings, 22, sides)
        expect(Math.abs(dunnettUpper(critical, loadings, 22, sides) / p - 1)).toBeLessThan(1e-9)
      }
    }
    // Without correction, the same distribution at the t of one test.
    const rate = familyWiseError(0.05, 1, { manyToOneOf: treatments.length, df: 22, sizes })
    expect(rate).toBeGreaterThan(0.05)
    expect(rate).toBeLessThan(familyWiseError(0.05, treatments.length))
  }
})

test('what is no comparison with a control is refused', () => {
  expect(() => dunnettUpper(2, [], 10)).toThrow(RangeError)
  expect(() => dunnettUpper(2, [1], 10)).toThrow(RangeError)
  expect(() => dunnettUpper(2, [0.5], 0.5)).toThrow(RangeError)
  expect(dunnettUpper(NaN, [0.5], 5)).toBeNaN()
})

test('the studentized range at 5% and 1%', () => {
  // Double quadrature in R 4.2.2, three decimals; Harter (1960) and Pearson and Hartley print the same to two, from
  // memory. Columns: 2, 3, 4, 5, 6 and 10 means; at 1% 2 to 5.
  const five: [df: number, values: number[]][] = [
    [5, [3.635, 4.602, 5.218, 5.673, 6.033, 6.995]],
    [10, [3.151, 3.877, 4.327, 4.654, 4.912, 5.598]],
    [16, [2.998, 3.649, 4.046, 4.333, 4.557, 5.15]],
    [20, [2.95, 3.578, 3.958, 4.232, 4.445, 5.008]],
    [30, [2.888, 3.486, 3.845, 4.102, 4.301, 4.824]],
    [60, [2.829, 3.399, 3.737, 3.977, 4.163, 4.646]],
    [120, [2.8, 3.356, 3.685, 3.917, 4.096, 4.56]],
    [Infinity, [2.772, 3.314, 3.633, 3.858, 4.03, 4.474]],
  ]
  for (const [df, values] of five) {
    const found = [2, 3, 4, 5, 6, 10].map((k) => round(studentizedRangeQuantile(0.05, k, df), 3))
    expect(found, `df ${df}`).toEqual(values)
  }
  const one: [df: number, values: number[]][] = [
    [10, [4.482, 5.27, 5.769, 6.136]],
    [20, [4.024, 4.639, 5.018, 5.293]],
    [Infinity, [3.643, 4.12, 4.403, 4.603]],
  ]
  for (const [df, values] of one) {
    const found = [2, 3, 4, 5].map((k) => round(studentizedRangeQuantile(0.01, k, df), 3))
    expect(found, `df ${df}`).toEqual(values)
  }
})
