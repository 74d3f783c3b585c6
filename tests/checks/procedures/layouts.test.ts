import { expect, test } from 'vitest'
import {
  compareByDuncan,
  compareBySnk,
  compareBySteelDwass,
  compareByDunn,
  compareDataByDunn,
  pFisherHayterFromT,
  pLsd,
  tail,
} from '@/lib/checks'
import { readReference } from '../reference'

// Base R 4.2.2 on its built-in data sets and 30 random layouts (comparisons.R beside the file): range tests by a search
// of all stretches of the ordered means, Steel–Dwass by formula, ptukey. Tolerance: absolute 1e-8, that of ptukey.
type Layout = {
  name: string
  y: number[]
  g: number[]
  means: number[]
  sizes: number[]
  error: number
  df: number
  omnibus: number
  t: number[]
  snk: number[]
  snk_all: number[]
  duncan: number[]
  duncan_all: number[]
  fisher_hayter: number[]
  steel_dwass_q: number[]
  steel_dwass: number[]
}
const { layouts } = readReference<{ layouts: Layout[] }>('comparisons.json')
const TOLERANCE = 1e-8

const largestMiss = (found: readonly number[], wanted: readonly number[]) => {
  expect(found.length).toBe(wanted.length)
  return Math.max(...found.map((value, i) => Math.abs(value - (wanted[i] ?? NaN))))
}
const values = (pairs: readonly { p: number }[]) => pairs.map(({ p }) => p)
const split = ({ y, g, sizes }: Layout) => sizes.map((_, group) => y.filter((_, i) => g[i] === group))

test('Student–Newman–Keuls and Duncan agree with R in both harmonic forms', () => {
  expect(layouts.length).toBeGreaterThanOrEqual(40)
  for (const layout of layouts) {
    const overall = { ...layout, harmonic: 'all' as const }
    expect(largestMiss(values(compareBySnk(layout)), layout.snk), layout.name).toBeLessThan(TOLERANCE)
    expect(largestMiss(values(compareBySnk(overall)), layout.snk_all), layout.name).toBeLessThan(TOLERANCE)
    expect(largestMiss(values(compareByDuncan(layout)), layout.duncan), layout.name).toBeLessThan(TOLERANCE)
    expect(largestMiss(values(compareByDuncan(overall)), layout.duncan_all), layout.name).toBeLessThan(
      TOLERANCE,
    )
  }
})

test('Fisher–Hayter agrees with R', () => {
  for (const { name, means, df, omnibus, t, fisher_hayter } of layouts) {
    const found = t.map((value) => pFisherHayterFromT(value, means.length, df, omnibus))
    expect(largestMiss(found, fisher_hayter), name).toBeLessThan(TOLERANCE)
  }
})

test('Steel–Dwass agrees with R, ties included', () => {
  for (const layout of layouts) {
    const found = compareBySteelDwass(split(layout))
    expect(
      largestMiss(
        found.map(({ statistic }) => statistic),
        layout.steel_dwass_q,
      ),
      layout.name,
    ).toBeLessThan(1e-10)
    expect(largestMiss(values(found), layout.steel_dwass), layout.name).toBeLessThan(TOLERANCE)
  }
})

test('Duncan’s p is .05 at the critical values of his test', () => {
  // Harter (1960), Biometrics 16, 671–685: 5% points for spans of 2 … 6 means, from memory; R’s ptukey agrees.
  const table: [df: number, values: number[]][] = [
    [10, [3.151, 3.293, 3.376, 3.43, 3.465]],
    [20, [2.95, 3.097, 3.19, 3.255, 3.303]],
    [Infinity, [2.772, 2.918, 3.017, 3.089, 3.146]],
  ]
  for (const [df, values] of table) {
    values.forEach((q, i) => {
      // one mean q away from the others, whose standard error is 1
      const means = [...new Array<number>(i + 1).fill(0), q]
      const sizes = means.map(() => 1)
      expect(compareByDuncan({ means, sizes, error: 1, df })[i]?.p, `df ${df}`).toBeCloseTo(0.05, 4)
    })
  }
})

test('Student–Newman–Keuls’s p is .05 at the critical values of the studentized range', () => {
  // 4.65 for 5 means, 10 df: NIST/SEMATECH e-Handbook 7.4.7.1; 3.96 for 4 means, 20 df: a printed output in the
  // supplement S13 of a textbook by Montgomery and Runger; both to two decimals.
  for (const [groups, df, q] of [
    [5, 10, 4.65],
    [4, 20, 3.96],
  ] as const) {
    const means = [...new Array<number>(groups - 1).fill(0), q]
    const sizes = means.map(() => 1)
    expect(compareBySnk({ means, sizes, error: 1, df })[groups - 2]?.p).toBeCloseTo(0.05, 3)
  }
})

test('a pair of a range test is never called where a wider stretch that holds it is not', () => {
  for (const layout of layouts) {
    const ordered = { ...layout, means: [...layout.means].sort((a, b) => a - b), harmonic: 'all' as const }
    for (const compare of [compareBySnk, compareByDuncan]) {
      const pairs = compare(ordered)
      for (const { pair, p } of pairs) {
        const wider = pairs.filter((other) => other.pair[0] <= pair[0] && other.pair[1] >= pair[1])
        expect(Math.max(...wider.map((other) => other.p))).toBe(p)
      }
    }
  }
})

test('with two groups every test of pairs is the test of these two', () => {
  const [a, b] = [
    [1, 2, 4, 7],
    [3, 5, 8, 9, 11],
  ]
  const mean = (list: readonly number[]) => list.reduce((sum, x) => sum + x, 0) / list.length
  const squares = (list: readonly number[]) => list.reduce((sum, x) => sum + (x - mean(list)) ** 2, 0)
  const df = 7
  const error = (squares(a ?? []) + squares(b ?? [])) / df
  const t = (mean(a ?? []) - mean(b ?? [])) / Math.sqrt(error * (1 / 4 + 1 / 5))
  const p = tail('t', t, [df])
  const layout = { means: [mean(a ?? []), mean(b ?? [])], sizes: [4, 5], error, df }
  expect(compareBySnk(layout)[0]?.p).toBeCloseTo(p, 10)
  expect(compareByDuncan(layout)[0]?.p).toBeCloseTo(p, 10)
  expect(pFisherHayterFromT(t, 2, df, p)).toBeCloseTo(p, 12)
  expect(compareBySteelDwass([a ?? [], b ?? []])[0]?.p).toBeCloseTo(
    compareDataByDunn([a ?? [], b ?? []])[0]?.p ?? NaN,
    10,
  )
})

test('values that are all tied differ in nothing', () => {
  const groups = [
    [2, 2],
    [2, 2, 2],
    [2, 2],
  ]
  expect(values(compareDataByDunn(groups))).toEqual([1, 1, 1])
  expect(values(compareBySteelDwass(groups))).toEqual([1, 1, 1])
})

test('what cannot be compared is refused', () => {
  expect(() => compareDataByDunn([[1, 2]])).toThrow(RangeError)
  expect(() => compareDataByDunn([[1, 2], []])).toThrow(RangeError)
  expect(() => compareBySteelDwass([[1, NaN], [2]])).toThrow(RangeError)
  expect(() => compareByDunn([3, 3], [1, 2])).toThrow(/mean rank of 6 values/)
  expect(() => compareByDunn([3, 3], [3.5])).toThrow(RangeError)
  expect(() => compareByDunn([3, 3], [2, 5], 1000)).toThrow(RangeError)
  const layout = { means: [1, 2], sizes: [4, 4], error: 1, df: 6 }
  expect(() => compareBySnk({ ...layout, error: 0 })).toThrow(RangeError)
  expect(() => compareBySnk({ ...layout, means: [1] })).toThrow(RangeError)
  expect(() => compareBySnk({ ...layout, means: [1, NaN] })).toThrow(RangeError)
  expect(() => compareBySnk({ ...layout, sizes: [4, 2.5] })).toThrow(RangeError)
  expect(() => compareByDuncan({ ...layout, df: 0 })).toThrow(RangeError)
  expect(() => pFisherHayterFromT(2, 1, 10, 0.01)).toThrow(RangeError)
  expect(() => pLsd(0.01, 1.2)).toThrow(RangeError)
})
