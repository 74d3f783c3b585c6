import { expect, test } from 'vitest'
import { adjust, adjustBounds, type Procedure } from '@/lib/checks'
import { readReference } from '../reference'

// R 4.2.2: adjusted p at the ends of the rounding box; the two-stage procedure by its two regimes, checked in R
// against 2,998,800 points inside the boxes (header of rounding.json). Tolerance there and here: absolute 1e-12.
type Ends = { lower: number[]; upper: number[] }
type Problem = {
  kind: string
  n: number | null
  p_lower: number[]
  p_upper: number[]
  adjusted: Record<string, Ends>
}
const NAMES: Record<string, Procedure> = {
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
}
const reference = readReference<{
  problems: Problem[]
  counterexample_two_stage: {
    bky_alpha05: Record<'p' | 'adjusted' | 'p_larger' | 'adjusted_larger', number[]>
  }
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

test('the two-stage procedure lowers adjusted values where a p grows past its first stage', () => {
  const { p, adjusted, p_larger, adjusted_larger } = reference.counterexample_two_stage.bky_alpha05
  adjust('bky', p).forEach((q, i) => expect(q).toBeCloseTo(adjusted[i] ?? NaN, 12))
  adjust('bky', p_larger).forEach((q, i) => expect(q).toBeCloseTo(adjusted_larger[i] ?? NaN, 12))
})
