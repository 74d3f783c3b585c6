import { expect, test } from 'vitest'
import { formatComputed, formatInterval } from '@/components/ui/format-value'

test('a recomputed value has the digits that are asked for', () => {
  expect(formatComputed(0.03456, 4)).toBe('0.0346')
  expect(formatComputed(1, 3)).toBe('1.000')
  expect(formatComputed(-2.5, 1)).toBe('−2.5')
})

test('what is below 0.0001 says so, and zero is zero', () => {
  expect(formatComputed(0.00004, 4)).toBe('< 0.0001')
  expect(formatComputed(0, 3)).toBe('0.000')
})

test('a value that its digits would show as zero says below what it is', () => {
  expect(formatComputed(0.0004, 2)).toBe('< 0.01')
})

test('no number and no bound have their own signs', () => {
  expect(formatComputed(Number.NaN, 3)).toBe('–')
  expect(formatComputed(Infinity, 3)).toBe('∞')
})

test('an interval whose ends print alike is one value', () => {
  expect(formatInterval(0.0211, 0.0214, 3)).toBe('0.021')
  expect(formatInterval(0.021, 0.034, 3)).toBe('0.021–0.034')
})
