import { expect, test } from 'vitest'
import { logTail, tail } from '@/lib/checks'
import { readReference, toNumber, type Printed } from '../reference'

// mpmath at 50 digits, rounded to double; the studentized range by double quadrature in R (header of dists.json).
// Tolerance: 1e-11 relative; logarithms near 0 absolutely to 1e-15.
type Row = {
  fn: string
  x: Printed
  df?: Printed
  df1?: Printed
  df2?: Printed
  upper: Printed
  log_upper: Printed
}
type Range = { q: number; nmeans: number; df: Printed; upper: number }
type Correlation = { r: number; n: number; p: number; log_p: number }
const reference = readReference<{ probability: Row[]; correlation: Correlation[]; ptukey: Range[] }>(
  'dists.json',
)

function compare(found: number, wanted: number, tolerance: number, what: unknown) {
  if (found === wanted) return
  expect(Math.abs(found - wanted) / Math.abs(wanted), JSON.stringify(what)).toBeLessThan(tolerance)
}

const FUNCTIONS = [
  ['pnorm', 'z', 60],
  ['pt', 't', 300],
  ['pf', 'F', 300],
  ['pchisq', 'chi2', 250],
] as const

for (const [fn, kind, least] of FUNCTIONS) {
  test(`upper tails of ${kind} agree with 50-digit values down to 1e-300`, () => {
    const rows = reference.probability.filter((row) => row.fn === fn)
    expect(rows.length).toBeGreaterThanOrEqual(least)
    for (const row of rows) {
      const df = [row.df, row.df1, row.df2].filter((value) => value !== undefined).map(toNumber)
      const tolerance = 1e-11
      compare(tail(kind, toNumber(row.x), df, 1), toNumber(row.upper), tolerance, row)
      const log = logTail(kind, toNumber(row.x), df, 1)
      if (Math.abs(log - toNumber(row.log_upper)) > 1e-15)
        compare(log, toNumber(row.log_upper), tolerance, row)
    }
  })
}

test('two-sided p-values of correlations agree with 50-digit values', () => {
  expect(reference.correlation.length).toBeGreaterThanOrEqual(80)
  for (const row of reference.correlation) {
    compare(tail('r', row.r, [row.n - 2]), row.p, 1e-11, row)
    const log = logTail('r', row.r, [row.n - 2])
    if (Math.abs(log - row.log_p) > 1e-15) compare(log, row.log_p, 1e-11, row)
  }
})

test('upper tails of the studentized range agree with the quadrature in R down to 1e-120', () => {
  expect(reference.ptukey.length).toBeGreaterThanOrEqual(600)
  for (const row of reference.ptukey)
    compare(tail('q', row.q, [row.nmeans, toNumber(row.df)]), row.upper, 1e-11, row)
})

test('the range of two means is √2 |t|', () => {
  for (const [t, df] of [
    [0.3, 1],
    [2.1, 1.5],
    [4, 12],
    [9, 40],
    [30, 200],
    [2.5, 1e12],
    [1e30, 2],
    [1e120, 1],
  ] as const) {
    compare(tail('q', Math.SQRT2 * t, [2, df]), tail('t', t, [df]), 1e-11, { t, df })
  }
})

test('beyond what a double holds the logarithm goes on', () => {
  expect(tail('z', 60, [])).toBe(0)
  // Mills' ratio: log P(Z > x) = −x²/2 − log(x √(2π)) + log(1 − 1/x² + …)
  expect(logTail('z', 60, [], 1)).toBeCloseTo(-1800 - Math.log(60 * Math.sqrt(2 * Math.PI)) - 1 / 3600, 6)
  expect(tail('F', 1e300, [4, 30])).toBe(0)
  expect(logTail('F', 1e300, [4, 30])).toBeLessThan(-9000)
})

test('t and F pass into z and χ² as the degrees of freedom grow', () => {
  // First order in 1 / df; at 2.2 and at 1.7 on 8 df the ratios less 1 are 8.2 / df and 16.3 / df.
  for (const df of [1e6, 1e8, 1e10]) {
    expect(Math.abs((tail('t', 2.2, [df]) / tail('z', 2.2, []) - 1) * df - 8.2)).toBeLessThan(0.1)
    expect(Math.abs((tail('F', 1.7, [8, df]) / tail('chi2', 13.6, [8]) - 1) * df - 16.25)).toBeLessThan(0.1)
  }
  compare(tail('F', 1, [1e9, 1e9]), 0.5, 1e-9, 'the median of F on equal degrees of freedom')
})

test('no statistic that can be printed is left without a p-value', () => {
  for (const df of [0.5, 1, 1.5, 3, 17, 120, 4821, 1e5, 1e7]) {
    for (let x = 1e-8; x < 1e8; x *= 1.7) {
      for (const df2 of [0.5, 1, 2.4, 33, 999, 1e6]) {
        const p = tail('F', x, [df, df2])
        expect(p >= 0 && p <= 1, `F ${x} on ${df}, ${df2}`).toBe(true)
      }
      const t = tail('t', x, [df])
      const chi2 = tail('chi2', x, [df])
      expect(t >= 0 && t <= 1 && chi2 >= 0 && chi2 <= 1, `t or χ² ${x} on ${df}`).toBe(true)
    }
  }
})

test('degrees of freedom that a test does not have are refused', () => {
  expect(() => tail('t', 2, [])).toThrow(RangeError)
  expect(() => tail('z', 2, [4])).toThrow(RangeError)
  expect(() => tail('F', 2, [4, 0])).toThrow(RangeError)
  expect(() => tail('chi2', 2, [Infinity])).toThrow(RangeError)
  expect(() => tail('q', 2, [2.5, 10])).toThrow(RangeError)
  expect(() => tail('q', 2, [3, 0.5])).toThrow(RangeError)
  expect(tail('q', NaN, [3, 10])).toBeNaN()
  expect(() => tail('r', 1.2, [10])).toThrow(RangeError)
  expect(tail('t', NaN, [3])).toBeNaN()
})
