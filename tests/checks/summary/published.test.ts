import { expect, test } from 'vitest'
import { summarize, type SummaryGroup } from '@/lib/checks'

const read = (groups: Record<string, readonly number[]>): SummaryGroup[] =>
  Object.entries(groups).map(([group, values]) => {
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length
    const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0)
    return { group, n: values.length, mean, sd: Math.sqrt(squares / (values.length - 1)) }
  })

const intervalsOf = (groups: SummaryGroup[], procedure: 'tukey' | 'lsd', confidence?: number) =>
  summarize(groups, {
    procedures: [procedure],
    ...(confidence === undefined ? {} : { confidence }),
  }).comparisons.map(({ first, second, adjusted }) => ({
    pair: `${second}-${first}`,
    low: adjusted[0]?.interval?.low ?? NaN,
    high: adjusted[0]?.interval?.high ?? NaN,
  }))

test('NIST/SEMATECH e-Handbook 7.4: F of three and of four groups, and Tukey’s limits', () => {
  // Data, F, p and limits (prc471.htm): second hand, public tests of a numerical library that cite the page; F of
  // four groups from memory, and R 4.2.2 agrees.
  const data = {
    '1': [6.9, 5.4, 5.8, 4.6, 4.0],
    '2': [8.3, 6.8, 7.8, 9.2, 6.5],
    '3': [8.0, 10.5, 8.1, 6.9, 9.3],
    '4': [5.8, 3.8, 6.1, 5.6, 6.2],
  }
  const groups = read(data)
  const three = summarize(groups.slice(0, 3), { procedures: [] }).anova
  expect(three.between.ss).toBeCloseTo(27.897, 3)
  expect(three.within.ss).toBeCloseTo(17.452, 3)
  expect(three.f).toBeCloseTo(9.5911, 4)
  expect(three.p).toBeCloseTo(0.0032482, 7)
  const four = summarize(groups, { procedures: [] }).anova
  expect([four.between.df, four.within.df]).toEqual([3, 16])
  expect(four.f).toBeCloseTo(9.724, 3)
  expect(four.p).toBeCloseTo(0.00068445, 8)

  const printed: Record<string, [number, number]> = {
    '2-1': [0.29, 4.47],
    '3-1': [1.13, 5.31],
    '4-1': [-1.93, 2.25],
    '3-2': [-1.25, 2.93],
    '4-2': [-4.31, -0.13],
    '4-3': [-5.15, -0.97],
  }
  for (const { pair, low, high } of intervalsOf(groups, 'tukey')) {
    expect([Number(low.toFixed(2)), Number(high.toFixed(2))], pair).toEqual(printed[pair])
  }
})

test('hardwood concentration: Tukey’s limits as a statistics program printed them', () => {
  // Output in the supplement (table S13-2) of Montgomery and Runger's textbook: four groups of six, mean square 6.51,
  // F = 19.61 (from the printed mean squares 127.60 / 6.51 = 19.60); limits made with the rounded q = 3.96, hence 0.002.
  // The means 10, 15.667, 17 and 21.167 follow from the centres of the printed limits.
  const sd = Math.sqrt(130.17 / 20)
  const groups = [
    { group: '5', n: 6, mean: 10, sd },
    { group: '10', n: 6, mean: 15.6665, sd },
    { group: '15', n: 6, mean: 17, sd },
    { group: '20', n: 6, mean: 21.1665, sd },
  ]
  const { anova } = summarize(groups, { procedures: [] })
  expect(anova.within.df).toBe(20)
  expect(anova.f).toBeCloseTo(19.6, 1)
  const printed: Record<string, [number, number]> = {
    '10-5': [1.542, 9.791],
    '15-5': [2.876, 11.124],
    '20-5': [7.042, 15.291],
    '15-10': [-2.791, 5.458],
    '20-10': [1.376, 9.624],
    '20-15': [0.042, 8.291],
  }
  for (const { pair, low, high } of intervalsOf(groups, 'tukey')) {
    expect(Math.abs(low - (printed[pair]?.[0] ?? NaN)), pair).toBeLessThan(0.003)
    expect(Math.abs(high - (printed[pair]?.[1] ?? NaN)), pair).toBeLessThan(0.003)
  }
})

test('Student’s sleep data, as two groups', () => {
  // R 4.2.2, t.test(extra ~ group, sleep): t = −1.8608 on 17.776 df, p = 0.07939, limits −3.365483 and 0.205483;
  // with equal variances 18 df, p = 0.07919, limits −3.363874 and 0.203874. Data: Student (1908), Biometrika 6, 1–25.
  const groups = read({
    drug2: [1.9, 0.8, 1.1, 0.1, -0.1, 4.4, 5.5, 1.6, 4.6, 3.4],
    drug1: [0.7, -1.6, -0.2, -1.2, -0.1, 3.4, 3.7, 0.8, 0.0, 2.0],
  })
  const [pair] = summarize(groups).comparisons
  expect(pair?.welch?.t).toBeCloseTo(-1.860813, 6)
  expect(pair?.welch?.df).toBeCloseTo(17.776474, 6)
  expect(pair?.welch?.p).toBeCloseTo(0.0793941, 7)
  expect(pair?.pooled.p).toBeCloseTo(0.0791867, 7)
  const limits = (procedure: string) => pair?.adjusted.find((each) => each.procedure === procedure)?.interval
  expect(limits('lsd')?.low).toBeCloseTo(-3.363874, 6)
  expect(limits('lsd')?.high).toBeCloseTo(0.203874, 6)
  // With two groups Games–Howell is Welch's t test, and every other procedure the pooled one.
  expect(limits('games-howell')?.low).toBeCloseTo(-3.365483, 6)
  expect(limits('games-howell')?.high).toBeCloseTo(0.205483, 6)
  for (const { procedure, p } of pair?.adjusted ?? []) {
    expect(p, procedure).toBeCloseTo(
      (procedure === 'games-howell' ? pair?.welch?.p : pair?.pooled.p) ?? NaN,
      9,
    )
  }
})

test('yields of plants under two treatments: F, Tukey and raw p-values as R’s help page has them', () => {
  // R's PlantGrowth (Dobson 1983), from memory and equal in R 4.2.2: F(2, 27) = 4.846, p = 0.01591; Tukey 0.3908711,
  // 0.1979960, 0.0120064; raw 0.19438788, 0.08768168, 0.00445924. Means and sds as R 4.2.2 prints them.
  const groups = [
    { group: 'ctrl', n: 10, mean: 5.032, sd: 0.5830914 },
    { group: 'trt1', n: 10, mean: 4.661, sd: 0.7936757 },
    { group: 'trt2', n: 10, mean: 5.526, sd: 0.4425733 },
  ]
  const { anova, comparisons } = summarize(groups, { procedures: ['tukey'] })
  expect(anova.f).toBeCloseTo(4.846, 3)
  expect(anova.p).toBeCloseTo(0.01591, 5)
  const tukey = [0.3908711, 0.197996, 0.0120064]
  const raw = [0.19438788, 0.08768168, 0.00445924]
  comparisons.forEach(({ adjusted, pooled }, i) => {
    expect(adjusted[0]?.p).toBeCloseTo(tukey[i] ?? NaN, 6)
    expect(pooled.p).toBeCloseTo(raw[i] ?? NaN, 6)
  })
})
