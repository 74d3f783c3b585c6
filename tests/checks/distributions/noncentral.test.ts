import { expect, test } from 'vitest'
import { noncentralFTails, noncentralTBeyond, noncentralTLower, noncentralTUpper, tail } from '@/lib/checks'
import { readReference } from '../reference'

// mpmath at 400 digits, as mixtures of central tails (noncentral.py beside the file). Tolerance: 1e-10 relative or 1e-13 absolute.
type TRow = { t: number; df: number; ncp: number; upper: number; lower: number }
type FRow = { x: number; df1: number; df2: number; ncp: number; upper: number; lower: number }
const reference = readReference<{ t: TRow[]; f: FRow[] }>('noncentral.json')

function expectNear(found: number, wanted: number, what: unknown, absolute = 1e-13) {
  const room = Math.max(1e-10 * wanted, absolute)
  expect(Math.abs(found - wanted), JSON.stringify(what)).toBeLessThanOrEqual(room)
}

test('both tails of noncentral t agree with values of many digits', () => {
  expect(reference.t.length).toBe(175)
  for (const row of reference.t) {
    const { t, df, ncp, upper, lower } = row
    // The tail on the side of the statistic to 10 digits of its own, however small.
    expectNear(noncentralTUpper(t, df, ncp), upper, row, t > 0 ? 1e-300 : 1e-13)
    expectNear(noncentralTLower(t, df, ncp), lower, row, t < 0 ? 1e-300 : 1e-13)
  }
})

test('both tails of noncentral F agree with values of many digits', () => {
  expect(reference.f.length).toBe(180)
  for (const row of reference.f) {
    const { lower, upper } = noncentralFTails(row.x, row.df1, row.df2, row.ncp)
    expectNear(lower, row.lower, row, 1e-290)
    expectNear(upper, row.upper, row, 1e-290)
  }
})

test('without noncentrality they are the central distributions', () => {
  expectNear(noncentralTUpper(2.1, 12, 0), tail('t', 2.1, [12], 1), 't')
  expectNear(noncentralTBeyond(2.1, 12, 0), tail('t', 2.1, [12]), 't, both sides')
  expectNear(noncentralFTails(3.2, 3, 40, 0).upper, tail('F', 3.2, [3, 40]), 'F')
  expectNear(noncentralFTails(3.2, 3, Infinity, 0).upper, tail('chi2', 9.6, [3]), 'χ² over its df')
  expectNear(noncentralTUpper(2.1, Infinity, 1.4), tail('z', 0.7, [], 1), 'z')
})

test('noncentral F on one degree of freedom is the square of noncentral t', () => {
  for (const [t, df, ncp] of [
    [0.3, 5, 1.2],
    [2.2, 18, 3],
    [6, 64, 4.5],
    [3, 400, 0.2],
  ] as const) {
    expectNear(noncentralFTails(t * t, 1, df, ncp * ncp).upper, noncentralTBeyond(t, df, ncp), { t, df, ncp })
  }
})

test('large noncentralities and statistics stay probabilities', () => {
  for (const ncp of [0, 1e-8, 3, 1e3, 1e5]) {
    for (const x of [1e-12, 0.5, 7, 1e4, 1e12]) {
      const { lower, upper } = noncentralFTails(x, 4, 30, ncp)
      expect(Math.abs(lower + upper - 1), `x ${x}, ncp ${ncp}`).toBeLessThan(1e-9)
      expect(noncentralTUpper(x, 30, Math.sqrt(ncp))).toBeLessThanOrEqual(1)
    }
  }
  expect(noncentralFTails(Infinity, 4, 30, 2)).toEqual({ lower: 1, upper: 0 })
  expect(noncentralFTails(-1, 4, 30, 2)).toEqual({ lower: 0, upper: 1 })
  expect(noncentralTUpper(Infinity, 5, 1)).toBe(0)
  expect(noncentralTUpper(NaN, 5, 1)).toBeNaN()
})

test('what is no noncentral distribution is refused', () => {
  expect(() => noncentralTUpper(2, 0.5, 1)).toThrow(RangeError)
  expect(() => noncentralTUpper(2, 5, Infinity)).toThrow(RangeError)
  expect(() => noncentralFTails(2, 0, 5, 1)).toThrow(RangeError)
  expect(() => noncentralFTails(2, 3, 5, -1)).toThrow(RangeError)
  expect(() => noncentralFTails(2, 3, 5, NaN)).toThrow(RangeError)
})
