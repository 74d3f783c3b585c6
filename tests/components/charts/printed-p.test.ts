import { expect, test } from 'vitest'
import { printedP, recomputedInterval, recomputedP } from '@/components/charts/printed-p'
import { makeReport } from '@/tests/support/audit'

test('a printed value keeps its digits and its sign', () => {
  expect(printedP(makeReport('r1', 0.03, 3))).toBe('0.030')
  expect(printedP(makeReport('r1', 0.001, 3, { relation: '<' }))).toBe('< 0.001')
  expect(printedP(makeReport('r1', 0.05, 2, { relation: '>=' }))).toBe('≥ 0.05')
})

test('a recomputed value shows one digit more than was printed', () => {
  expect(recomputedP(0.04237, 2)).toBe('0.042')
  expect(recomputedP(0.04237, 3)).toBe('0.0424')
})

test('a recomputed value is never shown as zero', () => {
  expect(recomputedP(0.0004, 2)).toBe('0.0004')
  expect(recomputedP(0.00001, 2)).toBe('< 0.0001')
  expect(recomputedP(0, 3)).toBe('< 0.0001')
})

test('an interval whose ends show the same is one value', () => {
  expect(recomputedInterval([0.0424, 0.04241], 3)).toBe('0.0424')
  expect(recomputedInterval([0.039, 0.051], 2)).toBe('0.039 – 0.051')
})
