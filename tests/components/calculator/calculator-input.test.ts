import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  decodeInput,
  emptyInput,
  encodeInput,
  MODES,
  POWER_CHOICES,
  type CalculatorInput,
} from '@/components/calculator/calculator-input'
import { kelpGroups, kelpValues } from '@/components/calculator/examples'
import { READINGS } from '@/lib/checks/calculate/calculate'
import { SIDES } from '@/lib/checks/calculate/entry'
import { SPREADS } from '@/lib/checks/calculate/read-groups'
import { CATALOGUE } from '@/lib/checks/vocabulary'

const text = fc.string({
  unit: fc.oneof(fc.constantFrom('\n', '\t', '&', '#', '=', '%', '+', '–', '<'), fc.string()),
})
const inputs: fc.Arbitrary<CalculatorInput> = fc.record({
  mode: fc.constantFrom(...MODES),
  values: text,
  alpha: text,
  m: text,
  procedure: fc.constantFrom(...CATALOGUE),
  beside: fc.subarray([...CATALOGUE]),
  reading: fc.constantFrom(...READINGS),
  sides: fc.constantFrom(...SIDES),
  nameColumn: text,
  valueColumn: text,
  adjustedColumn: text,
  weightColumn: text,
  weights: text,
  transitions: text,
  groupCount: text,
  printed: text,
  rho: text,
  design: fc.constantFrom(...POWER_CHOICES),
  size: text,
  effect: text,
  groups: text,
  spread: fc.constantFrom(...SPREADS),
  control: text,
})

/** Browsers percent-encode what stands after '#', and hand back what is well-formed there. */
const throughAddress = (fragment: string) => new URL(`https://desk.example/calculator#${fragment}`).hash

test('a link restores whatever was typed, through the address of a browser', () => {
  fc.assert(
    fc.property(inputs, (input) => {
      // a half of a surrogate pair has no place in an address
      fc.pre(Object.values(input).every((part) => !/\p{Cs}/u.test(String(part))))
      expect(decodeInput(throughAddress(encodeInput(input)))).toEqual(input)
    }),
    { numRuns: 500 },
  )
})

test('the empty input needs no link, and a link names only what differs', () => {
  expect(encodeInput(emptyInput)).toBe('')
  expect(decodeInput('')).toEqual(emptyInput)
  expect(encodeInput({ ...emptyInput, values: '.03', m: '6' })).toBe('p=.03&m=6')
  for (const example of [kelpValues, kelpGroups]) {
    expect(decodeInput(throughAddress(encodeInput(example)))).toEqual(example)
  }
})

test('a spoilt link gives what can be read of it and never throws', () => {
  expect(decodeInput('#p=.03&by=guesswork&as=&beside=holm,magic&%%%&mode=x')).toEqual({
    ...emptyInput,
    values: '.03',
    beside: ['holm'],
  })
  fc.assert(
    fc.property(fc.string(), (anything) => {
      expect(Object.keys(decodeInput(anything))).toEqual(Object.keys(emptyInput))
    }),
  )
})
