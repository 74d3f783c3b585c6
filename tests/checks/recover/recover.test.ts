import { expect, test } from 'vitest'
import {
  fits,
  fitsAdaptive,
  fitsFromStatistics,
  judgeFits,
  parsePrinted,
  parsePrintedP,
  pBounds,
  roundingInterval,
  thresholdFits,
  type Interval,
  type PrintedStatistic,
  type Procedure,
} from '@/lib/checks'
import { differ, readReference } from '../reference'

// Brute force in R over procedure × size (header of recover.json); sets are exact, as every problem whose decision
// hangs on less than 1e-9 was thrown away there.
type Item = {
  kind: 't' | 'z' | 'F' | 'chisq' | 'r'
  value: string
  df?: number
  df1?: number
  df2?: number
  n?: number
}
type Problem = {
  id: string
  items: Item[]
  reported_adjusted_p: string[]
  raw_p_lower: number[]
  raw_p_upper: number[]
  fits: { procedure: string; sizes: [number, number][] }[]
  solution_class: string
  truth: { procedure: string; size: number } | null
  claim: { procedure: string; size: number } | null
  claim_fits: boolean | null
}
type Threshold = {
  reported_threshold: string
  fits: { procedure: string; alpha: number; m_from: number; m_to: number }[]
}
const reference = readReference<{ problems: Problem[]; thresholds: Threshold[] }>('recover.json')

const NAMES: Record<string, Procedure | 'raw'> = { none: 'raw', BH: 'bh', BY: 'by' }
const rename = (name: string) => NAMES[name] ?? name

function listExpected({ fits }: Problem, include: (name: string) => boolean): string[] {
  const rows = fits.filter(({ procedure }) => include(procedure))
  return rows
    .flatMap(({ procedure, sizes }) => {
      if (procedure === 'none') return ['raw']
      return sizes.flatMap(([from, to]) =>
        Array.from({ length: to - from + 1 }, (_, i) => `${rename(procedure)} ${from + i}`),
      )
    })
    .sort()
}

const isFromT = (name: string) => name === 'tukey' || name === 'scheffe'
const printedOf = ({ reported_adjusted_p }: Problem): Interval[] =>
  reported_adjusted_p.map((text) => parsePrintedP(text) ?? { low: NaN, high: NaN })

function toStatistic({ kind, value, df, df1, df2, n }: Item): PrintedStatistic {
  const { value: number, decimals } = parsePrinted(value) ?? { value: NaN, decimals: 0 }
  const interval = roundingInterval(number, decimals)
  const listed = { t: [df], z: [], F: [df1, df2], chisq: [df], r: [(n ?? NaN) - 2] }[kind]
  return { test: kind === 'chisq' ? 'chi2' : kind, ...interval, df: listed.map((entry) => entry ?? NaN) }
}

test('p-values over the rounding intervals of printed statistics are R’s', () => {
  for (const problem of reference.problems) {
    const bounds = problem.items
      .map(toStatistic)
      .map(({ test: kind, low, high, df }) => pBounds(kind, low, high, df))
    const found = [...bounds.map(({ low }) => low), ...bounds.map(({ high }) => high)]
    expect(differ(found, [...problem.raw_p_lower, ...problem.raw_p_upper]), problem.id).toBeLessThan(1e-10)
  }
})

test('the procedures and sizes that fit raw intervals are exactly those found in R', () => {
  expect(reference.problems.length).toBeGreaterThanOrEqual(160)
  for (const problem of reference.problems) {
    const raw = problem.raw_p_lower.map((low, i) => ({ low, high: problem.raw_p_upper[i] ?? NaN }))
    const found = fits(printedOf(problem), raw).map(({ procedure, m }) =>
      procedure === 'raw' ? 'raw' : `${procedure} ${m}`,
    )
    expect(found.sort(), problem.id).toEqual(listExpected(problem, (name) => !isFromT(name)))
  }
})

test('from the statistics Tukey and Scheffé are found for exactly the numbers of groups found in R', () => {
  let recovered = 0
  for (const problem of reference.problems) {
    const found = fitsFromStatistics(printedOf(problem), problem.items.map(toStatistic))
    const listed = found.filter(({ procedure }) => procedure !== 'dunnett')
    expect(judgeFits(listed), problem.id).toBe(problem.solution_class)
    const holds = (said: Problem['claim']) =>
      listed.some(
        ({ procedure, m, groups }) =>
          said !== null &&
          procedure === rename(said.procedure) &&
          (procedure === 'raw' || (groups ?? m) === said.size),
      )
    if (problem.truth !== null) expect(holds(problem.truth), problem.id).toBe(true)
    if (problem.claim !== null) expect(holds(problem.claim), problem.id).toBe(problem.claim_fits)
    const named = listed.map(({ procedure, m, groups }) =>
      procedure === 'raw' ? 'raw' : `${procedure} ${groups ?? m}`,
    )
    expect(named.sort(), problem.id).toEqual(listExpected(problem, () => true))
    recovered += named.filter((name) => isFromT(name.split(' ')[0] ?? '')).length
  }
  expect(recovered).toBeGreaterThan(18)
})

test('per-test thresholds lead back to the alpha and the m that R finds', () => {
  expect(reference.thresholds.length).toBeGreaterThanOrEqual(40)
  for (const { reported_threshold, fits: expected } of reference.thresholds) {
    const { value, decimals } = parsePrinted(reported_threshold) ?? { value: NaN, decimals: 0 }
    const found = thresholdFits(roundingInterval(value, decimals))
    expect(found, reported_threshold).toEqual(
      expected.map(({ procedure, alpha, m_from, m_to }) => ({ procedure, alpha, from: m_from, to: m_to })),
    )
  }
})

// R 4.2.2 on its built-in data sets (header of datasets.json), printed as a paper would: t to 2 decimals, p to 3.
type DataSet = {
  name: string
  grand: { k: number }
  groups: { n: number[] }
  pairwise_t_pooled: { t: number[]; df: number }
  pairwise_t_separate: { t: number[]; df: number[] }
  tukey: { p: number[] }
  scheffe: { p: number[] }
  games_howell: { p: number[] }
  dunnett?: { t: number[]; df: number; p: number[] }
}
const { cases } = readReference<{ cases: DataSet[] }>('datasets.json')
const print = (value: number, decimals: number) => roundingInterval(Number(value.toFixed(decimals)), decimals)
const printP = (p: number): Interval => (p < 0.001 ? { low: 0, high: 0.001 } : print(p, 3))
const printT = (t: number, df: number): PrintedStatistic => ({ test: 't', ...print(t, 2), df: [df] })

test('Tukey, Scheffé, Games–Howell and Dunnett are recovered from the printed statistics of R’s data sets', () => {
  let recovered = 0
  for (const item of cases) {
    const { name, grand, groups, pairwise_t_pooled, pairwise_t_separate } = item
    const pooled = pairwise_t_pooled.t.map((t) => printT(t, pairwise_t_pooled.df))
    const welch = pairwise_t_separate.t.map((t, i) =>
      printT(t, Number((pairwise_t_separate.df[i] ?? NaN).toFixed(1))),
    )
    const m = (grand.k * (grand.k - 1)) / 2
    const find = (p: readonly number[], statistics: readonly PrintedStatistic[]) =>
      fitsFromStatistics(p.map(printP), statistics)
    const all = { m, groups: grand.k }
    expect(find(item.tukey.p, pooled), name).toContainEqual({ procedure: 'tukey', ...all })
    expect(find(item.scheffe.p, pooled), name).toContainEqual({ procedure: 'scheffe', ...all })
    expect(find(item.games_howell.p, welch), name).toContainEqual({ procedure: 'games-howell', ...all })
    recovered++
    if (item.dunnett === undefined || new Set(groups.n).size > 1) continue
    const { t, df, p } = item.dunnett
    expect(
      find(
        p,
        t.map((value) => printT(value, df)),
      ),
      name,
    ).toContainEqual({
      procedure: 'dunnett',
      m: grand.k - 1,
      groups: grand.k,
    })
    recovered++
  }
  expect(recovered).toBeGreaterThanOrEqual(18)
})

test('statistics on less than one degree of freedom leave the procedures on t out and throw nothing', () => {
  const found = fitsFromStatistics([{ low: 0.2, high: 0.9 }], [{ test: 't', low: 1, high: 1.1, df: [0.5] }])
  expect(found.every(({ groups }) => groups === null)).toBe(true)
})

test('items without a raw value are left out and do not count', () => {
  const unknown = { low: NaN, high: NaN }
  const found = fits(
    [{ low: 0.0295, high: 0.0305 }, unknown],
    [
      { low: 0.01, high: 0.01 },
      { low: 0.2, high: 0.2 },
    ],
  )
  expect(found).toContainEqual({ procedure: 'bonferroni', m: 3 })
  expect(fits([unknown], [unknown])).toEqual([])
  expect(() => fits([unknown], [])).toThrow(RangeError)
  expect(() => fits([unknown], [{ low: 0.2, high: 0.1 }])).not.toThrow()
  expect(() => fits([{ low: 0, high: 1 }], [{ low: 0.2, high: 0.1 }])).toThrow(RangeError)
  expect(() => fits([{ low: 0, high: 1 }], [{ low: 0.2, high: 1.1 }])).toThrow(RangeError)
})

test('two-stage and Storey are tried on request only', () => {
  // BH 0.02, 0.04, 0.04, 0.9 of 0.005, 0.02, 0.03, 0.9; three rejected at 0.05 / 1.05, so m0 = 1 of 4.
  const raw = [0.005, 0.02, 0.03, 0.9].map((p) => ({ low: p, high: p }))
  const printed = [0.00525, 0.0105, 0.0105, 0.23625].map((p) => ({ low: p, high: p }))
  expect(fits(printed, raw)).toEqual([])
  expect(fits(printed, raw, { adaptive: true })).toContainEqual({ procedure: 'bky', m: 4 })
  expect(fitsAdaptive(printed, raw)).toContainEqual({ procedure: 'bky', m: 4 })
  // without the factor 1 + alpha
  const unscaled = [0.005, 0.01, 0.01, 0.225].map((p) => ({ low: p, high: p }))
  const found = fitsAdaptive(unscaled, raw).filter(({ m }) => m === 4)
  expect(found.map(({ procedure }) => procedure)).toEqual(['bky-unscaled', 'tsbh'])
})
