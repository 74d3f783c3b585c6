import { expect, test } from 'vitest'
import {
  fits,
  fitsFromStatistics,
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
    const named = found.flatMap(({ procedure, m, groups }) => {
      if (procedure === 'dunnett') return []
      return [procedure === 'raw' ? 'raw' : `${procedure} ${groups ?? m}`]
    })
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

test('Dunnett against one control is recovered from R’s p-values of a data set', () => {
  // R: PlantGrowth, two treatments against the control, df 27; p by double quadrature 0.3226957, 0.1534859.
  const statistics = [-1.33, 1.77].map((value) => ({
    test: 't' as const,
    ...roundingInterval(value, 2),
    df: [27],
  }))
  const found = fitsFromStatistics([roundingInterval(0.323, 3), roundingInterval(0.153, 3)], statistics)
  expect(found).toContainEqual({ procedure: 'dunnett', m: 2, groups: 3 })
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
})

test('two-stage and Storey are tried on request only', () => {
  // BH 0.02, 0.04, 0.04, 0.9 of 0.005, 0.02, 0.03, 0.9; three rejected at 0.05 / 1.05, so m0 = 1 of 4.
  const raw = [0.005, 0.02, 0.03, 0.9].map((p) => ({ low: p, high: p }))
  const printed = [0.00525, 0.0105, 0.0105, 0.23625].map((p) => ({ low: p, high: p }))
  expect(fits(printed, raw)).toEqual([])
  expect(fits(printed, raw, { adaptive: true })).toContainEqual({ procedure: 'bky', m: 4 })
})
