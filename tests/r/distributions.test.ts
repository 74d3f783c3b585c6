import { expect, test } from 'vitest'
import {
  dunnettLoadings,
  dunnettQuantile,
  dunnettUpper,
  noncentralFTails,
  noncentralTLower,
  noncentralTUpper,
  tail,
  upperQuantile,
} from '@/lib/checks'
import { hasR, runR, testWithR } from '../support/rscript'

/** The rows of numbers that a script prints, one row a line. */
const readRows = (script: string): number[][] =>
  runR(`options(digits = 17)\n${script}`)
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/).map(Number))

const expectNear = (found: number, wanted: number, relative: number, absolute: number, what: unknown) =>
  expect(Math.abs(found - wanted), JSON.stringify(what)).toBeLessThanOrEqual(
    Math.max(relative * Math.abs(wanted), absolute),
  )

testWithR('upper tails of the normal, t, F and χ² are those that R computes here', () => {
  // R's own largest relative error on such arguments is 6e-13 (against 50 digits).
  const rows = readRows(`
    for (x in c(-3, 0.1, 1.96, 5, 12, 30)) for (df in c(1, 2.5, 9, 48.3, 1000)) cat(x, df,
      sprintf("%.17g", c(pnorm(x, lower.tail = FALSE), pt(x, df, lower.tail = FALSE),
        pf(abs(x), 3, df, lower.tail = FALSE), pchisq(abs(x), df, lower.tail = FALSE))), "\\n")`)
  expect(rows.length).toBe(30)
  for (const row of rows) {
    const [x = NaN, df = NaN, z = NaN, t = NaN, f = NaN, chi2 = NaN] = row
    expectNear(tail('z', x, [], 1), z, 1e-11, 0, row)
    expectNear(tail('t', x, [df], 1), t, 1e-11, 0, row)
    expectNear(tail('F', Math.abs(x), [3, df]), f, 1e-11, 0, row)
    expectNear(tail('chi2', Math.abs(x), [df]), chi2, 1e-11, 0, row)
  }
})

testWithR('critical values are those that R computes here', () => {
  const rows = readRows(`
    for (p in c(0.2, 0.05, 0.01, 0.05 / 28, 1e-6)) for (df in c(2, 7.5, 30, 250)) cat(p, df,
      sprintf("%.17g", c(p, qnorm(p, lower.tail = FALSE), qt(p, df, lower.tail = FALSE),
        qf(p, 4, df, lower.tail = FALSE), qchisq(p, df, lower.tail = FALSE))), "\\n")`)
  expect(rows.length).toBe(20)
  for (const row of rows) {
    const [, df = NaN, p = NaN, z = NaN, t = NaN, f = NaN, chi2 = NaN] = row
    expectNear(upperQuantile('z', p, [], 1), z, 1e-9, 0, row)
    expectNear(upperQuantile('t', p, [df], 1), t, 1e-9, 0, row)
    expectNear(upperQuantile('F', p, [4, df]), f, 1e-9, 0, row)
    expectNear(upperQuantile('chi2', p, [df]), chi2, 1e-9, 0, row)
  }
})

testWithR('noncentral t is that of R, within R’s own error', () => {
  // R stops its series at 1e-12.
  const rows = readRows(`
    for (t in c(-2, 0, 1, 2.5, 4)) for (df in c(1, 4, 18, 126)) for (ncp in c(-1.5, 0.4, 2.8, 6)) cat(t, df, ncp,
      sprintf("%.17g", c(pt(t, df, ncp, lower.tail = FALSE), pt(t, df, ncp))), "\\n")`)
  expect(rows.length).toBe(80)
  for (const row of rows) {
    const [t = NaN, df = NaN, ncp = NaN, upper = NaN, lower = NaN] = row
    expectNear(noncentralTUpper(t, df, ncp), upper, 0, 5e-12, row)
    expectNear(noncentralTLower(t, df, ncp), lower, 0, 5e-12, row)
  }
})

testWithR('noncentral F is that of R, whose series stops at 1e-9, and of its parts summed in R', () => {
  const rows = readRows(`
    for (x in c(0.3, 1.4, 3, 9)) for (df2 in c(6, 27, 116)) for (ncp in c(0.2, 5, 18, 60)) {
      j <- 0:400; w <- dpois(j, ncp / 2); y <- 3 * x / (3 * x + df2)
      cat(x, df2, ncp, sprintf("%.17g", c(pf(x, 3, df2, ncp, lower.tail = FALSE), pf(x, 3, df2, ncp),
        sum(w * pbeta(y, 1.5 + j, df2 / 2, lower.tail = FALSE)), sum(w * pbeta(y, 1.5 + j, df2 / 2)))), "\\n") }`)
  expect(rows.length).toBe(48)
  for (const row of rows) {
    const [x = NaN, df2 = NaN, ncp = NaN, upper = NaN, lower = NaN, summedUpper = NaN, summedLower = NaN] =
      row
    const found = noncentralFTails(x, 3, df2, ncp)
    expectNear(found.upper, upper, 0, 5e-9, row)
    expectNear(found.lower, lower, 0, 5e-9, row)
    expectNear(found.upper, summedUpper, 1e-10, 0, row)
    expectNear(found.lower, summedLower, 1e-10, 0, row)
  }
})

testWithR('the studentized range is that of R, within R’s own error of 1e-5', () => {
  const rows = readRows(`
    for (q in c(0.5, 2, 3.5, 4.5, 7)) for (k in c(2, 3, 6, 12)) for (df in c(5, 16, 60, Inf)) cat(q, k, df,
      sprintf("%.17g", ptukey(q, k, df, lower.tail = FALSE)), "\\n")`)
  expect(rows.length).toBe(80)
  for (const row of rows) {
    const [q = NaN, k = NaN, , upper = NaN] = row
    // R prints Inf, which Number does not read.
    const df = Number.isNaN(row[2]) ? Infinity : (row[2] ?? NaN)
    expectNear(tail('q', q, [k, df]), upper, 0, 2e-5, row)
  }
})

const hasMvtnorm = hasR && runR('cat(requireNamespace("mvtnorm", quietly = TRUE))').trim() === 'TRUE'
const testWithMvtnorm = test.skipIf(!hasMvtnorm)
if (hasR && !hasMvtnorm)
  process.stdout.write('skipped: R has no mvtnorm here, so Dunnett is not held against it\n')

testWithMvtnorm(
  'Dunnett is the multivariate t of mvtnorm, for equal and unequal groups and either number of sides',
  () => {
    const designs = [
      [10, 10, 10],
      [8, 8, 8, 8],
      [20, 8, 5, 13],
      [6, 30, 12, 9, 24],
    ]
    const script = designs
      .map(
        (sizes) => `
    n <- c(${sizes.join(', ')}); l <- sqrt(n[-1] / (n[-1] + n[1])); R <- outer(l, l); diag(R) <- 1
    k <- length(l); df <- sum(n) - length(n)
    for (t in c(0.7, 1.8, 2.6, 4)) { a <- GenzBretz(maxpts = 2e5, abseps = 1e-6)
      two <- pmvt(rep(-t, k), rep(t, k), df = df, corr = R, algorithm = a)
      one <- pmvt(rep(-Inf, k), rep(t, k), df = df, corr = R, algorithm = a)
      cat(t, df, sprintf("%.17g", c(1 - two, attr(two, "error"), 1 - one, attr(one, "error"))), "\\n") }`,
      )
      .join('\n')
    const rows = readRows(`suppressMessages(library(mvtnorm)); set.seed(7)\n${script}`)
    expect(rows.length).toBe(16)
    rows.forEach((row, i) => {
      const [t = NaN, df = NaN, two = NaN, twoError = NaN, one = NaN, oneError = NaN] = row
      const [control = NaN, ...treatments] = designs[Math.floor(i / 4)] ?? []
      const loadings = dunnettLoadings(control, treatments)
      expectNear(dunnettUpper(t, loadings, df), two, 0, Math.max(2e-6, 3 * twoError), row)
      expectNear(dunnettUpper(t, loadings, df, 1), one, 0, Math.max(2e-6, 3 * oneError), row)
    })
  },
)

testWithMvtnorm('two treatments: critical values of the bivariate t, which mvtnorm has exactly', () => {
  const rows = readRows(`suppressMessages(library(mvtnorm))
    for (df in c(10, 27, 60)) { R <- matrix(c(1, 0.5, 0.5, 1), 2); find <- function(f) uniroot(f, c(1.5, 4), tol = 1e-12)$root
      two <- function(t) 0.95 - pmvt(rep(-t, 2), rep(t, 2), df = df, corr = R)
      one <- function(t) 0.95 - pmvt(rep(-Inf, 2), rep(t, 2), df = df, corr = R, algorithm = TVPACK(abseps = 1e-12))
      cat(df, sprintf("%.17g", c(find(two), find(one))), "\\n") }`)
  expect(rows.length).toBe(3)
  for (const row of rows) {
    const [df = NaN, two = NaN, one = NaN] = row
    expectNear(dunnettQuantile(0.05, [Math.SQRT1_2, Math.SQRT1_2], df), two, 1e-8, 0, row)
    expectNear(dunnettQuantile(0.05, [Math.SQRT1_2, Math.SQRT1_2], df, 1), one, 1e-8, 0, row)
  }
})
