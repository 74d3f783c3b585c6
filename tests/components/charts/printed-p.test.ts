import { expect, test } from 'vitest'
import { printedP, recomputedInterval, recomputedP } from '@/components/charts/printed-p'
import { makeReport } from '@/tests/support/audit'

test('a printed value is shown as it stands in the manuscript', () => {
  const place = (quote: string) => ({ place: { ...makeReport('r1', 0.1).place, quote } })
  expect(printedP(makeReport('r1', 0.03, 3, place('p = .030')))).toBe('.030')
  expect(printedP(makeReport('r1', 0.011, 3, place('t(20) = 2.79, P = 0,011')))).toBe('0,011')
  expect(printedP(makeReport('r1', 0.00002, 6, place('p = 2.0e−5')))).toBe('2.0e−5')
  expect(printedP(makeReport('r1', 0.001, 3, { relation: '<', ...place('p < .001') }))).toBe('< .001')
})

test('a value that its quote does not hold keeps its digits and its sign', () => {
  const place = { ...makeReport('r1', 0.1).place, quote: 'n.s.' }
  expect(printedP(makeReport('r1', 0.05, 2, { relation: '>=', place }))).toBe('≥ 0.05')
  expect(printedP(makeReport('r1', 0.03, 3, { place }))).toBe('0.030')
  expect(printedP(makeReport('r1', 1e-120, 20, { place }))).toBe('1e-120')
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
