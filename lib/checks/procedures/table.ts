import type { Procedure } from '../vocabulary'
import { bh } from './bh'
import { bky } from './bky'
import { bonferroni } from './bonferroni'
import { by } from './by'
import { hochberg } from './hochberg'
import { holm } from './holm'
import { holmSidak } from './holm-sidak'
import { hommel } from './hommel'
import { sidak } from './sidak'
import type { AdjustSorted } from './sorted-family'
import { storey } from './storey'

/**
 * `label`: the trade's name. `controls`: the error rate that is controlled, 'none' where none is. `upToGroups`: the
 * largest number of groups for which it is controlled, null for any number. `assumption`: what it needs.
 * `source`: author, year. `adjust`: the function of the p-values alone; null where more than them is needed, which
 * `needs` then names.
 */
export type ProcedureRow = {
  label: string
  controls: 'fwer' | 'fdr' | 'none'
  upToGroups: number | null
  assumption: string
  source: string
  needs: string
  adjust: AdjustSorted | null
}

const row = (
  label: string,
  controls: ProcedureRow['controls'],
  assumption: string,
  source: string,
  adjust: AdjustSorted,
): ProcedureRow => ({ label, controls, upToGroups: null, assumption, source, needs: 'the p-values', adjust })

const rowOfStatistics = (
  label: string,
  controls: ProcedureRow['controls'],
  assumption: string,
  source: string,
  needs: string,
  upToGroups: number | null = null,
): ProcedureRow => ({ label, controls, upToGroups, assumption, source, needs, adjust: null })

/** What is known of each procedure: the one place for labels, error rates, assumptions and sources. */
export const procedureTable: Record<Procedure, ProcedureRow> = {
  bonferroni: row('Bonferroni', 'fwer', 'none', 'Dunn 1961', bonferroni),
  sidak: row('Šidák', 'fwer', 'independent or positively orthant dependent tests', 'Šidák 1967', sidak),
  holm: row('Holm', 'fwer', 'none', 'Holm 1979', holm),
  'holm-sidak': row(
    'Holm–Šidák',
    'fwer',
    'independent or positively orthant dependent tests',
    'Holland and Copenhaver 1987',
    holmSidak,
  ),
  hochberg: row('Hochberg', 'fwer', 'independence or positive dependence (Simes)', 'Hochberg 1988', hochberg),
  hommel: row('Hommel', 'fwer', 'independence or positive dependence (Simes)', 'Hommel 1988', hommel),
  bh: row(
    'Benjamini–Hochberg',
    'fdr',
    'independence or positive regression dependence',
    'Benjamini and Hochberg 1995',
    bh,
  ),
  by: row('Benjamini–Yekutieli', 'fdr', 'none', 'Benjamini and Yekutieli 2001', by),
  bky: row(
    'two-stage Benjamini–Krieger–Yekutieli',
    'fdr',
    'independent tests',
    'Benjamini, Krieger and Yekutieli 2006, definition 6',
    bky,
  ),
  storey: row('Storey q-value', 'fdr', 'independent or weakly dependent tests', 'Storey 2002', storey),
  tukey: rowOfStatistics(
    'Tukey',
    'fwer',
    'all pairs; normal, equal variances, independent groups',
    'Tukey 1953; Kramer 1956',
    't statistics with the pooled variance, its df and the number of groups',
  ),
  'games-howell': rowOfStatistics(
    'Games–Howell',
    'fwer',
    'all pairs; normal, variances may differ; approximate',
    'Games and Howell 1976',
    'Welch t statistics, their df and the number of groups',
  ),
  dunnett: rowOfStatistics(
    'Dunnett',
    'fwer',
    'comparisons with one control; normal, equal variances',
    'Dunnett 1955',
    't statistics with the pooled variance, its df and the group sizes',
  ),
  scheffe: rowOfStatistics(
    'Scheffé',
    'fwer',
    'any contrasts; normal, equal variances',
    'Scheffé 1953',
    't statistics with the pooled variance, its df and the number of groups',
  ),
  dunn: rowOfStatistics(
    'Dunn',
    'fwer',
    'rank sums after Kruskal–Wallis; the adjustment is the one stated with it',
    'Dunn 1964',
    'the adjustment that is stated with it',
  ),
  lsd: rowOfStatistics(
    'least significant difference',
    'none',
    'a significant omnibus test; holds the family-wise rate for three groups only',
    'Fisher 1935; Hayter 1986',
    'the omnibus test and the number of groups',
    3,
  ),
  duncan: rowOfStatistics(
    'Duncan',
    'none',
    'equal variances; the level grows with the span of means',
    'Duncan 1955',
    'the ordered means, the pooled variance and its df',
    2,
  ),
  snk: rowOfStatistics(
    'Student–Newman–Keuls',
    'none',
    'equal variances; holds the family-wise rate for three groups only',
    'Newman 1939; Keuls 1952',
    'the ordered means, the pooled variance and its df',
    3,
  ),
  permutation: rowOfStatistics(
    'permutation',
    'fwer',
    'exchangeable under the null hypothesis; subset pivotality',
    'Westfall and Young 1993',
    'the data',
  ),
  'single-step': rowOfStatistics(
    'single-step by the joint distribution',
    'fwer',
    'known or estimated correlations of the statistics',
    'Hothorn, Bretz and Westfall 2008',
    'the statistics and their correlations',
  ),
}
