import fc from 'fast-check'
import { expect, test } from 'vitest'
import { roundingInterval, summarize, type Interval, type SummaryGroup } from '@/lib/checks'
import { readReference } from '../reference'

type Case = {
  name: string
  levels: string[]
  groups: { n: number[]; mean: number[]; sd: number[] }
  anova: { F: number; p: number }
  welch_anova: { F: number; p: number }
  pairwise_t_pooled: { t: number[]; p: number[] }
  pairwise_t_separate: { t: number[]; df: number[]; p: number[] }
  tukey: { p: number[] }
  games_howell: { p: number[] }
}
const { cases } = readReference<{ cases: Case[] }>('datasets.json')

function expectInside(value: number, interval: Interval | null | undefined, what: string) {
  const room = 1e-9 * Math.abs(value) + 1e-12
  expect(value, what).toBeGreaterThanOrEqual((interval?.low ?? NaN) - room)
  expect(value, what).toBeLessThanOrEqual((interval?.high ?? NaN) + room)
}

test('the statistics of the data sets lie within the rounding of their printed means and standard deviations', () => {
  // R 4.2.2 on unrounded data (header of datasets.json); means and sds are rounded here as a paper would.
  for (const each of cases) {
    for (const decimals of [0, 2]) {
      const print = (value: number | undefined) => Number((value ?? NaN).toFixed(decimals))
      if (each.groups.sd.every((sd) => print(sd) === 0)) continue
      const groups = each.levels.map((group, i) => ({
        group,
        n: each.groups.n[i] ?? NaN,
        mean: print(each.groups.mean[i]),
        sd: print(each.groups.sd[i]),
        meanDecimals: decimals,
        spreadDecimals: decimals,
      }))
      const { bounds, comparisons } = summarize(groups, { procedures: ['tukey', 'games-howell'] })
      const what = `${each.name} with ${decimals} decimals`
      expectInside(each.anova.F, bounds?.f, what)
      expectInside(each.anova.p, bounds?.p, what)
      if (bounds?.welch) {
        expectInside(each.welch_anova.F, bounds.welch.f, what)
        expectInside(each.welch_anova.p, bounds.welch.p, what)
      }
      comparisons.forEach(({ bounds: of }, i) => {
        expectInside(each.pairwise_t_pooled.t[i] ?? NaN, of?.pooled.t, what)
        expectInside(each.pairwise_t_pooled.p[i] ?? NaN, of?.pooled.p, what)
        expectInside(each.tukey.p[i] ?? NaN, of?.adjusted[0]?.p, what)
        if (!of?.welch) return
        expectInside(each.pairwise_t_separate.t[i] ?? NaN, of.welch.t, what)
        expectInside(each.pairwise_t_separate.df[i] ?? NaN, of.welch.df, what)
        expectInside(each.pairwise_t_separate.p[i] ?? NaN, of.welch.p, what)
        expectInside(each.games_howell.p[i] ?? NaN, of.adjusted[1]?.p, what)
      })
    }
  }
})

const printed = fc.record({
  n: fc.integer({ min: 2, max: 40 }),
  mean: fc.integer({ min: -40, max: 40 }).map((value) => value / 10),
  sd: fc.integer({ min: 1, max: 30 }).map((value) => value / 10),
})
const designs = fc
  .array(printed, { minLength: 2, maxLength: 5 })
  .map((groups) =>
    groups.map((each, i): SummaryGroup => ({ ...each, group: `g${i}`, meanDecimals: 1, spreadDecimals: 1 })),
  )
const places = fc.array(fc.constantFrom(0, 0.1, 0.5, 0.93, 1), { minLength: 10, maxLength: 10 })

const within = (value: number, at: number, least = -Infinity) => {
  const { low, high } = roundingInterval(value, 1)
  return Math.max(least, low + at * (high - low))
}

/** Unrounded groups somewhere in the box of the printed ones. */
const unround = (groups: readonly SummaryGroup[], at: readonly number[]): SummaryGroup[] =>
  groups.map(({ group, n, mean, sd = NaN }, i) => ({
    group,
    n,
    mean: within(mean, at[2 * i] ?? 0),
    sd: within(sd, at[2 * i + 1] ?? 0, 0),
  }))

test('whatever is printed alike has its statistics within the bounds', () => {
  fc.assert(
    fc.property(designs, places, (groups, at) => {
      const { bounds, comparisons } = summarize(groups, { procedures: [] })
      const inside = summarize(unround(groups, at), { procedures: [] })
      expectInside(inside.anova.f, bounds?.f, 'F')
      expectInside(inside.anova.p, bounds?.p, 'p of F')
      if (bounds?.welch && inside.welch) {
        expectInside(inside.welch.f, bounds.welch.f, 'Welch F')
        expectInside(inside.welch.df2, bounds.welch.df2, 'Welch df2')
        expectInside(inside.welch.p, bounds.welch.p, 'p of Welch F')
      }
      comparisons.forEach(({ bounds: of }, i) => {
        const found = inside.comparisons[i]
        expectInside(found?.pooled.t ?? NaN, of?.pooled.t, 't')
        expectInside(found?.pooled.p ?? NaN, of?.pooled.p, 'p of t')
        if (!of?.welch || !found?.welch) return
        expectInside(found.welch.t, of.welch.t, 'Welch t')
        expectInside(found.welch.df, of.welch.df, 'Welch df')
        expectInside(found.welch.p, of.welch.p, 'p of Welch t')
      })
    }),
    { numRuns: 120, seed: 11 },
  )
})

test('the bounds of F and of the pooled t are attained at some corner, those of Welch’s p nearly', () => {
  fc.assert(
    fc.property(designs, (groups) => {
      const two = groups.slice(0, 2)
      const { bounds, comparisons } = summarize(two, { procedures: [] })
      const corners = Array.from({ length: 16 }, (_, corner) =>
        summarize(
          unround(
            two,
            [0, 1, 2, 3].map((bit) => (corner >> bit) & 1),
          ),
          { procedures: [] },
        ),
      )
      const largest = (values: (number | undefined)[]) => Math.max(...values.map((value) => value ?? NaN))
      expect(bounds?.exact).toBe(true)
      expect(bounds?.f.high).toBeCloseTo(largest(corners.map(({ anova }) => anova.f)), 6)
      const t = corners.map((each) => each.comparisons[0]?.pooled.t)
      expect(comparisons[0]?.bounds?.pooled.t.high).toBeCloseTo(largest(t), 9)
      const of = comparisons[0]?.bounds?.welch
      if (!of || (of.t.low <= 0 && of.t.high >= 0)) return
      // Along the edges of the spreads, 200 steps each; the difference at its smallest.
      const [one, other] = two.map(({ n, sd = NaN }) => ({ n, sd }))
      const size = Math.min(Math.abs(of.t.low), Math.abs(of.t.high))
      const gap = Math.abs(comparisons[0]?.difference ?? NaN) - 0.1
      expect(size).toBeGreaterThan(0)
      const p: number[] = []
      for (let step = 0; step <= 200; step++) {
        for (const [a, b] of [
          [1, step / 200],
          [step / 200, 1],
        ] as const) {
          const test = summarize(
            [
              { group: 'a', n: one?.n ?? NaN, mean: 0, sd: within(one?.sd ?? NaN, a, 0) },
              { group: 'b', n: other?.n ?? NaN, mean: gap, sd: within(other?.sd ?? NaN, b, 0) },
            ],
            { procedures: [] },
          )
          p.push(test.comparisons[0]?.welch?.p ?? NaN)
        }
      }
      const attained = largest(p)
      expect(of.p.high).toBeGreaterThanOrEqual(attained * (1 - 1e-9))
      expect(of.p.high).toBeLessThanOrEqual(attained * (1 + 1e-3))
    }),
    { numRuns: 40, seed: 5 },
  )
})

test('a mean printed with one digit leaves significance open', () => {
  // R 4.2.2: two groups of 12, sd 1.0, means 0.8 and 0 as printed: t = 1.9596, p = 0.0628; with the difference at 0.9
  // and both sd at 0.95, t = 2.3206, p = 0.0300; at 0.7 and 1.05, t = 1.6330, p = 0.1167.
  const group = (name: string, mean: number): SummaryGroup => ({
    group: name,
    n: 12,
    mean,
    sd: 1,
    meanDecimals: 1,
    spreadDecimals: 1,
  })
  const [pair] = summarize([group('still', 0), group('stirred', 0.8)]).comparisons
  expect(pair?.pooled.t).toBeCloseTo(1.9596, 4)
  expect(pair?.pooled.p).toBeCloseTo(0.0628, 4)
  expect(pair?.bounds?.pooled.p.low).toBeCloseTo(0.03, 4)
  expect(pair?.bounds?.pooled.p.high).toBeCloseTo(0.1167, 4)
})

test('beyond twelve groups F has an outer bound and says so', () => {
  const groups = Array.from({ length: 14 }, (_, i): SummaryGroup => ({
    group: `g${i}`,
    n: 5 + i,
    mean: i / 10,
    sd: 1,
    meanDecimals: 1,
    spreadDecimals: 1,
  }))
  const { bounds, anova } = summarize(groups, { procedures: [] })
  expect(bounds?.exact).toBe(false)
  expectInside(anova.f, bounds?.f, 'F')
  expectInside(anova.p, bounds?.p, 'p')
})

test('numbers without decimals have no rounding', () => {
  const { bounds, comparisons } = summarize([
    { group: 'a', n: 4, mean: 1, sd: 1 },
    { group: 'b', n: 4, mean: 2, se: 0.4 },
  ])
  expect(bounds).toBeNull()
  expect(comparisons[0]?.bounds).toBeNull()
})

test('a spread printed as 0 leaves Welch’s test open and the pooled one certain', () => {
  const group = (name: string, mean: number, sd: number): SummaryGroup => ({
    group: name,
    n: 6,
    mean,
    sd,
    meanDecimals: 1,
    spreadDecimals: 1,
  })
  const { welch, bounds, comparisons } = summarize([group('a', 1, 0), group('b', 2, 0), group('c', 3, 0.4)])
  expect(welch).toBeNull()
  expect(bounds?.welch).toBeNull()
  expect(comparisons[0]?.welch).toBeNull()
  expect(comparisons[0]?.bounds?.welch).toBeNull()
  expect(comparisons[0]?.adjusted.find(({ procedure }) => procedure === 'games-howell')?.p).toBeNull()
  expect(comparisons[0]?.pooled.p).toBeLessThan(0.001)
})
