import { expect, test } from 'vitest'
import {
  adjust,
  familyWiseError,
  familyWiseErrorAtMost,
  protectedLsdError,
  simultaneousConfidence,
} from '@/lib/checks'
import { readReference } from '../reference'

// R 4.2.2: formulas, integrate() over the common factor, mvtnorm's pmvnorm, and the studentized range by double
// quadrature (header of fwer.json). Tolerances from there: independence 1e-12 relative; correlated 1e-9 absolute;
// pmvnorm three times its error estimate, at least 1e-6.
type Correlated = { alpha: number; m: number; rho: number; fwer_uncorrected: number; fwer_bonferroni: number }
const reference = readReference<{
  independent: {
    alpha: number
    m: number
    fwer_uncorrected: number
    fwer_after_bonferroni_if_independent: number
  }[]
  equicorrelated: (Correlated & { fwer_sidak: number })[]
  equicorrelated_pmvnorm: (Correlated & { error_estimate: number })[]
  all_pairs: {
    k: number
    m: number
    alpha: number
    fwer_uncorrected_all_pairs_z: number
    fwer_bonferroni_all_pairs_z: number
    fwer_uncorrected_all_pairs_t_n10: number
  }[]
}>('fwer.json')

const expectWithin = (found: number, wanted: number, tolerance: number, what: unknown) =>
  expect(Math.abs(found - wanted), JSON.stringify(what)).toBeLessThanOrEqual(tolerance)

test('independent tests without and with Bonferroni agree with R', () => {
  expect(reference.independent.length).toBeGreaterThanOrEqual(180)
  for (const row of reference.independent) {
    const { alpha, m, fwer_uncorrected, fwer_after_bonferroni_if_independent } = row
    expectWithin(familyWiseError(alpha, m), fwer_uncorrected, 1e-12 * fwer_uncorrected, row)
    const corrected = fwer_after_bonferroni_if_independent
    expectWithin(familyWiseError(alpha / m, m), corrected, 1e-12 * corrected, row)
  }
})

test('equicorrelated tests agree with integration in R', () => {
  expect(reference.equicorrelated.length).toBeGreaterThanOrEqual(140)
  for (const row of reference.equicorrelated) {
    const { alpha, m, rho } = row
    expectWithin(familyWiseError(alpha, m, { rho }), row.fwer_uncorrected, 1e-9, row)
    expectWithin(familyWiseError(alpha / m, m, { rho }), row.fwer_bonferroni, 1e-9, row)
    expectWithin(familyWiseError(-Math.expm1(Math.log1p(-alpha) / m), m, { rho }), row.fwer_sidak, 1e-9, row)
  }
})

test('equicorrelated tests, negative correlations too, agree with a second method in R', () => {
  expect(reference.equicorrelated_pmvnorm.some(({ rho, m }) => rho < 0 && m > 2)).toBe(true)
  for (const row of reference.equicorrelated_pmvnorm) {
    const { alpha, m, rho, error_estimate } = row
    const tolerance = Math.max(1e-6, 3 * error_estimate)
    expectWithin(familyWiseError(alpha, m, { rho }), row.fwer_uncorrected, tolerance, row)
    expectWithin(familyWiseError(alpha / m, m, { rho }), row.fwer_bonferroni, tolerance, row)
  }
})

test('all pairs of k groups agree with R, for known and for estimated variance', () => {
  for (const row of reference.all_pairs) {
    const { k, m, alpha } = row
    const z = familyWiseError(alpha, m, { allPairsOf: k })
    expectWithin(z, row.fwer_uncorrected_all_pairs_z, 1e-9, row)
    expectWithin(familyWiseError(alpha / m, m, { allPairsOf: k }), row.fwer_bonferroni_all_pairs_z, 1e-9, row)
    const t = familyWiseError(alpha, m, { allPairsOf: k, df: 9 * k })
    expectWithin(t, row.fwer_uncorrected_all_pairs_t_n10, 1e-9, row)
  }
})

test('6, 10, 30 and 60 independent tests at 5% are wrong at least once in 0.265, 0.40, 0.79 and 0.95', () => {
  // Common practice.
  expect(familyWiseError(0.05, 6)).toBeCloseTo(0.265, 3)
  expect(familyWiseError(0.05, 10)).toBeCloseTo(0.401, 3)
  expect(familyWiseError(0.05, 30)).toBeCloseTo(0.785, 3)
  expect(familyWiseError(0.05, 60)).toBeCloseTo(0.954, 3)
})

test('the protected least significant difference holds 5% for three groups and not beyond', () => {
  // Hayter (1986): the worst case over k groups is all pairs of k − 1; R 4.2.2, known variance:
  // .050, .122, .203, .286, .366, .441 (the last is .4405).
  const worst = [3, 4, 5, 6, 7, 8].map((k) => familyWiseError(0.05, 1, { allPairsOf: k - 1 }))
  const wanted = [0.05, 0.122, 0.203, 0.286, 0.366, 0.441]
  worst.forEach((value, i) => expectWithin(value, wanted[i] ?? NaN, 0.0006, i))
})

test('correlation runs from independence to one test', () => {
  const rates = [-0.09, 0, 0.2, 0.6, 0.95, 1].map((rho) => familyWiseError(0.05, 12, { rho }))
  // Two-sided tests: the rate falls with the size of the correlation.
  for (let i = 2; i < rates.length; i++) expect(rates[i]).toBeLessThan(rates[i - 1] ?? NaN)
  expect(rates[0]).toBeLessThan(rates[1] ?? NaN)
  expect(rates.at(-1)).toBe(0.05)
  expect(familyWiseError(0.05, 2, { rho: -1 })).toBe(0.05)
})

test('what cannot be is refused', () => {
  expect(() => familyWiseError(0, 3)).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 0)).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 3, { rho: -0.5 })).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 3, { rho: 1.1 })).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 3, { allPairsOf: 1 })).toThrow(RangeError)
})

test('independent tests: thresholds, expected errors and the worst case agree with R', () => {
  type Row = {
    alpha: number
    m: number
    expected_false_positives: number
    bonferroni_threshold: number
    sidak_threshold: number
    fwer_upper_bound_any_dependence: number
  }
  const { independent } = readReference<{ independent: Row[] }>('fwer.json')
  expect(independent.length).toBe(186)
  for (const row of independent) {
    const { alpha, m } = row
    expectWithin(familyWiseErrorAtMost(alpha, m), row.fwer_upper_bound_any_dependence, 1e-12, row)
    expectWithin(m * alpha, row.expected_false_positives, 1e-12 * m, row)
    expectWithin(adjust('bonferroni', [row.bonferroni_threshold], { m })[0] ?? NaN, alpha, 1e-12, row)
    expectWithin(adjust('sidak', [row.sidak_threshold], { m })[0] ?? NaN, alpha, 1e-12, row)
    expectWithin(1 - simultaneousConfidence(1 - alpha, m), row.bonferroni_threshold, 1e-15, row)
    expectWithin(1 - simultaneousConfidence(1 - alpha, m, 'sidak'), row.sidak_threshold, 1e-15, row)
  }
})

test('p-values at the thresholds of the steps have the level as their adjusted values', () => {
  const { step_thresholds: steps } = readReference<{
    step_thresholds: ({ m: number; alpha: number } & Record<
      'holm' | 'hochberg' | 'holm_sidak' | 'BH' | 'BY',
      number[]
    >)[]
  }>('fwer.json')
  expect(steps.length).toBe(3)
  for (const row of steps) {
    for (const [procedure, thresholds] of [
      ['holm', row.holm],
      ['hochberg', row.hochberg],
      ['holm-sidak', row.holm_sidak],
      ['bh', row.BH],
      ['by', row.BY],
    ] as const) {
      expect(thresholds.length).toBe(row.m)
      for (const p of adjust(procedure, thresholds)) expectWithin(p, row.alpha, 1e-12, { procedure, row })
    }
  }
})

test('all pairs of z tests, and what the formula for independent tests would say', () => {
  const { all_pairs: rows } = readReference<{
    all_pairs: { m: number; alpha: number; fwer_uncorrected_independent_formula: number }[]
  }>('fwer.json')
  expect(rows.length).toBe(6)
  for (const row of rows) {
    const { m, alpha, fwer_uncorrected_independent_formula: wanted } = row
    expectWithin(familyWiseError(alpha, m), wanted, 1e-12, row)
  }
  // R 4.2.2, ptukey(1.959964 sqrt(2), k, Inf): .122, .203, .286, .366 for k = 3 to 6.
  const rates = [3, 4, 5, 6].map((k) => familyWiseError(0.05, 1, { allPairsOf: k }))
  expect(rates.map((rate) => Number(rate.toFixed(3)))).toEqual([0.122, 0.203, 0.286, 0.366])
})

test('several treatments against one control, without correction', () => {
  // mvtnorm 1.1.3 in R 4.2.2, 1 - pmvt(-t, t, df, corr), GenzBretz(maxpts = 1e6, abseps = 1e-8), t = qt(.975, df):
  // correlations 1/2; control of 20 with treatments of 10, 10 and 5.
  const equal: [treatments: number, df: number, rate: number][] = [
    [2, 12, 0.088384328],
    [2, 60, 0.090281955],
    [3, 12, 0.119892126],
    [3, 60, 0.124342686],
    [5, 12, 0.170200603],
    [5, 60, 0.180319992],
  ]
  for (const [treatments, df, wanted] of equal) {
    expectWithin(familyWiseError(0.05, 1, { manyToOneOf: treatments, df }), wanted, 4e-6, { treatments, df })
  }
  const sizes = [20, 10, 10, 5]
  expectWithin(familyWiseError(0.05, 1, { manyToOneOf: 3, df: 41, sizes }), 0.135025179, 2e-6, sizes)
  // One treatment is one test, whatever the sizes.
  expectWithin(familyWiseError(0.05, 1, { manyToOneOf: 1, df: 9, sizes: [4, 7] }), 0.05, 1e-11, 'one')
  // Correlated comparisons err together: less than independent ones, and less than all pairs.
  const four = familyWiseError(0.05, 1, { manyToOneOf: 4, df: 30 })
  expect(four).toBeLessThan(familyWiseError(0.05, 4))
  expect(four).toBeLessThan(familyWiseError(0.05, 1, { allPairsOf: 5, df: 30 }))
})

test('the protected least significant difference by the number of groups', () => {
  // Hayter (1986); values by R 4.2.2, ptukey(qt(.975, df) sqrt(2), k - 1, df): with 20 df slightly less.
  const byDf: [df: number, rates: number[]][] = [
    [Infinity, [0.05, 0.05, 0.1222663, 0.2033224, 0.2858131, 0.3656161, 0.4404789]],
    [20, [0.05, 0.05, 0.1182091, 0.1916791, 0.2643089, 0.3331779, 0.3969877]],
  ]
  for (const [df, rates] of byDf) {
    rates.forEach((wanted, i) => expectWithin(protectedLsdError(0.05, i + 2, df), wanted, 1e-7, { df, i }))
  }
})

test('intervals that hold together: 97.5, 98.33, 99.17 and 99.5% each for 2, 3, 6 and 10', () => {
  // Common practice.
  const levels = [2, 3, 6, 10].map((m) => Number((100 * simultaneousConfidence(0.95, m)).toFixed(2)))
  expect(levels).toEqual([97.5, 98.33, 99.17, 99.5])
})

test('designs that cannot be are refused', () => {
  expect(() => familyWiseError(0.05, 1, { manyToOneOf: 0 })).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 1, { manyToOneOf: 2, sizes: [10, 10] })).toThrow(RangeError)
  expect(() => familyWiseError(0.05, 1, { manyToOneOf: 1, sizes: [0, 10] })).toThrow(RangeError)
  expect(() => familyWiseErrorAtMost(0.05, 0)).toThrow(RangeError)
  expect(() => familyWiseErrorAtMost(1, 3)).toThrow(RangeError)
  expect(() => protectedLsdError(0.05, 1)).toThrow(RangeError)
  expect(() => simultaneousConfidence(1, 3)).toThrow(RangeError)
  expect(() => simultaneousConfidence(0.95, 2.5)).toThrow(RangeError)
})
