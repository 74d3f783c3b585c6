import { expect, test } from 'vitest'
import { computeCorrectionCost, computePower, findDetectableEffect, findSampleSize } from '@/lib/checks'
import { readReference } from '../reference'

// R 4.2.2: power.t.test, default and strict, and pf(ncp) (header of fwer.json). Tolerances from there: power 1e-8
// absolute, whole sample sizes exact, fractional ones 1e-6; detectable effects come from uniroot(tol = 1e-12).
type Power = { type: string; n: number; delta: number; sd: number; alpha_per_test: number }
type PowerT = Power & { power: number; power_strict: number; power_lost_to_correction: number; m: number }
type Size = Omit<Power, 'n'> & {
  power_wanted: number
  n_per_group: number
  n_per_group_fractional: number
  power_at_n: number
}
type PowerF = { groups: number; n: number; cohen_f: number; alpha: number; power: number }
type Detectable = { n: number; alpha_per_test: number; power_wanted: number; detectable_delta: number }
const reference = readReference<{
  power_t: PowerT[]
  sample_size: Size[]
  power_anova: PowerF[]
  detectable_effect: Detectable[]
}>('fwer.json')

const designOf = ({ type }: { type: string }) => (type === 'paired' ? 'paired' : 'two-sample')
const expectWithin = (found: number, wanted: number, room: number, what: unknown) =>
  expect(Math.abs(found - wanted), JSON.stringify(what)).toBeLessThanOrEqual(room)

test('power of t tests agrees with R, with and without the far tail', () => {
  expect(reference.power_t.length).toBe(280)
  for (const row of reference.power_t) {
    const { n, delta, sd, alpha_per_test: alpha, power, power_strict } = row
    const options = { design: designOf(row), n, effect: delta / sd, alpha } as const
    expectWithin(computePower(options), power_strict, 1e-8, row)
    expectWithin(computePower({ ...options, farTail: false }), power, 1e-8, row)
  }
})

test('what a correction costs agrees with R', () => {
  for (const row of reference.power_t.filter(({ n }) => n >= 20)) {
    const { n, delta, sd, m, power_lost_to_correction: wanted } = row
    const { lost } = computeCorrectionCost({ design: designOf(row), n, effect: delta / sd, m })
    expectWithin(lost, wanted, 1e-8, row)
  }
})

test('sample sizes agree with R, fractional and whole', () => {
  expect(reference.sample_size.length).toBe(64)
  for (const row of reference.sample_size) {
    const options = {
      design: designOf(row),
      effect: row.delta / row.sd,
      alpha: row.alpha_per_test,
      power: row.power_wanted,
    } as const
    const { continuous, whole } = findSampleSize(options)
    expectWithin(continuous, row.n_per_group_fractional, 1e-6, row)
    expect(whole, JSON.stringify(row)).toBe(row.n_per_group)
    expectWithin(computePower({ ...options, n: whole }), row.power_at_n, 1e-8, row)
  }
})

test('power of one-way designs agrees with R', () => {
  expect(reference.power_anova.length).toBe(54)
  for (const row of reference.power_anova) {
    const { groups, n, cohen_f: effect, alpha, power } = row
    expectWithin(computePower({ design: 'one-way', groups, n, effect, alpha }), power, 1e-8, row)
  }
})

test('detectable differences agree with R', () => {
  expect(reference.detectable_effect.length).toBe(9)
  for (const row of reference.detectable_effect) {
    const { n, alpha_per_test: alpha, power_wanted: power } = row
    expectWithin(
      findDetectableEffect({ design: 'two-sample', n, alpha, power }),
      row.detectable_delta,
      1e-8,
      row,
    )
  }
})

test('a one-way design of two groups is the two-sample t test', () => {
  // F = t², and the standard deviation of two means is half their difference.
  for (const n of [4, 17, 60]) {
    const t = computePower({ design: 'two-sample', n, effect: 0.7 })
    expectWithin(computePower({ design: 'one-way', groups: 2, n, effect: 0.35 }), t, 1e-11, n)
  }
})

test('sample size and detectable effect of a one-way design invert its power', () => {
  const options = { design: 'one-way', groups: 4, alpha: 0.01, effect: 0.28, power: 0.9 } as const
  const { continuous, whole } = findSampleSize(options)
  expectWithin(computePower({ ...options, n: continuous }), 0.9, 1e-10, 'continuous')
  expect(computePower({ ...options, n: whole })).toBeGreaterThanOrEqual(0.9)
  expect(computePower({ ...options, n: whole - 1 })).toBeLessThan(0.9)
  expectWithin(findDetectableEffect({ ...options, n: continuous }), 0.28, 1e-8, 'effect')
})

test('R’s help page: 64 in each group find half a standard deviation with 80.1%', () => {
  // From memory; R 4.2.2 agrees: power 0.8014586, n 63.76576 (0.5), 25.52463 (0.8), 393.4067 (0.2), far tail left out.
  const options = { design: 'two-sample', farTail: false } as const
  expect(computePower({ ...options, n: 64, effect: 0.5 })).toBeCloseTo(0.8014586, 6)
  for (const [effect, n] of [
    [0.5, 63.76576],
    [0.8, 25.52463],
    // R's own value is off by 3e-6 here, as uniroot stops early.
    [0.2, 393.4067],
  ] as const) {
    expectWithin(findSampleSize({ ...options, effect, power: 0.8 }).continuous, n, 2e-3, effect)
  }
})

test('a test designed for 80% keeps .71, .66, .62, .56, .50, .41 of it, and needs 1.21 to 1.90 times the sample', () => {
  // R 4.2.2, known variance, d = qnorm(.975) + qnorm(.8): pnorm(d - qnorm(1 - .025 / m)) and
  // ((qnorm(1 - .025 / m) + qnorm(.8)) / d)^2; 5000 per group come near it.
  const effect = findDetectableEffect({ design: 'two-sample', n: 5000, power: 0.8 })
  const wanted: [m: number, left: number, times: number][] = [
    [2, 0.7123225, 1.211006],
    [3, 0.6582183, 1.333835],
    [4, 0.6193902, 1.420725],
    [6, 0.5648699, 1.542839],
    [10, 0.4978264, 1.696125],
    [20, 0.4122518, 1.903193],
  ]
  for (const [m, left, times] of wanted) {
    const cost = computeCorrectionCost({ design: 'two-sample', n: 5000, effect, m })
    expectWithin(cost.with, left, 5e-4, `power at m = ${m}`)
    expectWithin(cost.ratio, times, 5e-4, `sample at m = ${m}`)
    expect(cost.regain.whole).toBe(Math.ceil(cost.regain.continuous))
    expect(cost.detectable?.without).toBeCloseTo(effect, 8)
    expect(cost.detectable?.with).toBeGreaterThan(effect)
  }
})

test('one test costs nothing', () => {
  const cost = computeCorrectionCost({ design: 'paired', n: 24, effect: 0.6, m: 1 })
  expect(cost.lost).toBe(0)
  expect(cost.ratio).toBeCloseTo(1, 9)
  expect(cost.regain.whole).toBe(24)
})

test('a power that is 1 in all digits can still be paid for', () => {
  const { without, regain } = computeCorrectionCost({ design: 'two-sample', n: 500, effect: 3, m: 10 })
  expect(without).toBe(1)
  expect(regain.whole).toBeLessThan(500)
})

test('what is no design is refused', () => {
  const good = { design: 'two-sample', n: 10, effect: 0.5 } as const
  expect(() => computePower({ ...good, n: 1.5 })).toThrow(/at least 2/)
  expect(() => computePower({ ...good, alpha: 1 })).toThrow(RangeError)
  expect(() => computePower({ ...good, effect: NaN })).toThrow(RangeError)
  expect(() => computePower({ ...good, design: 'one-way' })).toThrow(/number of groups/)
  expect(() => computePower({ ...good, design: 'one-way', groups: 1 })).toThrow(/number of groups/)
  expect(() => findSampleSize({ ...good, power: 1 })).toThrow(RangeError)
  expect(() => findSampleSize({ ...good, effect: 0, power: 0.8 })).toThrow(/effect of 0/)
  expect(() => findDetectableEffect({ ...good, power: 0.04 })).toThrow(RangeError)
  expect(() => computeCorrectionCost({ ...good, m: 0 })).toThrow(RangeError)
  expect(findSampleSize({ design: 'paired', effect: 1e-5, power: 0.8 })).toEqual({
    continuous: Infinity,
    whole: Infinity,
  })
})
