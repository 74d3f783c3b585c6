import { readFileSync } from 'node:fs'
import { expect } from 'vitest'
import {
  adjust,
  compareDataByDunn,
  compareBySteelDwass,
  dunnettLoadings,
  listPairs,
  pDunnettFromT,
  pGamesHowellFromWelch,
  pScheffeFromT,
  pTukeyFromT,
  type CatalogueProcedure,
} from '@/lib/checks'
import { runR, testWithR } from '../support/rscript'

/** The rows of numbers that a script prints, one row a line. */
const readRows = (script: string): number[][] =>
  runR(`show <- function(x) cat(sprintf("%.17g", x), "\\n")\n${script}`)
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/).map(Number))

const largestMiss = (found: readonly number[], wanted: readonly number[] | undefined) => {
  expect(wanted?.length).toBe(found.length)
  return Math.max(...found.map((value, i) => Math.abs(value - (wanted?.[i] ?? NaN))))
}

const METHODS = [
  ['bonferroni', 'bonferroni'],
  ['holm', 'holm'],
  ['hochberg', 'hochberg'],
  ['hommel', 'hommel'],
  ['bh', 'BH'],
  ['by', 'BY'],
] as const satisfies readonly (readonly [CatalogueProcedure, string])[]

/** A multiplicative congruential generator (Park and Miller 1988), in (0, 1). */
function createRandom(seed: number): () => number {
  let state = seed
  return () => (state = (state * 48271) % 2147483647) / 2147483647
}

/** Vectors as papers have them: any, small, rounded with many ties; every third belongs to a larger family. */
function drawFamilies(count: number): { p: number[]; n: number }[] {
  const next = createRandom(1201)
  return Array.from({ length: count }, (_, i) => {
    const size = 1 + Math.floor(40 * next())
    const draw = [next, () => next() ** 5, () => Math.round(100 * next()) / 100][i % 3] ?? next
    return { p: Array.from({ length: size }, draw), n: size + (i % 3 === 2 ? Math.floor(60 * next()) : 0) }
  })
}

testWithR(
  'adjusted p-values are those of p.adjust, with every method and in families that are not all shown',
  () => {
    const families = drawFamilies(150)
    const calls = families.map(
      ({ p, n }) =>
        `p <- c(${p.join(', ')}); for (m in methods) show(p.adjust(p, m, n = max(${n}, length(p))))`,
    )
    const rows = readRows(
      `methods <- c(${METHODS.map(([, method]) => `"${method}"`).join(', ')})\n${calls.join('\n')}`,
    )
    expect(rows.length).toBe(families.length * METHODS.length)
    families.forEach(({ p, n }, at) => {
      METHODS.forEach(([procedure], i) => {
        const found = adjust(procedure, p, { m: n })
        expect(largestMiss(found, rows[at * METHODS.length + i]), `${procedure}, ${p}, n ${n}`).toBeLessThan(
          1e-12,
        )
      })
    })
  },
)

testWithR('2,000 p-values with ties, zeros and ones are adjusted as R adjusts them', () => {
  const next = createRandom(2026)
  const p = Array.from(
    { length: 2000 },
    (_, i) => [next() ** 8, next(), i % 50 === 0 ? 0 : 1, 0.05][i % 4] ?? 0,
  )
  const rows = readRows(`p <- c(${p.join(', ')})
    for (m in c(${METHODS.map(([, method]) => `"${method}"`).join(', ')})) show(p.adjust(p, m))`)
  METHODS.forEach(([procedure], i) => {
    expect(largestMiss(adjust(procedure, p), rows[i]), procedure).toBeLessThan(1e-12)
  })
})

// Layouts that R has built in; each prints group numbers, values, then what is asked of them.
const LAYOUTS = `
  sets <- list(PlantGrowth[c("weight", "group")], InsectSprays[c("count", "spray")], chickwts[c("weight", "feed")],
    warpbreaks[c("breaks", "tension")], na.omit(airquality[c("Ozone", "Month")]), mtcars[c("mpg", "cyl")],
    OrchardSprays[c("decrease", "treatment")])
  each <- function(f) for (d in sets) { y <- as.numeric(d[[1]]); g <- droplevels(factor(d[[2]])); k <- nlevels(g)
    n <- as.vector(table(g)); mu <- as.vector(tapply(y, g, mean)); df <- length(y) - k; ms <- sum((y - mu[g])^2) / df
    pr <- t(combn(k, 2)); lower <- function(x) x[cbind(pr[, 2] - 1, pr[, 1])]; f(y, g, k, n, mu, df, ms, pr, lower) }
`
const COUNT = 7

testWithR('tables of pairwise t tests are R’s, with every method', () => {
  const rows = readRows(`${LAYOUTS}
    each(function(y, g, k, n, mu, df, ms, pr, lower) for (m in c("none", ${METHODS.map(([, method]) => `"${method}"`).join(', ')}))
      show(lower(pairwise.t.test(y, g, m)$p.value)))`)
  const width = METHODS.length + 1
  expect(rows.length).toBe(COUNT * width)
  for (let at = 0; at < COUNT; at++) {
    const raw = rows[at * width] ?? []
    METHODS.forEach(([procedure], i) => {
      expect(largestMiss(adjust(procedure, raw), rows[at * width + 1 + i]), procedure).toBeLessThan(1e-12)
    })
  }
})

testWithR('Tukey, Scheffé and Games–Howell are what TukeyHSD, pf and ptukey give', () => {
  // Held to what ptukey itself is good for: 1e-8 absolute with the pooled df, but 2e-7 below 8 df, where a double
  // quadrature in R sides with ours.
  const rows = readRows(`${LAYOUTS}
    each(function(y, g, k, n, mu, df, ms, pr, lower) {
      i <- pr[, 1]; j <- pr[, 2]; t <- (mu[j] - mu[i]) / sqrt(ms * (1 / n[i] + 1 / n[j])); v <- as.vector(tapply(y, g, var)) / n
      tw <- (mu[j] - mu[i]) / sqrt(v[i] + v[j]); dw <- (v[i] + v[j])^2 / (v[i]^2 / (n[i] - 1) + v[j]^2 / (n[j] - 1))
      x <- TukeyHSD(aov(y ~ g))$g
      show(c(k, df)); show(t); show(x[, "p adj"]); show(pf(t^2 / (k - 1), k - 1, df, lower.tail = FALSE))
      show(tw); show(dw); show(ptukey(sqrt(2) * abs(tw), k, dw, lower.tail = FALSE)) })`)
  expect(rows.length).toBe(COUNT * 7)
  for (let at = 0; at < COUNT; at++) {
    const [about = [], t = [], tukey, scheffe, welch = [], own = [], gamesHowell] = rows.slice(
      7 * at,
      7 * at + 7,
    )
    const [groups = NaN, df = NaN] = about
    expect(
      largestMiss(
        t.map((value) => pTukeyFromT(value, groups, df)),
        tukey,
      ),
    ).toBeLessThan(1e-8)
    expect(
      largestMiss(
        t.map((value) => pScheffeFromT(value, groups, df)),
        scheffe,
      ),
    ).toBeLessThan(1e-12)
    const found = welch.map((value, i) => pGamesHowellFromWelch(value, groups, own[i] ?? NaN))
    expect(largestMiss(found, gamesHowell)).toBeLessThan(1e-6)
  }
})

testWithR('Dunn and Steel–Dwass from the data are what their formulas give in R', () => {
  const rows = readRows(`${LAYOUTS}
    each(function(y, g, k, n, mu, df, ms, pr, lower) {
      N <- length(y); r <- rank(y); rb <- as.vector(tapply(r, g, mean)); ties <- table(y)
      s2 <- N * (N + 1) / 12 - sum(ties^3 - ties) / (12 * (N - 1)); i <- pr[, 1]; j <- pr[, 2]
      z <- (rb[i] - rb[j]) / sqrt(s2 * (1 / n[i] + 1 / n[j]))
      q <- mapply(function(a, b) { u <- y[as.integer(g) == a]; v <- y[as.integer(g) == b]; r <- rank(c(u, v)); M <- length(r)
        (sum(r[-seq_along(u)]) - length(v) * (M + 1) / 2) / sqrt(length(u) * length(v) / (M * (M - 1)) * (sum(r^2) - M * (M + 1)^2 / 4)) }, i, j)
      show(as.integer(g)); show(y); show(2 * pnorm(-abs(z))); show(ptukey(sqrt(2) * abs(q), k, Inf, lower.tail = FALSE)) })`)
  expect(rows.length).toBe(COUNT * 4)
  for (let at = 0; at < COUNT; at++) {
    const [factor = [], y = [], dunn, steelDwass] = rows.slice(4 * at, 4 * at + 4)
    const groups = Array.from({ length: Math.max(...factor) }, (_, group) =>
      y.filter((_, i) => factor[i] === group + 1),
    )
    expect(compareDataByDunn(groups).map(({ pair }) => pair)).toEqual(listPairs(groups.length))
    expect(
      largestMiss(
        compareDataByDunn(groups).map(({ p }) => p),
        dunn,
      ),
    ).toBeLessThan(1e-12)
    expect(
      largestMiss(
        compareBySteelDwass(groups).map(({ p }) => p),
        steelDwass,
      ),
    ).toBeLessThan(1e-8)
  }
})

testWithR('Dunnett with unequal groups is what mvtnorm integrates, where it is installed', () => {
  const output = runR(`
    if (!requireNamespace("mvtnorm", quietly = TRUE)) { cat("missing\\n"); quit() }
    set.seed(1201)
    for (i in 1:12) { k <- sample(2:5, 1); n <- sample(4:20, k + 1, TRUE); df <- sum(n) - k - 1; t <- runif(1, 1, 3.5)
      l <- sqrt(n[-1] / (n[-1] + n[1])); R <- outer(l, l); diag(R) <- 1
      p <- mvtnorm::pmvt(rep(-t, k), rep(t, k), df = df, corr = R, algorithm = mvtnorm::GenzBretz(maxpts = 2e5, abseps = 1e-6))
      cat(sprintf("%.17g", c(t, df, 1 - p, max(attr(p, "error"), 1e-9), n)), "\\n") }`).trim()
  if (output === 'missing') {
    process.stdout.write('skipped: mvtnorm is not installed, so Dunnett is not held against it here\n')
    return
  }
  const rows = output.split('\n').map((line) => line.trim().split(/\s+/).map(Number))
  expect(rows.length).toBe(12)
  for (const [t = NaN, df = NaN, p = NaN, error = NaN, control = NaN, ...treatments] of rows) {
    // quasi-random: within five of its own error estimates
    const found = pDunnettFromT(t, dunnettLoadings(control, treatments), df)
    expect(Math.abs(found - p), `t ${t}, df ${df}`).toBeLessThan(Math.max(5 * error, 1e-6))
  }
})

testWithR('the closed tests and layouts kept as a file are those that its script gives here', () => {
  const folder = new URL('../fixtures/reference/', import.meta.url)
  const kept: unknown = JSON.parse(readFileSync(new URL('comparisons.json', folder), 'utf8'))
  const made: unknown = JSON.parse(runR(readFileSync(new URL('comparisons.R', folder), 'utf8')))
  const [wanted, found] = [listNumbers(kept), listNumbers(made)]
  expect(found.length).toBe(wanted.length)
  expect(largestMiss(found, wanted)).toBeLessThan(1e-9)
})

/** Every number of a parsed file, in its order. */
function listNumbers(value: unknown): number[] {
  if (typeof value === 'number') return [value]
  if (Array.isArray(value)) return value.flatMap(listNumbers)
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(listNumbers) : []
}
