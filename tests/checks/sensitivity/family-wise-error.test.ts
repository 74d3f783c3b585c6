import { expect, test } from 'vitest'
import { familyWiseError } from '@/lib/checks'
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
