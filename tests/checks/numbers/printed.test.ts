import fc from 'fast-check'
import { expect, test } from 'vitest'
import { parsePrinted, parsePrintedP, pBounds, printedInterval, roundingInterval, tail } from '@/lib/checks'
import { readReference } from '../reference'

// Intervals as R made them for rounding.json: '0.03' -> [0.025, 0.035] cut to [0, 1], '<0.001' -> [0, 0.001].
type Problem = { reported: string[]; p_lower: number[]; p_upper: number[] }
const { problems } = readReference<{ problems: Problem[] }>('rounding.json')

test('printed p-values stand for the intervals of the reference', () => {
  let compared = 0
  for (const { reported, p_lower, p_upper } of problems) {
    reported.forEach((text, i) => {
      if (text === 'ns') return
      const printed = parsePrintedP(text)
      expect(printed?.low, text).toBe(p_lower[i])
      expect(printed?.high, text).toBe(p_upper[i])
      compared++
    })
  }
  expect(compared).toBeGreaterThan(500)
})

test('printed numbers are read with their relation and their decimals', () => {
  expect(parsePrinted('.030')).toEqual({ relation: '=', value: 0.03, decimals: 3 })
  expect(parsePrinted('0.03')).toEqual({ relation: '=', value: 0.03, decimals: 2 })
  expect(parsePrinted('3.2e-5')).toEqual({ relation: '=', value: 3.2e-5, decimals: 6 })
  expect(parsePrinted('3.2e−5')).toEqual({ relation: '=', value: 3.2e-5, decimals: 6 })
  expect(parsePrinted('1.5e3')).toEqual({ relation: '=', value: 1500, decimals: -2 })
  expect(parsePrinted('< .001')).toEqual({ relation: '<', value: 0.001, decimals: 3 })
  expect(parsePrinted('≥ 0.5')).toEqual({ relation: '>=', value: 0.5, decimals: 1 })
  expect(parsePrinted('−2.10')).toEqual({ relation: '=', value: -2.1, decimals: 2 })
  expect(parsePrinted('12')).toEqual({ relation: '=', value: 12, decimals: 0 })
  for (const text of ['', '.', 'ns', '0.03*', '1,5', '0..3', '1e999'])
    expect(parsePrinted(text), text).toBeNull()
})

test('relations turn into one-sided intervals', () => {
  expect(printedInterval(0.05, 2, '<')).toEqual({ low: 0, high: 0.05 })
  expect(printedInterval(0.05, 2, '<=')).toEqual({ low: 0, high: 0.05 })
  expect(printedInterval(0.2, 1, '>')).toEqual({ low: 0.2, high: 1 })
  expect(printedInterval(0.2, 1, '>=')).toEqual({ low: 0.2, high: 1 })
})

test('p-values are cut at 0 and 1 only where the print itself is possible', () => {
  expect(printedInterval(0, 3)).toEqual({ low: 0, high: 0.0005 })
  expect(printedInterval(1, 2)).toEqual({ low: 0.995, high: 1 })
  expect(printedInterval(1.2, 1)).toEqual({ low: 1.15, high: 1.25 })
})

test('every number lies in the rounding interval of its print', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -1e4, max: 1e4, noNaN: true }),
      fc.integer({ min: 0, max: 6 }),
      (x, decimals) => {
        const { value } = parsePrinted(x.toFixed(decimals)) ?? { value: NaN }
        const { low, high } = roundingInterval(value, decimals)
        const room = 1e-9 * Math.max(1, Math.abs(x)) * 10 ** -decimals
        expect(low - room <= x && x <= high + room).toBe(true)
        expect(high - low).toBeCloseTo(10 ** -decimals, 9)
      },
    ),
  )
})

test('p over the rounding of t(28) = 2.05 crosses 5%', () => {
  // R 4.2.2: 2 * pt(-2.055, 28) = 0.0493, 2 * pt(-2.045, 28) = 0.0504.
  const { low, high } = pBounds('t', 2.045, 2.055, [28])
  expect(low).toBeCloseTo(0.0493, 4)
  expect(high).toBeCloseTo(0.0504, 4)
})

test('statistics with corrected degrees of freedom follow them', () => {
  // R 4.2.2: F(2, 38) = 3.60 has p = .037, with the df times 0.62 F(1.24, 23.56) p = .062; t = 2.10 on 22.4 df .047.
  expect(tail('F', 3.6, [2, 38])).toBeCloseTo(0.037, 3)
  expect(tail('F', 3.6, [1.24, 23.56])).toBeCloseTo(0.062, 3)
  expect(tail('t', 2.1, [38])).toBeCloseTo(0.042, 3)
  expect(tail('t', 2.1, [22.4])).toBeCloseTo(0.047, 3)
  expect(tail('r', 0.35, [48])).toBeCloseTo(0.0127, 4)
})

test('an interval that holds 0 reaches p = 1', () => {
  expect(pBounds('t', -0.005, 0.005, [20]).high).toBe(1)
  expect(pBounds('z', -0.3, 0.1, []).low).toBeCloseTo(tail('z', 0.3, []), 15)
  expect(pBounds('F', -0.005, 0.005, [2, 20]).high).toBe(1)
})

test('negative statistics have the p-values of positive ones', () => {
  expect(pBounds('t', -2.055, -2.045, [28])).toEqual(pBounds('t', 2.045, 2.055, [28]))
  expect(pBounds('r', -0.36, -0.34, [48])).toEqual(pBounds('r', 0.34, 0.36, [48]))
})

test('a correlation printed as 1.00 is cut at 1', () => {
  expect(pBounds('r', 0.995, 1.005, [10]).low).toBe(0)
})

test('one-sided p-values are the smaller tail', () => {
  const two = pBounds('t', 2.045, 2.055, [28])
  const one = pBounds('t', 2.045, 2.055, [28], 1)
  expect(one.low).toBeCloseTo(two.low / 2, 15)
  expect(pBounds('chi2', 6.1, 6.2, [2], 1)).toEqual(pBounds('chi2', 6.1, 6.2, [2]))
})

test('fractional degrees of freedom widen the interval by their own rounding', () => {
  const exact = tail('t', 2.1, [22.4])
  const { low, high } = pBounds('t', 2.1, 2.1, [22.4])
  expect(low).toBe(tail('t', 2.1, [22.45]))
  expect(high).toBe(tail('t', 2.1, [22.35]))
  expect(low < exact && exact < high).toBe(true)
})

test('the bounds hold the p of every statistic inside', () => {
  const inside = fc.double({ min: 0, max: 1, noNaN: true })
  fc.assert(
    fc.property(
      fc.double({ min: -5, max: 5, noNaN: true }),
      inside,
      inside,
      fc.integer({ min: 1, max: 200 }),
      (a, width, at, df) => {
        const { low, high } = pBounds('t', a, a + width, [df])
        const p = tail('t', a + at * width, [df])
        expect(p).toBeGreaterThanOrEqual(low - 1e-14)
        expect(p).toBeLessThanOrEqual(high + 1e-14)
      },
    ),
  )
  expect(() => pBounds('t', 2, 1, [5])).toThrow(RangeError)
})
