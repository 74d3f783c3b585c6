import { expect, test } from 'vitest'
import { thresholdOf } from '@/components/charts/thresholds'
import { adjust } from '@/lib/checks/procedures/adjust'

test('the thresholds for 0.05 in 3, 6 and 10 tests are the ones of common practice', () => {
  // Common practice, no source: 0.05/3, /6, /10 and 1 − 0.95^(1/m), recomputed with R 4.2.2.
  expect([3, 6, 10].map((m) => thresholdOf.bonferroni(1, m, 0.05))).toEqual([
    expect.closeTo(0.016667, 6),
    expect.closeTo(0.008333, 6),
    0.005,
  ])
  expect([3, 6, 10].map((m) => thresholdOf.sidak(1, m, 0.05))).toEqual([
    expect.closeTo(0.016952, 6),
    expect.closeTo(0.008512, 6),
    expect.closeTo(0.005116, 6),
  ])
})

test('a p-value at the first threshold has the adjusted value alpha, for every procedure that is drawn', () => {
  for (const procedure of ['bonferroni', 'sidak', 'holm', 'holm-sidak', 'by', 'bh'] as const) {
    for (const m of [2, 5, 12]) {
      const p = [thresholdOf[procedure](1, m, 0.05), ...Array.from({ length: m - 1 }, () => 1)]
      expect(adjust(procedure, p)[0]).toBeCloseTo(0.05, 10)
    }
  }
})

test('the last threshold of the step procedures is alpha, that of the single-step ones is not', () => {
  expect(thresholdOf.holm(7, 7, 0.05)).toBe(0.05)
  expect(thresholdOf.hochberg(7, 7, 0.05)).toBe(0.05)
  expect(thresholdOf.bh(7, 7, 0.05)).toBe(0.05)
  expect(thresholdOf.bonferroni(7, 7, 0.05)).toBeCloseTo(0.05 / 7, 12)
})
