import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjust, parsePrintedP, survivesRange, survivesRanges } from '@/lib/checks'

const read = (text: string) => {
  const printed = parsePrintedP(text)
  if (printed === null) throw new Error(`${text} is no p-value`)
  return { low: printed.low, high: printed.high }
}

test('p printed .008 holds to five tests for certain, is undecided at six and fails from seven', () => {
  // Common practice: .05 / .0085 = 5.88, .05 / .0075 = 6.67.
  expect(survivesRange(read('.008'), 0.05)).toEqual({ certain: 5, possible: 6, failsFrom: 7 })
  expect(survivesRange({ low: 0.012, high: 0.012 }, 0.05)).toEqual({ certain: 4, possible: 4, failsFrom: 5 })
  expect(survivesRange(read('.050'), 0.05)).toEqual({ certain: 0, possible: 1, failsFrom: 2 })
  expect(survivesRange(read('.2'), 0.05)).toEqual({ certain: 0, possible: 0, failsFrom: 1 })
  expect(survivesRange(read('<.001'), 0.05)).toEqual({ certain: 50, possible: Infinity, failsFrom: Infinity })
  expect(() => survivesRange({ low: 0.2, high: 0.1 }, 0.05)).toThrow(RangeError)
})

const family = fc.array(
  fc.record({
    p: fc.double({ min: 1e-4, max: 0.1, noNaN: true }),
    width: fc.double({ min: 0, max: 0.01, noNaN: true }),
  }),
  { minLength: 1, maxLength: 6 },
)

for (const procedure of ['holm', 'bh'] as const) {
  test(`${procedure}: what is certain holds at both ends and what fails does at both`, () => {
    fc.assert(
      fc.property(
        family,
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 6, maxLength: 6 }),
        (given, at) => {
          const intervals = given.map(({ p, width }) => ({ low: p, high: p + width }))
          // Any values inside the intervals.
          const inside = given.map(({ p, width }, i) => p + width * (at[i] ?? 0))
          survivesRanges(procedure, intervals, 0.05).forEach(({ certain, possible, failsFrom }, i) => {
            const valueAt = (m: number) => adjust(procedure, inside, { m })[i] ?? NaN
            expect(failsFrom).toBe(possible + 1)
            expect(certain).toBeLessThanOrEqual(possible)
            if (certain > 0) expect(valueAt(certain)).toBeLessThanOrEqual(0.05 * (1 + 1e-9))
            const first = Math.max(failsFrom, inside.length)
            expect(valueAt(first)).toBeGreaterThan(0.05 * (1 - 1e-9))
          })
        },
      ),
      { numRuns: 200, seed: 3 },
    )
  })
}

test('a single value is the same by all three', () => {
  const interval = read('.004')
  expect(survivesRanges('holm', [interval], 0.05)).toEqual([survivesRange(interval, 0.05)])
  expect(survivesRanges('bh', [interval], 0.05)).toEqual([survivesRange(interval, 0.05)])
})
