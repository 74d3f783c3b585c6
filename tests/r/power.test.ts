import { expect } from 'vitest'
import {
  compareProcedurePower,
  computePower,
  findDetectableEffect,
  findSampleSize,
  summarize,
  type SummaryGroup,
} from '@/lib/checks'
import { runR, testWithR } from '../support/rscript'

const readRows = (script: string): number[][] =>
  runR(script)
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/).map(Number))

const expectWithin = (found: number, wanted: number, room: number, what: unknown) =>
  expect(Math.abs(found - wanted), JSON.stringify(what)).toBeLessThanOrEqual(room)

testWithR('power of t tests is that of power.t.test, default and strict', () => {
  const rows = readRows(`
    for (type in c("two.sample", "paired")) for (n in c(4, 15, 33, 90)) for (d in c(0.15, 0.45, 0.9))
      for (a in c(0.05, 0.05 / 7)) { f <- function(s) power.t.test(n, d, 1, a, type = type, strict = s)$power
        cat(as.integer(type == "paired"), n, d, sprintf("%.17g", c(a, f(FALSE), f(TRUE))), "\\n") }`)
  expect(rows.length).toBe(48)
  for (const row of rows) {
    const [paired, n = NaN, effect = NaN, alpha = NaN, power = NaN, strict = NaN] = row
    const options = { design: paired ? 'paired' : 'two-sample', n, effect, alpha } as const
    expectWithin(computePower({ ...options, farTail: false }), power, 1e-9, row)
    expectWithin(computePower(options), strict, 1e-9, row)
  }
})

testWithR('sample sizes and detectable differences are those of power.t.test', () => {
  const rows = readRows(`
    for (d in c(0.3, 0.55, 1.1)) for (a in c(0.05, 0.005)) { n <- power.t.test(delta = d, sig.level = a, power = 0.85,
      strict = TRUE, tol = 1e-12)$n; e <- uniroot(function(x) power.t.test(30, x, 1, a, strict = TRUE)$power - 0.85,
      c(0.01, 5), tol = 1e-13)$root; cat(d, sprintf("%.17g", c(a, n, e)), "\\n") }`)
  expect(rows.length).toBe(6)
  for (const row of rows) {
    const [effect = NaN, alpha = NaN, n = NaN, detectable = NaN] = row
    const options = { design: 'two-sample', alpha, power: 0.85 } as const
    expectWithin(findSampleSize({ ...options, effect }).continuous, n, 1e-6, row)
    expectWithin(findDetectableEffect({ ...options, n: 30 }), detectable, 1e-9, row)
  }
})

testWithR('power and sample size of one-way designs are those of power.anova.test', () => {
  // Its between.var has the divisor groups − 1; the standard deviation of the means here has the divisor groups.
  const rows = readRows(`
    for (k in c(2, 3, 5)) for (n in c(6, 20)) for (f in c(0.15, 0.35)) { b <- f^2 * k / (k - 1)
      p <- power.anova.test(k, n, between.var = b, within.var = 1, sig.level = 0.01)$power
      s <- power.anova.test(k, between.var = b, within.var = 1, sig.level = 0.01, power = 0.8)$n
      cat(k, n, f, sprintf("%.17g", c(p, s)), "\\n") }`)
  expect(rows.length).toBe(12)
  for (const row of rows) {
    const [groups = NaN, n = NaN, effect = NaN, power = NaN, size = NaN] = row
    const options = { design: 'one-way', groups, effect, alpha: 0.01 } as const
    expectWithin(computePower({ ...options, n }), power, 5e-9, row)
    expectWithin(findSampleSize({ ...options, power: 0.8 }).continuous, size, 1e-4 * size, row)
  }
})

testWithR('the power of step-wise procedures is that of p.adjust on simulated p-values', () => {
  // A simulation with a fixed seed on the side of the reference alone: 4,000 families, four standard errors.
  const families = 4_000
  const designs: [m: number, trueEffects: number, n: number, effect: number][] = [
    [5, 2, 20, 0.9],
    [10, 10, 16, 0.8],
    [12, 3, 30, 0.7],
  ]
  const rows = readRows(
    `set.seed(20)\n${designs
      .map(
        ([m, m1, n, d]) => `
      df <- ${2 * n - 2}; N <- ${families}
      t <- matrix(rnorm(N * ${m}), N); t[, 1:${m1}] <- t[, 1:${m1}] + ${d} * sqrt(${n} / 2)
      p <- 2 * pt(-abs(t / sqrt(matrix(rchisq(N * ${m}, df), N) / df)), df)
      rate <- function(method) { r <- apply(p, 1, function(q) mean(p.adjust(q, method)[1:${m1}] <= 0.05)); c(mean(r), sd(r) / sqrt(N)) }
      cat(sprintf("%.10f", c(rate("bonferroni"), rate("holm"), rate("hochberg"), rate("BH"))), "\\n")`,
      )
      .join('\n')}`,
  )
  designs.forEach(([m, trueEffects, n, effect], i) => {
    const found = compareProcedurePower({ design: 'independent', m, trueEffects, n, effect })
    for (const [j, procedure] of ['bonferroni', 'holm', 'hochberg', 'bh'].entries()) {
      const [rate = NaN, error = NaN] = rows[i]?.slice(2 * j, 2 * j + 2) ?? []
      const power = found.find((row) => row.procedure === procedure)?.power ?? NaN
      expectWithin(power, rate, 4 * error, { procedure, m, trueEffects })
    }
  })
})

testWithR('the power of Holm for comparisons with one control lies between its bounds', () => {
  const rows = readRows(`
    set.seed(8); N <- 20000; n <- 15; k <- 4; hit <- 0
    for (i in 1:N) { m <- rnorm(k, c(0, 0.9, 0.9, 0), 1 / sqrt(n)); v <- rchisq(1, k * (n - 1)) / (k * (n - 1))
      p <- 2 * pt(-abs((m[-1] - m[1]) / sqrt(2 * v / n)), k * (n - 1)); hit <- hit + mean(p.adjust(p, "holm")[1:2] <= 0.05) }
    cat(sprintf("%.10f", hit / N), "\\n")`)
  const rate = rows[0]?.[0] ?? NaN
  const holm = compareProcedurePower({
    design: 'many-to-one',
    groups: 4,
    n: 15,
    effect: 0.9,
    trueEffects: 2,
  }).find(({ procedure }) => procedure === 'holm')
  const error = 4 * Math.sqrt((rate * (1 - rate)) / 20_000)
  expect(rate).toBeGreaterThan((holm?.bounds.low ?? NaN) - error)
  expect(rate).toBeLessThan((holm?.bounds.high ?? NaN) + error)
})

const DATA_SETS = [
  ['PlantGrowth', 'weight', 'group'],
  ['InsectSprays', 'count', 'spray'],
  ['chickwts', 'weight', 'feed'],
  ['warpbreaks', 'breaks', 'tension'],
] as const

for (const [data, response, factor] of DATA_SETS) {
  testWithR(`${data}: aov, oneway.test and TukeyHSD follow from the means that R prints`, () => {
    const rows = readRows(`
      y <- ${data}$${response}; g <- factor(${data}$${factor}); f <- aov(y ~ g); s <- summary(f)[[1]]; w <- oneway.test(y ~ g)
      for (l in levels(g)) cat(sprintf("%.17g", c(sum(g == l), mean(y[g == l]), sd(y[g == l]))), "\\n")
      cat(sprintf("%.17g", c(s[1, 4], s[1, 5], w$statistic, w$parameter, w$p.value)), "\\n")
      h <- TukeyHSD(f)$g; for (i in seq_len(nrow(h))) cat(sprintf("%.17g", h[i, ]), "\\n")`)
    const last = rows.findIndex((row) => row.length === 6)
    const groups = rows
      .slice(0, last)
      .map(([n = NaN, mean = NaN, sd = NaN], i): SummaryGroup => ({ group: `g${i}`, n, mean, sd }))
    const { anova, welch, comparisons } = summarize(groups, { procedures: ['tukey'] })
    const found = [anova.f, anova.p, welch?.f, welch?.df1, welch?.df2, welch?.p]
    found.forEach((value, i) => {
      const wanted = rows[last]?.[i] ?? NaN
      expectWithin(value ?? NaN, wanted, 1e-9 * Math.abs(wanted), i)
    })
    const pairs = rows.slice(last + 1)
    expect(comparisons.length).toBe(pairs.length)
    comparisons.forEach(({ difference, adjusted: [tukey] }, i) => {
      const [diff = NaN, low = NaN, high = NaN, p = NaN] = pairs[i] ?? []
      expectWithin(difference, diff, 1e-9 * Math.abs(diff) + 1e-11, i)
      expectWithin(tukey?.interval?.low ?? NaN, low, 1e-6, i)
      expectWithin(tukey?.interval?.high ?? NaN, high, 1e-6, i)
      expectWithin(tukey?.p ?? NaN, p, 1e-8, i)
    })
  })
}
