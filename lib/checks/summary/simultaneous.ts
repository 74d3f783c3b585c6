import { dunnettQuantile, studentizedRangeQuantile, upperQuantile } from '../distributions/upper-quantile'
import { adjust } from '../procedures/adjust'
import { dunnettLoadings, pDunnettFromT } from '../procedures/dunnett'
import { pGamesHowellFromWelch } from '../procedures/games-howell'
import { pScheffeFromT } from '../procedures/scheffe'
import { pTukeyFromT } from '../procedures/tukey'
import type { Procedure } from '../vocabulary'

/** The procedures that summary statistics suffice for; 'lsd' is without correction. */
export const SUMMARY_PROCEDURES = [
  'lsd',
  'bonferroni',
  'sidak',
  'holm',
  'tukey',
  'games-howell',
  'dunnett',
  'scheffe',
] as const satisfies readonly Procedure[]
export type SummaryProcedure = (typeof SUMMARY_PROCEDURES)[number]

/** Which of them compare all pairs, and which compare with a control. */
export const isFor = (procedure: SummaryProcedure, versusControl: boolean): boolean =>
  versusControl ? procedure !== 'tukey' && procedure !== 'games-howell' : procedure !== 'dunnett'

/** `groups`: number of all groups; `m`: number of comparisons; `sizes`: the group sizes, the control's first. */
export type Setting = { groups: number; df: number; m: number; sizes: readonly number[] }

const getLoadings = ([control = 1, ...treatments]: readonly number[]) => dunnettLoadings(control, treatments)

/** The procedures that look at each comparison's statistic, and not at the raw p-values of the family. */
type StatisticProcedure = 'tukey' | 'games-howell' | 'dunnett' | 'scheffe'

const takesStatistic = (procedure: SummaryProcedure): procedure is StatisticProcedure =>
  procedure === 'tukey' || procedure === 'games-howell' || procedure === 'dunnett' || procedure === 'scheffe'

/**
 * The adjusted p-values of all comparisons: `tests` in the order of the comparisons, with statistic, df and raw
 * p-value (Welch's for 'games-howell', null where there is none, as is the answer then).
 */
export function adjustTests(
  procedure: SummaryProcedure,
  tests: readonly ({ t: number; df: number; p: number } | null)[],
  setting: Setting,
): (number | null)[] {
  if (takesStatistic(procedure)) {
    return tests.map((test) => test && getPFromT(procedure, test.t, test.df, setting))
  }
  const raw = tests.map((test) => test?.p ?? NaN)
  return procedure === 'lsd' ? raw : adjust(procedure, raw)
}

/**
 * The adjusted p-value of a comparison with the statistic `t` on `df` degrees of freedom, of a procedure that takes
 * each comparison by itself: one value suffices. For 'games-howell' t and df are Welch's.
 */
function getPFromT(procedure: StatisticProcedure, t: number, df: number, { groups, sizes }: Setting): number {
  switch (procedure) {
    case 'tukey':
      return pTukeyFromT(t, groups, df)
    case 'games-howell':
      return pGamesHowellFromWelch(t, groups, df)
    case 'dunnett':
      return pDunnettFromT(t, getLoadings(sizes), df)
    case 'scheffe':
      return pScheffeFromT(t, groups, df)
  }
}

/**
 * The number of standard errors to either side of a difference that makes simultaneous confidence intervals of
 * joint `confidence` in (0, 1); null for Holm, which has none. For 'games-howell' by the comparison's own Welch `df`.
 */
export function getCriticalT(
  procedure: SummaryProcedure,
  confidence: number,
  df: number,
  { groups, m, sizes }: Setting,
): number | null {
  const level = 1 - confidence
  switch (procedure) {
    case 'lsd':
      return upperQuantile('t', level, [df])
    case 'bonferroni':
      return upperQuantile('t', level / m, [df])
    case 'sidak':
      return upperQuantile('t', -Math.expm1(Math.log(confidence) / m), [df])
    case 'holm':
      return null
    case 'tukey':
    case 'games-howell':
      return studentizedRangeQuantile(level, groups, df) / Math.SQRT2
    case 'dunnett':
      return dunnettQuantile(level, getLoadings(sizes), df)
    case 'scheffe':
      return Math.sqrt((groups - 1) * upperQuantile('F', level, [groups - 1, df]))
  }
}
