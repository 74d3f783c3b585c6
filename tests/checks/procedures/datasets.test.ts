import { expect, test } from 'vitest'
import {
  adjust,
  compareByDunn,
  compareDataByDunn,
  dunnettQuantile,
  listPairs,
  pDunnettFromT,
  pGamesHowellFromWelch,
  pLsd,
  pTukeyFromT,
  studentizedRangeQuantile,
  upperQuantile,
  type CatalogueProcedure,
} from '@/lib/checks'
import { differ, readReference } from '../reference'

// R 4.2.2 on its built-in data sets (header of datasets.json): t, F and normal p-values to 1e-9 relative, limits to
// 1e-7 of their half width, values printed by TukeyHSD itself to 1e-9 absolute, multcomp's to 5 of its error estimates.
type Limits = { lwr: number[]; upr: number[] }
type Case = {
  name: string
  response: number[]
  factor: string[]
  levels: string[]
  groups: { n: number[]; mean: number[]; sd: number[] }
  grand: { N: number; k: number }
  anova: { p: number; ms_within: number; df_within: number }
  pairs: { first: string[]; second: string[]; difference: number[]; m: number }
  pairwise_t_pooled: { se: number[]; t: number[]; df: number; p: number[] }
  pairwise_t_separate: {
    t: number[]
    df: number[]
    se: number[]
    p: number[]
    adjusted: Record<string, number[]>
  }
  fisher_lsd: Limits & { t_crit: number; lsd: number[]; p: number[]; protected_by_F: boolean }
  bonferroni_ci: Limits & { t_crit: number }
  sidak_ci: Limits & { t_crit: number }
  tukey: Limits & { R_p_adj: number[]; R_lwr: number[]; R_upr: number[] }
  scheffe: Limits & { S_crit: number }
  games_howell: Limits & { df: number[]; R_ptukey: number[] }
  pairwise_wilcox: { p: number[]; adjusted: Record<string, number[]> }
  dunn: { mean_rank: number[]; z: number[]; p: number[]; adjusted: Record<string, number[]> }
  dunnett?: Limits & {
    difference: number[]
    lambda: number[]
    t: number[]
    multcomp_p: number[]
    multcomp_error_estimate: number
  }
}
const { cases } = readReference<{ cases: Case[] }>('datasets.json')

const NAMES = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  BH: 'bh',
  BY: 'by',
  sidak: 'sidak',
  'holm-sidak': 'holm-sidak',
} as const satisfies Record<string, CatalogueProcedure>

const split = ({ levels, factor, response }: Case) =>
  levels.map((level) => response.filter((_, i) => factor[i] === level))

/** Largest distance from limits around the differences, as a share of the half width. */
function missOf(difference: readonly number[], halves: readonly number[], { lwr, upr }: Limits): number {
  return Math.max(
    ...difference.flatMap((value, i) => {
      const half = halves[i] ?? NaN
      return [
        Math.abs(value - half - (lwr[i] ?? NaN)) / half,
        Math.abs(value + half - (upr[i] ?? NaN)) / half,
      ]
    }),
  )
}

test('pairs stand in R’s order', () => {
  for (const { name, levels, pairs } of cases) {
    const found = listPairs(levels.length).map(([a, b]) => [levels[a], levels[b]])
    expect(found, name).toEqual(pairs.first.map((first, i) => [first, pairs.second[i]]))
  }
})

test('Dunn’s z and p of every data set agree with R, from the data and from sizes and mean ranks', () => {
  expect(cases.length).toBe(12)
  for (const item of cases) {
    const fromData = compareDataByDunn(split(item))
    const z = fromData.map(({ statistic }) => -statistic)
    expect(differ(z, item.dunn.z, 1e-6), item.name).toBeLessThan(1e-10)
    const p = fromData.map((pair) => pair.p)
    expect(differ(p, item.dunn.p), item.name).toBeLessThan(1e-9)
    for (const [theirs, procedure] of Object.entries(NAMES)) {
      const wanted = item.dunn.adjusted[theirs] ?? []
      expect(differ(adjust(procedure, p), wanted), `${item.name}, ${procedure}`).toBeLessThan(1e-9)
    }
    const ties = countTies(item.response)
    const fromRanks = compareByDunn(item.groups.n, item.dunn.mean_rank, ties)
    expect(
      differ(
        fromRanks.map((pair) => pair.p),
        item.dunn.p,
      ),
      item.name,
    ).toBeLessThan(1e-9)
  }
})

function countTies(values: readonly number[]): number {
  const counts = new Map<number, number>()
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1)
  return [...counts.values()].reduce((sum, t) => sum + t ** 3 - t, 0)
}

test('Welch and Wilcoxon tests of all pairs are adjusted as R adjusts them', () => {
  for (const { name, pairwise_t_separate, pairwise_wilcox } of cases) {
    for (const { p, adjusted } of [pairwise_t_separate, pairwise_wilcox]) {
      for (const [theirs, procedure] of Object.entries(NAMES)) {
        expect(differ(adjust(procedure, p), adjusted[theirs] ?? []), `${name}, ${procedure}`).toBeLessThan(
          1e-12,
        )
      }
    }
  }
})

test('the protected least significant difference calls what the raw p calls where F is significant, else nothing', () => {
  for (const { name, anova, fisher_lsd, pairs, pairwise_t_pooled } of cases) {
    const critical = upperQuantile('t', 0.05, [anova.df_within])
    expect(critical).toBeCloseTo(fisher_lsd.t_crit, 9)
    const halves = pairwise_t_pooled.se.map((se) => critical * se)
    expect(differ(halves, fisher_lsd.lsd), name).toBeLessThan(1e-9)
    expect(missOf(pairs.difference, halves, fisher_lsd), name).toBeLessThan(1e-7)
    fisher_lsd.p.forEach((p, i) => {
      const differs = Math.abs(pairs.difference[i] ?? NaN) > (fisher_lsd.lsd[i] ?? NaN)
      expect(pLsd(p, anova.p) <= 0.05, name).toBe(fisher_lsd.protected_by_F && differs)
    })
  }
})

test('simultaneous limits of Tukey, Scheffé, Bonferroni, Šidák, Games–Howell and Dunnett are R’s', () => {
  for (const item of cases) {
    const { name, grand, anova, pairs, pairwise_t_pooled, pairwise_t_separate } = item
    const { k } = grand
    const df = anova.df_within
    const times = (factor: number) => pairwise_t_pooled.se.map((se) => factor * se)
    const miss = (factor: number, limits: Limits) => missOf(pairs.difference, times(factor), limits)
    const q = studentizedRangeQuantile(0.05, k, df) / Math.SQRT2
    expect(miss(q, item.tukey), name).toBeLessThan(1e-7)
    const printed = { lwr: item.tukey.R_lwr, upr: item.tukey.R_upr }
    expect(miss(q, printed), `${name}, as TukeyHSD prints`).toBeLessThan(1e-3)
    const scheffe = Math.sqrt((k - 1) * upperQuantile('F', 0.05, [k - 1, df]))
    expect(scheffe).toBeCloseTo(item.scheffe.S_crit, 9)
    expect(miss(scheffe, item.scheffe), name).toBeLessThan(1e-7)
    const bonferroni = upperQuantile('t', 0.05 / pairs.m, [df])
    expect(bonferroni).toBeCloseTo(item.bonferroni_ci.t_crit, 9)
    expect(miss(bonferroni, item.bonferroni_ci), name).toBeLessThan(1e-7)
    const sidak = upperQuantile('t', -Math.expm1(Math.log1p(-0.05) / pairs.m), [df])
    expect(sidak).toBeCloseTo(item.sidak_ci.t_crit, 9)
    expect(miss(sidak, item.sidak_ci), name).toBeLessThan(1e-7)

    const welch = item.games_howell.df.map(
      (own, i) => (studentizedRangeQuantile(0.05, k, own) / Math.SQRT2) * (pairwise_t_separate.se[i] ?? NaN),
    )
    expect(missOf(pairs.difference, welch, item.games_howell), name).toBeLessThan(1e-7)
    if (item.dunnett === undefined) continue
    const { lambda, difference } = item.dunnett
    const critical = dunnettQuantile(0.05, lambda, df)
    // the first k − 1 pairs are those with the control
    expect(missOf(difference, times(critical).slice(0, k - 1), item.dunnett), name).toBeLessThan(1e-7)
  }
})

test('ours lie as near to what TukeyHSD, ptukey and multcomp print themselves as their own accuracy', () => {
  const largestMiss = (found: readonly number[], wanted: readonly number[]) =>
    Math.max(...found.map((p, i) => Math.abs(p - (wanted[i] ?? NaN))))
  for (const { name, grand, pairwise_t_pooled, pairwise_t_separate, ...item } of cases) {
    const { t, df } = pairwise_t_pooled
    const tukey = t.map((value) => pTukeyFromT(value, grand.k, df))
    expect(largestMiss(tukey, item.tukey.R_p_adj), name).toBeLessThan(1e-9)
    const welch = pairwise_t_separate.t.map((value, i) =>
      pGamesHowellFromWelch(value, grand.k, pairwise_t_separate.df[i] ?? NaN),
    )
    expect(largestMiss(welch, item.games_howell.R_ptukey), name).toBeLessThan(1e-8)
    if (item.dunnett === undefined) continue
    const { lambda, multcomp_p, multcomp_error_estimate } = item.dunnett
    const dunnett = item.dunnett.t.map((value) => pDunnettFromT(value, lambda, df))
    const room = Math.max(5 * multcomp_error_estimate, 1e-12)
    expect(largestMiss(dunnett, multcomp_p), name).toBeLessThan(room)
  }
})
