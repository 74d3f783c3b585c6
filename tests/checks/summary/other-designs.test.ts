import { expect, test } from 'vitest'
import {
  adjust,
  pTukeyFromT,
  studentizedRangeQuantile,
  summarize,
  tail,
  upperQuantile,
  type Procedure,
} from '@/lib/checks'
import { differ, readReference, toNumber, type Printed } from '../reference'

// R 4.2.2 on its built-in data sets, designs beside one-way ones (header of datasets.json): p of t, F and χ² within 1e-9.
type Terms = { term: string[]; df: number[]; ss: number[]; ms: number[]; F: Printed[]; p: Printed[] }
type Test = Record<'t' | 'df' | 'p' | 'lwr' | 'upr' | 'n1' | 'n2' | 'mean1' | 'mean2' | 'sd1' | 'sd2', number>
type Correlations = {
  r: number[]
  t: number[]
  df: number[]
  p: number[]
  adjusted: Record<string, number[]>
}
const { other } = readReference<{
  other: {
    twoway: Record<string, Terms>
    npk_error_strata: Record<string, Terms>
    tests: Record<string, Test>
    correlations: Record<string, Correlations>
    chisq: Record<string, { X2: number; df: number; p: number }>
    tukey_of_additive_model: { diff: number[]; lwr: number[]; upr: number[]; p_adj: number[] }
  }
}>('datasets.json')

test('two-sample t tests, pooled and Welch, follow from sizes, means and standard deviations', () => {
  const named = Object.entries(other.tests).filter(([name]) => !name.includes('paired'))
  expect(named.length).toBe(4)
  for (const [name, each] of named) {
    // R takes the first less the second.
    const [pair] = summarize(
      [
        { group: 'second', n: each.n2, mean: each.mean2, sd: each.sd2 },
        { group: 'first', n: each.n1, mean: each.mean1, sd: each.sd1 },
      ],
      { procedures: ['lsd', 'games-howell'] },
    ).comparisons
    const pooled = name.includes('student')
    const found = pooled ? pair?.pooled : pair?.welch
    const limits = pair?.adjusted[pooled ? 0 : 1]?.interval
    expect(differ([found?.t ?? NaN, found?.df ?? NaN], [each.t, each.df]), name).toBeLessThan(1e-10)
    expect(differ([found?.p ?? NaN], [each.p]), name).toBeLessThan(1e-9)
    expect(differ([limits?.low ?? NaN, limits?.high ?? NaN], [each.lwr, each.upr]), name).toBeLessThan(1e-7)
  }
})

test('Student’s paired sleep data', () => {
  // t = 4.0621277 on 9 df, p = 0.00283289, 95% limits 0.7001 to 2.4599: R 4.2.2; Student (1908) from memory: 1.58.
  const { t, df, p, mean1, mean2 } = other.tests.sleep_paired ?? {}
  expect((mean2 ?? NaN) - (mean1 ?? NaN)).toBeCloseTo(1.58, 12)
  expect(t).toBeCloseTo(-4.0621277, 7)
  expect(differ([tail('t', t ?? NaN, [df ?? NaN])], [p ?? NaN])).toBeLessThan(1e-9)
})

test('F of designs with several factors and with error strata', () => {
  let compared = 0
  for (const terms of [...Object.values(other.twoway), ...Object.values(other.npk_error_strata)]) {
    const error = terms.df.at(-1) ?? NaN
    terms.F.forEach((printed, i) => {
      if (printed === null) return
      const wanted = toNumber(terms.p[i] ?? null)
      expect(differ([tail('F', toNumber(printed), [terms.df[i] ?? NaN, error])], [wanted])).toBeLessThan(1e-9)
      expect(differ([(terms.ms[i] ?? NaN) / (terms.ms.at(-1) ?? NaN)], [printed])).toBeLessThan(1e-9)
      compared++
    })
  }
  expect(compared).toBeGreaterThanOrEqual(18)
})

test('correlation matrices, raw and adjusted', () => {
  const names: [Procedure, string][] = [
    ['bonferroni', 'bonferroni'],
    ['sidak', 'sidak'],
    ['holm', 'holm'],
    ['holm-sidak', 'holm-sidak'],
    ['hochberg', 'hochberg'],
    ['hommel', 'hommel'],
    ['bh', 'BH'],
    ['by', 'BY'],
  ]
  expect(Object.keys(other.correlations).length).toBe(2)
  for (const { r, t, df, p, adjusted } of Object.values(other.correlations)) {
    const found = r.map((value, i) => tail('r', value, [df[i] ?? NaN]))
    expect(differ(found, p)).toBeLessThan(1e-9)
    expect(
      differ(
        t.map((value, i) => tail('t', value, [df[i] ?? NaN])),
        p,
      ),
    ).toBeLessThan(1e-9)
    for (const [procedure, theirs] of names)
      expect(differ(adjust(procedure, found), adjusted[theirs] ?? []), procedure).toBeLessThan(1e-9)
  }
})

test('χ² of two-way tables', () => {
  expect(Object.keys(other.chisq).length).toBe(2)
  for (const { X2, df, p } of Object.values(other.chisq))
    expect(differ([tail('chi2', X2, [df])], [p])).toBeLessThan(1e-9)
})

test('Tukey in a model with a second factor, on the error degrees of freedom that it leaves', () => {
  // R's help example on warpbreaks: breaks ~ wool + tension, 54 looms, 50 error df, three tensions. R's own ptukey is
  // within 1e-6 here; the standard error comes from R's limits.
  const { diff, lwr, upr, p_adj } = other.tukey_of_additive_model
  const critical = studentizedRangeQuantile(0.05, 3, 50) / Math.SQRT2
  diff.forEach((value, i) => {
    const se = ((upr[i] ?? NaN) - (lwr[i] ?? NaN)) / 2 / critical
    expect(pTukeyFromT(value / se, 3, 50)).toBeCloseTo(p_adj[i] ?? NaN, 6)
  })
})

test('critical values of F and t that were seen in print', () => {
  // University of Queensland, Portable Introduction to Data Analysis, chapter 20: F = 13.63 on 5 and 30 df, p < .001,
  // critical value at .001 5.53; R 4.2.2: p = 5.64e-7, critical value 5.5339.
  expect(tail('F', 13.63, [5, 30])).toBeCloseTo(5.64e-7, 9)
  expect(upperQuantile('F', 0.001, [5, 30])).toBeCloseTo(5.5339, 4)
  // A statistics program’s output beside the textbook of Montgomery and Runger: four groups, 20 df, individual error rate 0.0111.
  expect(tail('t', studentizedRangeQuantile(0.05, 4, 20) / Math.SQRT2, [20])).toBeCloseTo(0.01108, 5)
})
