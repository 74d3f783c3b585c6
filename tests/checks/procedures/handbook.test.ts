import { expect, test } from 'vitest'
import { pTukeyFromT, studentizedRangeQuantile, tail, upperQuantile } from '@/lib/checks'

// NIST/SEMATECH e-Handbook of Statistical Methods, section 7.4. The data and the Tukey limits (prc471.htm): read
// second hand in the public tests of a numerical library that cites the page. Scheffé's limits: prc472.htm, as printed.
const GROUPS = [
  [6.9, 5.4, 5.8, 4.6, 4.0],
  [8.3, 6.8, 7.8, 9.2, 6.5],
  [8.0, 10.5, 8.1, 6.9, 9.3],
  [5.8, 3.8, 6.1, 5.6, 6.2],
]
const SIZE = 5

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length
const squares = (values: readonly number[], centre: number) =>
  values.reduce((sum, value) => sum + (value - centre) ** 2, 0)

function analyse(groups: readonly number[][]) {
  const means = groups.map(mean)
  const between = SIZE * squares(means, mean(groups.flat()))
  const within = groups.reduce((sum, group, i) => sum + squares(group, means[i] ?? NaN), 0)
  const df: [number, number] = [groups.length - 1, groups.flat().length - groups.length]
  const error = within / df[1]
  return { means, between, within, df, error, F: between / df[0] / error }
}

const all = analyse(GROUPS)
const contrast = (weights: readonly number[]) => ({
  estimate: weights.reduce((sum, weight, i) => sum + weight * (all.means[i] ?? NaN), 0),
  spread: Math.sqrt((all.error * weights.reduce((sum, weight) => sum + weight * weight, 0)) / SIZE),
})

test('7.4.3: three groups have F = 9.59 on 2 and 12 df, p = 0.0032482', () => {
  // Sums of squares 27.897 and 17.452, F and p: second hand, three public test files.
  const { between, within, df, F } = analyse(GROUPS.slice(0, 3))
  expect(between).toBeCloseTo(27.897, 3)
  expect(within).toBeCloseTo(17.452, 3)
  expect(df).toEqual([2, 12])
  expect(F).toBeCloseTo(9.5911, 4)
  expect(tail('F', F, df)).toBeCloseTo(0.0032482, 7)
})

test('7.4.3: four groups have F = 9.724 on 3 and 16 df', () => {
  // Sums of squares and F from memory; R 4.2.2 agrees: 38.820, 21.292, 9.72384, p = 0.00068445.
  expect(all.between).toBeCloseTo(38.82, 3)
  expect(all.within).toBeCloseTo(21.292, 3)
  expect(all.F).toBeCloseTo(9.724, 3)
  expect(tail('F', all.F, all.df)).toBeCloseTo(0.00068445, 8)
})

test('7.4.7.1: Tukey’s limits of all six pairs are the printed ones', () => {
  const half = studentizedRangeQuantile(0.05, 4, 16) * Math.sqrt(all.error / SIZE)
  const pairs: [number, number, low: number, high: number][] = [
    [1, 0, 0.29, 4.47],
    [2, 0, 1.13, 5.31],
    [0, 3, -2.25, 1.93],
    [1, 2, -2.93, 1.25],
    [1, 3, 0.13, 4.31],
    [2, 3, 0.97, 5.15],
  ]
  for (const [a, b, low, high] of pairs) {
    const difference = (all.means[a] ?? NaN) - (all.means[b] ?? NaN)
    expect(difference - half).toBeCloseTo(low, 2)
    expect(difference + half).toBeCloseTo(high, 2)
    // An interval that holds 0 belongs to a p-value above 5%: the page calls 1–4 and 2–3 not significant.
    const t = difference / Math.sqrt((2 * all.error) / SIZE)
    expect(pTukeyFromT(t, 4, 16) > 0.05).toBe(low < 0 && high > 0)
  }
})

test('7.4.7.2: Scheffé’s limits of two contrasts are the printed ones', () => {
  // The contrasts are images on the page; these definitions, from memory, reproduce the printed estimates −0.5 and 0.34.
  const critical = Math.sqrt(3 * upperQuantile('F', 0.05, [3, 16]))
  expect(critical).toBeCloseTo(3.12, 2)
  const first = contrast([0.5, 0.5, -0.5, -0.5])
  const second = contrast([0.5, -0.5, 0.5, -0.5])
  expect(first.estimate).toBeCloseTo(-0.5, 10)
  expect(second.estimate).toBeCloseTo(0.34, 10)
  expect(first.spread).toBeCloseTo(0.5158, 3)
  expect(critical * first.spread).toBeCloseTo(1.608, 3)
  expect(first.estimate + critical * first.spread).toBeCloseTo(1.108, 3)
  expect(second.estimate - critical * second.spread).toBeCloseTo(-1.268, 3)
  expect(second.estimate + critical * second.spread).toBeCloseTo(1.948, 3)
  // The interval of one contrast alone ends at 0.594.
  expect(first.estimate + upperQuantile('t', 0.05, [16]) * first.spread).toBeCloseTo(0.594, 3)
})

test('7.4.7.3: Bonferroni’s half width of two contrasts is 1.276', () => {
  // From memory: t(0.0125; 16) = 2.473, half width 1.276; R 4.2.2 agrees: 2.472878, 1.275751.
  const critical = upperQuantile('t', 0.05 / 2, [16])
  expect(critical).toBeCloseTo(2.473, 3)
  expect(critical * contrast([0.5, 0.5, -0.5, -0.5]).spread).toBeCloseTo(1.276, 3)
})
