import { expect, test } from 'vitest'
import { logTail, tail } from '@/lib/checks'
import { logBetaTails } from '@/lib/checks/distributions/incomplete-beta'
import { logGammaTails } from '@/lib/checks/distributions/incomplete-gamma'
import { readReference, toNumber, type Printed } from '../reference'

// mpmath at 50 digits, rounded to double (header of dists.json). The upper tails are held in tail.test.ts and the
// critical values in quantile.test.ts; here the lower tails, the beta function, and that no row is left out.
type Row = {
  fn: string
  x: Printed
  df?: Printed
  df1?: Printed
  df2?: Printed
  a?: Printed
  b?: Printed
  lower: Printed
  upper: Printed
  log_lower: Printed
  log_upper: Printed
}
const reference = readReference<{
  probability: Row[]
  quantile: { fn: string }[]
  correlation: { r: number; n: number; t: number; df: number; p: number }[]
}>('dists.json')

const rowsOf = (fn: string) =>
  reference.probability
    .filter((row) => row.fn === fn)
    .map((row) => ({
      row,
      x: toNumber(row.x),
      df: [row.df, row.df1, row.df2].filter((value) => value !== undefined).map(toNumber),
    }))

function compare(found: number, wanted: number, what: unknown, tolerance = 1e-11) {
  if (found === wanted) return
  expect(Math.abs(found - wanted) / Math.abs(wanted), JSON.stringify(what)).toBeLessThan(tolerance)
}

function compareLog(found: number, wanted: number, what: unknown) {
  if (Math.abs(found - wanted) > 1e-15) compare(found, wanted, what)
}

test('every row of the reference belongs to a function that is compared', () => {
  const probabilities = ['pnorm', 'pt', 'pf', 'pchisq', 'pbeta'].map((fn) => rowsOf(fn).length)
  expect(probabilities.reduce((sum, count) => sum + count, 0)).toBe(reference.probability.length)
  expect(Math.min(...probabilities)).toBeGreaterThanOrEqual(60)
  expect(reference.quantile.every(({ fn }) => ['qnorm', 'qt', 'qchisq', 'qf'].includes(fn))).toBe(true)
})

test('lower tails of the normal and of t are the upper ones of the mirrored value', () => {
  for (const [fn, kind] of [
    ['pnorm', 'z'],
    ['pt', 't'],
  ] as const) {
    for (const { row, x, df } of rowsOf(fn)) {
      compare(tail(kind, -x, df, 1), toNumber(row.lower), row)
      compareLog(logTail(kind, -x, df, 1), toNumber(row.log_lower), row)
    }
  }
})

test('lower tails of F are the upper ones of its inverse', () => {
  for (const { row, x, df } of rowsOf('pf')) {
    const [df1 = NaN, df2 = NaN] = df
    // 1 / x is rounded, which near a tail of 1e-300 on many degrees of freedom shows in the twelfth digit.
    compare(tail('F', 1 / x, [df2, df1]), toNumber(row.lower), row, 1e-10)
  }
})

test('both tails of χ² as incomplete gamma functions', () => {
  for (const { row, x, df } of rowsOf('pchisq')) {
    const { lower, upper } = logGammaTails((df[0] ?? NaN) / 2, x / 2)
    compare(Math.exp(lower), toNumber(row.lower), row)
    compareLog(lower, toNumber(row.log_lower), row)
    compareLog(upper, toNumber(row.log_upper), row)
  }
})

test('both tails of the beta distribution', () => {
  for (const { row, x } of rowsOf('pbeta')) {
    const { lower, upper } = logBetaTails(toNumber(row.a ?? null), toNumber(row.b ?? null), x, 1 - x)
    compare(Math.exp(lower), toNumber(row.lower), row)
    compare(Math.exp(upper), toNumber(row.upper), row)
    compareLog(lower, toNumber(row.log_lower), row)
    compareLog(upper, toNumber(row.log_upper), row)
  }
})

test('a correlation has the p-value of its t', () => {
  expect(reference.correlation.length).toBe(90)
  for (const row of reference.correlation) {
    if (Math.abs(row.r) < 0.99) compare(tail('t', row.t, [row.df]), row.p, row, 1e-9)
  }
})
