import { expect, test } from 'vitest'
import { adjust, adjustBounds, truncationInterval, type CatalogueProcedure } from '@/lib/checks'
import { readReference } from '../reference'

// R 4.2.2: adjusted p at the ends of the rounding box; the two-stage procedure by its two regimes, checked in R
// against 2,998,800 points inside the boxes (header of rounding.json). Tolerance there and here: absolute 1e-12.
type Ends = { lower: number[]; upper: number[]; ends_are_exact?: boolean }
type Problem = {
  kind: string
  n: number | null
  p_lower: number[]
  p_upper: number[]
  adjusted: Record<string, Ends>
}
const NAMES: Record<string, CatalogueProcedure> = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  BH: 'bh',
  BY: 'by',
  sidak: 'sidak',
  'holm-sidak': 'holm-sidak',
  storey_lambda05: 'storey',
  bky_alpha05: 'bky',
  tsbh_alpha05: 'tsbh',
}
type Search = {
  violations: number
  example: { p: number[]; p_larger: number[]; position: number } | null
}
type Counterexample = Record<'p' | 'adjusted' | 'p_larger' | 'adjusted_larger', number[]>
const reference = readReference<{
  problems: Problem[]
  monotone_search: Record<string, Search & { largest: number }>
  counterexample_two_stage: Record<'bky_alpha05' | 'tsbh_alpha05', Counterexample>
  truncation_intervals: { reported: string; lower: number; upper: number }[]
}>('rounding.json')

for (const [name, procedure] of Object.entries(NAMES)) {
  test(`bounds of ${procedure} over the rounding boxes are the reference’s`, () => {
    let compared = 0
    for (const { kind, n, p_lower, p_upper, adjusted } of reference.problems) {
      const ends = adjusted[name]
      if (ends === undefined) continue
      const bounds = adjustBounds(procedure, p_lower, p_upper, n === null ? {} : { m: n })
      ends.lower.forEach((value, i) =>
        expect(Math.abs((bounds.low[i] ?? NaN) - value), kind).toBeLessThan(1e-12),
      )
      ends.upper.forEach((value, i) =>
        expect(Math.abs((bounds.high[i] ?? NaN) - value), kind).toBeLessThan(1e-12),
      )
      compared++
    }
    expect(compared).toBeGreaterThanOrEqual(80)
  })
}

test('bounds of the unscaled two-stage procedure are those of the scaled one over 1 + alpha, below its cap', () => {
  for (const { n, p_lower, p_upper } of reference.problems) {
    if (n !== null) continue
    const scaled = adjustBounds('bky', p_lower, p_upper)
    const found = adjustBounds('bky-unscaled', p_lower, p_upper)
    for (const end of ['low', 'high'] as const) {
      found[end].forEach((value, i) => {
        expect(Math.min(1, value * 1.05)).toBeCloseTo(scaled[end][i] ?? NaN, 12)
      })
    }
  }
})

test('the ends of the box are the bounds of a two-stage procedure only where the reference says so', () => {
  let inexact = 0
  for (const { n, p_lower, p_upper, adjusted } of reference.problems) {
    if (n !== null) continue
    for (const [name, procedure] of [['bky_alpha05', 'bky'] as const, ['tsbh_alpha05', 'tsbh'] as const]) {
      const ends = { low: adjust(procedure, p_lower), high: adjust(procedure, p_upper) }
      const bounds = adjustBounds(procedure, p_lower, p_upper)
      const same = (['low', 'high'] as const).every((end) =>
        ends[end].every((value, i) => Math.abs(value - (bounds[end][i] ?? NaN)) < 1e-12),
      )
      expect(same, `${name} ${p_lower}`).toBe(adjusted[name]?.ends_are_exact)
      if (!same) inexact++
    }
  }
  expect(inexact).toBeGreaterThan(0)
})

test('two-stage procedures lower adjusted values where a p grows past their first stage', () => {
  for (const [name, procedure] of [['bky_alpha05', 'bky'] as const, ['tsbh_alpha05', 'tsbh'] as const]) {
    const { p, adjusted, p_larger, adjusted_larger } = reference.counterexample_two_stage[name]
    adjust(procedure, p).forEach((q, i) => expect(q).toBeCloseTo(adjusted[i] ?? NaN, 12))
    adjust(procedure, p_larger).forEach((q, i) => expect(q).toBeCloseTo(adjusted_larger[i] ?? NaN, 12))
  }
})

test('where R’s search of 40,000 pairs found a drop, and how deep, ours drops as deep; elsewhere it found none', () => {
  for (const [name, { violations, largest, example }] of Object.entries(reference.monotone_search)) {
    expect(violations > 0, name).toBe(name === 'bky_alpha05' || name === 'tsbh_alpha05')
    const procedure = NAMES[name]
    if (example === null || procedure === undefined) continue
    const at = example.position - 1
    const drop = (adjust(procedure, example.p)[at] ?? NaN) - (adjust(procedure, example.p_larger)[at] ?? NaN)
    expect(drop, name).toBeCloseTo(largest, 12)
  }
})

test('a value whose further digits were cut off stands for the unit above it', () => {
  for (const { reported, lower, upper } of reference.truncation_intervals) {
    const { low, high } = truncationInterval(Number(reported), reported.length - 2)
    expect([low, high]).toEqual([lower, upper])
  }
})
