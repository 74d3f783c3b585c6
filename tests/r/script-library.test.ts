import { expect } from 'vitest'
import { writeScript } from '@/lib/checks/r-script/script'
import { rNumbers } from '@/lib/checks/r-script/literals'
import { readReference, toNumber, type Printed } from '../checks/reference'
import { runR, testWithR } from '../support/rscript'

// The R functions that the scripts carry, held against the reference files (R 4.2.2 and mpmath, see their headers), so
// that a script which says "agrees" says it by numbers that are right themselves.

const run = (functions: Parameters<typeof writeScript>[0]['functions'], body: readonly string[]) =>
  runR(writeScript({ title: 'Test', facts: [], functions, body: body.join('\n') })).trim()

const NAMES = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  bh: 'BH',
  by: 'BY',
  sidak: 'sidak',
  'holm-sidak': 'holm-sidak',
} as const

type Vector = {
  n: number | null
  p: Printed[]
  adjusted: Record<string, number[]>
  storey_lambda05: { q: number[] }
  twostage: { alpha: number; bky: number[]; tsbh: number[] }[]
}

testWithR('adjust_p agrees with the reference vectors for every procedure on p-values', () => {
  const { vectors } = readReference<{ vectors: Vector[] }>('padjust.json')
  const whole = vectors.filter(({ p }) => p.every((one) => !Number.isNaN(toNumber(one))))
  const lines = whole.flatMap(({ n, p, adjusted, storey_lambda05, twostage }, i) => {
    const m = n ?? p.length
    const one = (procedure: string, shown: readonly number[] | undefined, alpha = 0.05) =>
      shown
        ? [
            `check("${procedure} ${i}", ${rNumbers(shown)}, adjust_p("${procedure}", p, ${m}, ${alpha}), 1e-12)`,
          ]
        : []
    return [
      `p <- ${rNumbers(p.map(toNumber))}`,
      ...Object.entries(NAMES).flatMap(([ours, theirs]) => one(ours, adjusted[theirs])),
      ...(n === null ? one('storey', storey_lambda05.q) : []),
      ...(n === null
        ? twostage.flatMap(({ alpha, bky, tsbh }) => [
            ...one('bky', bky, alpha),
            ...one('tsbh', tsbh, alpha),
            ...one(
              'bky-unscaled',
              bky.every((q) => q < 1) ? bky.map((q) => q / (1 + alpha)) : undefined,
              alpha,
            ),
          ])
        : []),
    ]
  })
  expect(whole.length).toBeGreaterThan(200)
  expect(run(['procedures'], lines)).toBe('agrees')
})

type Ends = { lower: number[]; upper: number[] }
type Problem = {
  n: number | null
  p_lower: number[]
  p_upper: number[]
  adjusted: Record<string, Ends>
}

testWithR('adjust_bounds agrees with the reference bounds, the two-stage ones too', () => {
  const { problems } = readReference<{ problems: Problem[] }>('rounding.json')
  const names = { ...NAMES, storey: 'storey_lambda05', bky: 'bky_alpha05', tsbh: 'tsbh_alpha05' }
  const lines = problems.flatMap(({ n, p_lower, p_upper, adjusted }, i) => [
    `low <- ${rNumbers(p_lower)}; high <- ${rNumbers(p_upper)}`,
    ...Object.entries(names).flatMap(([ours, theirs]) => {
      const ends = adjusted[theirs]
      if (!ends) return []
      return [
        `bounds <- adjust_bounds("${ours}", low, high, ${n ?? p_lower.length})`,
        `check("${ours} ${i}, low", ${rNumbers(ends.lower)}, bounds$low, 1e-11)`,
        `check("${ours} ${i}, high", ${rNumbers(ends.upper)}, bounds$high, 1e-11)`,
      ]
    }),
  ])
  expect(run(['procedures'], lines)).toBe('agrees')
})

testWithR('tukey_p agrees with the reference studentized range into the tail', () => {
  const { ptukey } = readReference<{
    ptukey: { q: number; nmeans: number; df: Printed; upper: number }[]
  }>('dists.json')
  const some = ptukey.filter((_, i) => i % 9 === 0)
  const lines = some.map(
    ({ q, nmeans, df, upper }, i) =>
      `check("q ${i}", ${upper}, tukey_p(${q} / sqrt(2), ${nmeans}, ${toNumber(df) === Infinity ? 'Inf' : toNumber(df)}))`,
  )
  expect(some.some(({ upper }) => upper < 1e-8)).toBe(true)
  expect(run(['studentized-range'], lines)).toBe('agrees')
})

testWithR('dunnett_p agrees with the reference data sets, equal and unequal groups', () => {
  const { cases } = readReference<{
    cases: { name: string; dunnett?: { t: number[]; df: number; lambda: number[]; p: number[] } }[]
  }>('datasets.json')
  const lines = cases
    .slice(0, 6)
    .flatMap(({ name, dunnett }) =>
      dunnett
        ? [
            `check("${name}", ${rNumbers(dunnett.p)}, sapply(${rNumbers(dunnett.t)}, dunnett_p, loadings = ${rNumbers(dunnett.lambda)}, df = ${dunnett.df}), 1e-7)`,
          ]
        : [],
    )
  expect(lines.length).toBeGreaterThan(3)
  expect(run(['dunnett'], lines)).toBe('agrees')
})

testWithR('p_range agrees with t(28) = 2.05, r(48) = .35 and the ends of fractional df', () => {
  // by R itself, from the ends of the printed rounding
  const lines = [
    'check("t", c(2 * pt(-2.055, 28), 2 * pt(-2.045, 28)), p_range("t", 2.05, 2, "28"))',
    'ends <- c(0.355, 0.345); t <- ends * sqrt(48 / (1 - ends^2))',
    'check("r", 2 * pt(-t, 48), p_range("r", 0.35, 2, "48"))',
    'check("F", c(pf(3.605, 1.245, 23.565, lower.tail = FALSE), pf(3.595, 1.235, 23.555, lower.tail = FALSE)), p_range("F", 3.60, 2, c("1.24", "23.56")))',
  ]
  expect(run(['tails'], lines)).toBe('agrees')
})
