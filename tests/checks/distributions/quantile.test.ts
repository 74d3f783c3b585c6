import { expect, test } from 'vitest'
import { studentizedRangeQuantile, upperQuantile } from '@/lib/checks'
import { readReference, toNumber, type Printed } from '../reference'

// mpmath at 50 digits; the studentized range by double quadrature in R (header of dists.json). Tolerance 1e-10 relative.
type Row = { fn: string; p_upper: number; df?: Printed; df1?: Printed; df2?: Printed; q: Printed }
type Range = { p_upper: number; nmeans: number; df: Printed; q: number }
const reference = readReference<{ quantile: Row[]; qtukey: Range[] }>('dists.json')

const FUNCTIONS = [
  ['qnorm', 'z', 20],
  ['qt', 't', 300],
  ['qchisq', 'chi2', 280],
  ['qf', 'F', 200],
] as const

for (const [fn, kind, least] of FUNCTIONS) {
  test(`critical values of ${kind} agree with 50-digit values down to p = 1e-300`, () => {
    const rows = reference.quantile.filter((row) => row.fn === fn)
    expect(rows.length).toBeGreaterThanOrEqual(least)
    for (const row of rows) {
      const df = [row.df, row.df1, row.df2].filter((value) => value !== undefined).map(toNumber)
      const found = upperQuantile(kind, row.p_upper, df, 1)
      const gap = Math.abs(found - toNumber(row.q))
      expect(gap, JSON.stringify(row)).toBeLessThanOrEqual(1e-10 * Math.abs(toNumber(row.q)))
    }
  })
}

test('critical values of the studentized range agree with the quadrature in R', () => {
  expect(reference.qtukey.length).toBeGreaterThanOrEqual(380)
  for (const row of reference.qtukey) {
    const found = studentizedRangeQuantile(row.p_upper, row.nmeans, toNumber(row.df))
    expect(Math.abs(found - row.q), JSON.stringify(row)).toBeLessThan(1e-9 * row.q)
  }
})

test('two-sided critical values halve the level', () => {
  expect(upperQuantile('z', 0.05, [])).toBeCloseTo(upperQuantile('z', 0.025, [], 1), 12)
  expect(upperQuantile('t', 0.05, [12])).toBeCloseTo(upperQuantile('t', 0.025, [12], 1), 12)
  expect(upperQuantile('t', 1, [12])).toBe(0)
  expect(() => upperQuantile('t', 0, [12])).toThrow(RangeError)
})
