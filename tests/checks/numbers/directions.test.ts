import fc from 'fast-check'
import { expect, test } from 'vitest'
import { parsePrinted, pBounds, pBoundsOverSphericity, roundingInterval, tail } from '@/lib/checks'

const around = (text: string) => {
  const { value, decimals } = parsePrinted(text) ?? { value: NaN, decimals: 0 }
  return roundingInterval(value, decimals)
}
const expectNear = (found: { low: number; high: number }, low: number, high: number, digits: number) => {
  expect(found.low).toBeCloseTo(low, digits)
  expect(found.high).toBeCloseTo(high, digits)
}

test('t(28) = 2.05 in either direction', () => {
  // R 4.2.2: pt(c(2.055, 2.045), 28, lower = FALSE) = 0.0246579, 0.0251784; lower = TRUE 0.9753421, 0.9748216.
  const { low, high } = around('2.05')
  expectNear(pBounds('t', low, high, [28], 'greater'), 0.0246579, 0.0251784, 7)
  expectNear(pBounds('t', low, high, [28], 'less'), 0.9748216, 0.9753421, 7)
  expectNear(pBounds('t', low, high, [28]), 0.0493158, 0.0503569, 7)
})

test('a one-sided p in the direction that was named is the half, and beyond one half in the other', () => {
  for (const [kind, df] of [
    ['t', [12]],
    ['z', []],
    ['r', [30]],
  ] as const) {
    const at = kind === 'r' ? 0.4 : 1.9
    const two = pBounds(kind, at, at, df)
    const right = pBounds(kind, at, at, df, 'greater')
    const wrong = pBounds(kind, at, at, df, 'less')
    expect(right.low).toBeCloseTo(two.low / 2, 14)
    expect(wrong.low).toBeCloseTo(1 - two.low / 2, 14)
    expect(pBounds(kind, -at, -at, df, 'less')).toEqual(right)
    expect(wrong.low).toBeGreaterThan(0.5)
  }
})

test('the direction says nothing to F and χ²', () => {
  expect(pBounds('F', 3.5, 3.7, [2, 38], 'less')).toEqual(pBounds('F', 3.5, 3.7, [2, 38]))
  expect(pBounds('chi2', 6, 6.2, [2], 'greater')).toEqual(pBounds('chi2', 6, 6.2, [2]))
})

test('a statistic around 0 has one-sided p-values around one half', () => {
  const { low, high } = pBounds('t', -0.05, 0.05, [20], 'greater')
  expect(low).toBeLessThan(0.5)
  expect(high).toBeGreaterThan(0.5)
  expect(low + high).toBeCloseTo(1, 12)
  expect(pBounds('r', 0.995, 1.005, [10], 'greater').low).toBe(0)
  expect(pBounds('r', 0.995, 1.005, [10], 'less').high).toBe(1)
})

test('the bounds of a direction hold the p of every statistic inside', () => {
  const share = fc.double({ min: 0, max: 1, noNaN: true })
  fc.assert(
    fc.property(
      fc.double({ min: -5, max: 5, noNaN: true }),
      share,
      share,
      fc.integer({ min: 1, max: 100 }),
      (from, width, at, df) => {
        const t = from + at * width
        for (const [side, p] of [
          ['greater', tail('t', t, [df], 1)],
          ['less', tail('t', -t, [df], 1)],
        ] as const) {
          const { low, high } = pBounds('t', from, from + width, [df], side)
          expect(p).toBeGreaterThanOrEqual(low - 1e-14)
          expect(p).toBeLessThanOrEqual(high + 1e-14)
        }
      },
    ),
  )
})

test('F(2, 38) = 3.60 without sphericity: from .037 to .073, and .062 at ε = .62', () => {
  // R 4.2.2, pf(f, 2ε, 38ε, lower = FALSE): ε = 1, F 3.605: 0.0368496; ε = 1/2, F 3.595: 0.0732666; ε = .62, F 3.60:
  // 0.0622396; ε = .625, F 3.605: 0.0616377; ε = .615, F 3.595: 0.0628449.
  const { low, high } = around('3.60')
  expectNear(pBoundsOverSphericity(low, high, [2, 38]), 0.0368496, 0.0732666, 6)
  expectNear(pBoundsOverSphericity(low, high, [2, 38], around('.62')), 0.0616377, 0.0628449, 6)
  expectNear(pBoundsOverSphericity(3.6, 3.6, [2, 38], { low: 0.62, high: 0.62 }), 0.0622396, 0.0622396, 7)
})

test('degrees of freedom that were multiplied already are taken as printed', () => {
  const { low, high } = around('3.60')
  const found = pBoundsOverSphericity(low, high, [1.24, 23.56])
  expect(found).toEqual(pBounds('F', low, high, [1.24, 23.56]))
  expect(found.low < 0.0622396 && found.high > 0.0622396).toBe(true)
})

test('for one degree of freedom there is nothing to correct', () => {
  expect(pBoundsOverSphericity(4.1, 4.2, [1, 19])).toEqual(pBounds('F', 4.1, 4.2, [1, 19]))
})

test('an F that is not significant can have its smallest p at the lower bound of ε', () => {
  // R 4.2.2: pf(1, 6ε, 60ε, lower = FALSE) = 0.3408931 at ε = 1/6 and 0.43384 at 1.
  expectNear(pBoundsOverSphericity(1, 1, [6, 60]), 0.3408931, 0.43384, 6)
})

test('every ε has its p within the bounds', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 12, noNaN: true }),
      fc.integer({ min: 1, max: 9 }),
      fc.integer({ min: 5, max: 80 }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      (f, df1, subjects, at) => {
        const df2 = df1 * subjects
        const epsilon = 1 / df1 + at * (1 - 1 / df1)
        const { low, high } = pBoundsOverSphericity(f, f, [df1, df2])
        const p = tail('F', f, [epsilon * df1, epsilon * df2])
        expect(p).toBeGreaterThanOrEqual(low - 1e-9)
        expect(p).toBeLessThanOrEqual(high + 1e-9)
      },
    ),
    { numRuns: 200 },
  )
})

test('an ε that cannot be is refused', () => {
  expect(() => pBoundsOverSphericity(3, 2, [2, 38])).toThrow(RangeError)
  expect(() => pBoundsOverSphericity(2, 3, [4, 38], { low: 0.1, high: 0.2 })).toThrow(/ε/)
  expect(() => pBoundsOverSphericity(2, 3, [0, 38])).toThrow(RangeError)
})
