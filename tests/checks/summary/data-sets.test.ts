import { expect, test } from 'vitest'
import { summarize, type Summary, type SummaryGroup, type SummaryProcedure } from '@/lib/checks'
import { differ, readReference } from '../reference'

// R 4.2.2 on its built-in data sets (header of datasets.json): aov, oneway.test, pairwise.t.test, LSD, Bonferroni,
// Šidák, Scheffé and Games–Howell by formula, Tukey and Dunnett by double quadrature. Tolerances from the header:
// statistics 1e-10 relative, p of t and F 1e-9, Tukey and Games–Howell 1e-8, Dunnett 1e-7, limits 1e-7 of the half width.
type Limits = { lwr: number[]; upr: number[] }
type Case = {
  name: string
  levels: string[]
  groups: { n: number[]; mean: number[]; sd: number[] }
  grand: { mean: number }
  anova: Record<
    | 'df_between'
    | 'df_within'
    | 'ss_between'
    | 'ss_within'
    | 'ms_between'
    | 'ms_within'
    | 'F'
    | 'p'
    | 'eta_squared',
    number
  >
  welch_anova: { F: number; df1: number; df2: number; p: number }
  pairs: { second: string[]; first: string[]; difference: number[]; m: number }
  pairwise_t_pooled: {
    se: number[]
    t: number[]
    df: number
    p: number[]
    adjusted: Record<string, number[]>
  }
  pairwise_t_separate: { se: number[]; t: number[]; df: number[]; p: number[] }
  fisher_lsd: Limits & { p: number[] }
  bonferroni_ci: Limits
  sidak_ci: Limits
  tukey: Limits & { p: number[]; R_p_adj: number[] }
  scheffe: Limits & { p: number[] }
  games_howell: Limits & { p: number[] }
  dunnett?: Limits & { control: string; treatment: string[]; difference: number[]; t: number[]; p: number[] }
}
const { cases } = readReference<{ cases: Case[] }>('datasets.json')

const readGroups = ({ levels, groups }: Case): SummaryGroup[] =>
  levels.map((group, i) => ({
    group,
    n: groups.n[i] ?? NaN,
    mean: groups.mean[i] ?? NaN,
    sd: groups.sd[i] ?? NaN,
  }))

const columnOf = (summary: Summary, procedure: SummaryProcedure) =>
  summary.comparisons.map(({ adjusted }) => adjusted.find((each) => each.procedure === procedure))

function compareColumn(
  summary: Summary,
  procedure: SummaryProcedure,
  p: number[],
  limits: Limits | null,
  tolerance: number,
) {
  const column = columnOf(summary, procedure)
  expect(
    differ(
      column.map((each) => each?.p ?? NaN),
      p,
    ),
    procedure,
  ).toBeLessThan(tolerance)
  column.forEach((each, i) => {
    if (limits === null) return expect(each?.interval).toBeNull()
    const [low, high] = [limits.lwr[i] ?? NaN, limits.upr[i] ?? NaN]
    const room = (1e-7 * (high - low)) / 2
    expect(Math.abs((each?.interval?.low ?? NaN) - low), procedure).toBeLessThan(room)
    expect(Math.abs((each?.interval?.high ?? NaN) - high), procedure).toBeLessThan(room)
  })
}

test('there are twelve data sets', () => {
  expect(cases.length).toBe(12)
})

for (const each of cases) {
  test(`${each.name}: analyses of variance follow from sizes, means and standard deviations`, () => {
    const { anova, welch } = summarize(readGroups(each), { procedures: [] })
    const wanted = each.anova
    const found = [
      anova.between.df,
      anova.within.df,
      anova.between.ss,
      anova.within.ss,
      anova.between.ms,
      anova.within.ms,
      anova.f,
      anova.etaSquared,
      anova.mean,
    ]
    const theirs = [
      wanted.df_between,
      wanted.df_within,
      wanted.ss_between,
      wanted.ss_within,
      wanted.ms_between,
      wanted.ms_within,
      wanted.F,
      wanted.eta_squared,
      each.grand.mean,
    ]
    expect(differ(found, theirs)).toBeLessThan(1e-10)
    const { F, df1, df2, p } = each.welch_anova
    expect(differ([welch?.f ?? NaN, welch?.df1 ?? NaN, welch?.df2 ?? NaN], [F, df1, df2])).toBeLessThan(1e-10)
    expect(differ([anova.p, welch?.p ?? NaN], [wanted.p, p])).toBeLessThan(1e-9)
  })

  test(`${each.name}: t tests of every pair follow, pooled and Welch`, () => {
    const { comparisons } = summarize(readGroups(each), { procedures: [] })
    const { pairs, pairwise_t_pooled: pooled, pairwise_t_separate: separate } = each
    expect(comparisons.map(({ first, second }) => [first, second])).toEqual(
      pairs.first.map((first, i) => [first, pairs.second[i]]),
    )
    const take = (pick: (comparison: (typeof comparisons)[number]) => number | undefined) =>
      comparisons.map((comparison) => pick(comparison) ?? NaN)
    expect(
      differ(
        take((c) => c.difference),
        pairs.difference,
        1,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.pooled.se),
        pooled.se,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.pooled.t),
        pooled.t,
        0.1,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.pooled.p),
        pooled.p,
      ),
    ).toBeLessThan(1e-9)
    expect(comparisons.every((c) => c.pooled.df === pooled.df)).toBe(true)
    expect(
      differ(
        take((c) => c.welch?.se),
        separate.se,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.welch?.t),
        separate.t,
        0.1,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.welch?.df),
        separate.df,
      ),
    ).toBeLessThan(1e-10)
    expect(
      differ(
        take((c) => c.welch?.p),
        separate.p,
      ),
    ).toBeLessThan(1e-9)
  })

  test(`${each.name}: adjusted p-values and simultaneous limits of every pair agree`, () => {
    const summary = summarize(readGroups(each))
    const { adjusted } = each.pairwise_t_pooled
    compareColumn(summary, 'lsd', each.fisher_lsd.p, each.fisher_lsd, 1e-9)
    compareColumn(summary, 'bonferroni', adjusted.bonferroni ?? [], each.bonferroni_ci, 1e-9)
    compareColumn(summary, 'sidak', adjusted.sidak ?? [], each.sidak_ci, 1e-9)
    compareColumn(summary, 'holm', adjusted.holm ?? [], null, 1e-9)
    compareColumn(summary, 'tukey', each.tukey.p, each.tukey, 1e-8)
    compareColumn(summary, 'scheffe', each.scheffe.p, each.scheffe, 1e-9)
    compareColumn(summary, 'games-howell', each.games_howell.p, each.games_howell, 1e-8)
    // What TukeyHSD itself prints is within 1e-9 on 10 and more degrees of freedom.
    columnOf(summary, 'tukey').forEach((found, i) =>
      expect(Math.abs((found?.p ?? NaN) - (each.tukey.R_p_adj[i] ?? NaN))).toBeLessThan(1e-8),
    )
    expect(columnOf(summary, 'dunnett').every((column) => column === undefined)).toBe(true)
  })

  const { dunnett } = each
  if (dunnett !== undefined) {
    test(`${each.name}: comparisons with the control agree`, () => {
      const summary = summarize(readGroups(each), { control: dunnett.control, procedures: ['dunnett'] })
      expect(summary.comparisons.map(({ second }) => second)).toEqual(dunnett.treatment)
      expect(
        differ(
          summary.comparisons.map((c) => c.difference),
          dunnett.difference,
          1,
        ),
      ).toBeLessThan(1e-10)
      expect(
        differ(
          summary.comparisons.map((c) => c.pooled.t),
          dunnett.t,
          0.1,
        ),
      ).toBeLessThan(1e-10)
      compareColumn(summary, 'dunnett', dunnett.p, dunnett, 1e-7)
    })
  }
}

test('at least ten of the data sets have a control', () => {
  expect(cases.filter(({ dunnett }) => dunnett !== undefined).length).toBeGreaterThanOrEqual(10)
})

test('standard errors say the same as standard deviations', () => {
  for (const each of cases) {
    const groups = readGroups(each)
    const bySd = summarize(groups, { procedures: ['tukey'] })
    const bySe = summarize(
      groups.map(({ group, n, mean, sd = NaN }) => ({ group, n, mean, se: sd / Math.sqrt(n) })),
      { procedures: ['tukey'] },
    )
    expect(bySe.anova.f).toBeCloseTo(bySd.anova.f, 9)
    expect(bySe.comparisons[0]?.welch?.df).toBeCloseTo(bySd.comparisons[0]?.welch?.df ?? NaN, 9)
  }
})
