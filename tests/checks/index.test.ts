import { expect, test } from 'vitest'
import {
  adjust,
  adjustBounds,
  audit,
  defaultHouseRules,
  ENGINE,
  familyWiseError,
  fits,
  STAGES,
  tail,
} from '@/lib/checks'
import { block, document, page } from './text/runs'

// What the engine promises to give from one place, each held once against a value from outside the project or by hand.

test('adjust: Holm by hand, 3 × .01, 2 × .02, and .03 raised to the value before', () => {
  expect(adjust('holm', [0.01, 0.02, 0.03]).map((p) => Number(p.toFixed(10)))).toEqual([0.03, 0.04, 0.04])
})

test('adjustBounds: .008 stands for .0075 to .0085, six times that by hand', () => {
  const { low, high } = adjustBounds('bonferroni', [0.0075], [0.0085], { m: 6 })
  expect(low[0]).toBeCloseTo(0.045, 12)
  expect(high[0]).toBeCloseTo(0.051, 12)
})

test('tail: the two-sided 5 % point of t with 30 degrees of freedom', () => {
  // 2.042 in the table of NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2
  expect(tail('t', 2.042, [30])).toBeCloseTo(0.05, 4)
})

test('familyWiseError: six independent tests at .05', () => {
  // 1 − 0.95^6, common practice
  expect(familyWiseError(0.05, 6)).toBeCloseTo(0.2649, 4)
})

test('fits: values three times the raw ones are those of Bonferroni with m = 3', () => {
  const raw = [0.004, 0.011, 0.23].map((p) => ({ low: p, high: p }))
  const printed = [0.012, 0.033, 0.69].map((p) => ({ low: p - 0.0005, high: p + 0.0005 }))
  expect(fits(printed, raw)).toContainEqual({ procedure: 'bonferroni', m: 3 })
})

test('audit: reads a page, names its engine and passes its stages in their order', () => {
  const lines = ['3. Results', 'A and B differed significantly, t(30) = 2.50, p = .018.']
  const stages: string[] = []
  const told = audit(document(page(block(lines, 60, 700))), null, defaultHouseRules, (stage) =>
    stages.push(stage),
  )
  expect(told.engine).toBe(ENGINE)
  expect(told.document.pages).toBe(1)
  expect(told.reports.map(({ value, called }) => [value, called])).toEqual([[0.018, 'significant']])
  // two-sided p of t = 2.5 with 30 df is .0181, from memory; over 2.495 to 2.505 that is .0179 to .0183
  expect(told.statistics[0]?.pLow).toBeGreaterThan(0.0178)
  expect(told.statistics[0]?.pHigh).toBeLessThan(0.0184)
  expect(stages).toEqual(STAGES.filter((stage) => stages.includes(stage)))
  expect(stages.length).toBeGreaterThan(1)
})
