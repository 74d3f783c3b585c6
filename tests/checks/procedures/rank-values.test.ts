import fc from 'fast-check'
import { expect, test } from 'vitest'
import { rankValues } from '@/lib/checks/procedures/rank-values'

const expectRanked = (given: readonly number[]) => {
  const values = Float64Array.from(given)
  const { values: sorted, places } = rankValues(values)
  // compared with the platform's own stable sort
  const wanted = given
    .map((value, i) => ({ value, i }))
    .sort((a, b) => (a.value < b.value ? -1 : a.value > b.value ? 1 : 0))
  expect([...places]).toEqual(wanted.map(({ i }) => i))
  expect([...sorted]).toEqual(wanted.map(({ value }) => value))
  expect([...values]).toEqual(given)
}

const value = fc.oneof(
  fc.double({ min: 0, max: 1, noNaN: true }).map((x) => x + 0),
  fc.integer({ min: 0, max: 20 }).map((n) => n / 20),
  fc.integer({ min: 0, max: 320 }).map((n) => 10 ** -n),
  fc.double({ min: 0, noNaN: true }).map((x) => x + 0),
)

test('values are ranked as the platform sorts them, few and many, equal ones in input order', () => {
  fc.assert(fc.property(fc.array(value, { maxLength: 30 }), expectRanked))
  fc.assert(fc.property(fc.array(value, { minLength: 41, maxLength: 400 }), expectRanked))
})

test('values that differ in their last bits only are ranked, in short runs and in long ones', () => {
  const near = fc.integer({ min: 0, max: 400 }).map((n) => 0.03 * (1 + n * Number.EPSILON))
  fc.assert(fc.property(fc.array(near, { minLength: 41, maxLength: 300 }), expectRanked))
  const mixed = fc.oneof({ weight: 1, arbitrary: near }, { weight: 9, arbitrary: value })
  fc.assert(fc.property(fc.array(mixed, { minLength: 41, maxLength: 200 }), expectRanked))
})

test('nothing, equal values, zeros and infinities are ranked', () => {
  expectRanked([])
  expectRanked(new Array<number>(100).fill(0.25))
  expectRanked(Array.from({ length: 100 }, (_, i) => [0, Infinity, 1, 5e-324][i % 4] ?? 0))
  expectRanked(Array.from({ length: 100 }, (_, i) => 100 - i))
})
