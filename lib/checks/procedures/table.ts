import type { CatalogueProcedure } from '../vocabulary'
import { bh } from './bh'
import { bky, firstStageLevel } from './bky'
import { bkyUnscaled } from './bky-unscaled'
import { bonferroni } from './bonferroni'
import { by } from './by'
import { fallback } from './fallback'
import { fixedSequence } from './fixed-sequence'
import { graphical } from './graphical'
import { hochberg } from './hochberg'
import { holm } from './holm'
import { holmSidak } from './holm-sidak'
import { hommel } from './hommel'
import type { AdjustInOrder } from './in-order'
import { shaffer } from './shaffer'
import { sidak } from './sidak'
import { adjustAll, type AdjustEach, type AdjustSorted } from './sorted-family'
import { storey } from './storey'
import { tsbh } from './tsbh'
import { weightedBonferroni } from './weighted-bonferroni'
import { weightedHolm } from './weighted-holm'

/**
 * `label`: the trade's name. `controls`: the error rate that is controlled, 'none' where none is. `upToGroups`: the
 * largest number of groups for which it is controlled, null for any number. `assumption`: what it needs.
 * `source`: author, year. `needs`: what it is computed from. `adjust`: the function of the p-values alone, null where
 * more than their set is needed; `adjustEach`: the same for one of them, where the others do not matter. `adjustInOrder`: the
 * function of the p-values in input order with the options that `takes` names, null where there is none. `firstStage`:
 * of two-stage procedures, the level of the first stage at a given alpha. `heldAgainst`: the level that adjusted values
 * are held against at a given alpha.
 */
export type ProcedureRow = {
  label: string
  controls: 'fwer' | 'fdr' | 'none'
  upToGroups: number | null
  assumption: string
  source: string
  needs: string
  adjust: AdjustSorted | null
  adjustEach: AdjustEach | null
  adjustInOrder: AdjustInOrder | null
  takes: readonly ('weights' | 'transitions' | 'groups')[]
  firstStage: ((alpha: number) => number) | null
  heldAgainst: (alpha: number) => number
}

type About = Pick<ProcedureRow, 'label' | 'controls' | 'assumption' | 'source'>
type Way = Partial<ProcedureRow> & Pick<ProcedureRow, 'needs'>

const NO_WAY = {
  upToGroups: null,
  adjust: null,
  adjustEach: null,
  adjustInOrder: null,
  takes: [],
  firstStage: null,
  heldAgainst: (alpha: number) => alpha,
} as const

const createRow = (about: About, way: Way): ProcedureRow => ({ ...NO_WAY, ...about, ...way })

const row = (
  label: string,
  controls: ProcedureRow['controls'],
  assumption: string,
  source: string,
  adjust: AdjustSorted,
  more: Partial<ProcedureRow> = {},
) => createRow({ label, controls, assumption, source }, { needs: 'the p-values', adjust, ...more })

const rowInOrder = (
  label: string,
  assumption: string,
  source: string,
  needs: string,
  adjustInOrder: AdjustInOrder,
  takes: ProcedureRow['takes'],
) => createRow({ label, controls: 'fwer', assumption, source }, { needs, adjustInOrder, takes })

const rowOfStatistics = (
  label: string,
  controls: ProcedureRow['controls'],
  assumption: string,
  source: string,
  needs: string,
  upToGroups: number | null = null,
) => createRow({ label, controls, assumption, source }, { needs, upToGroups })

/** What is known of each procedure: the one place for labels, error rates, assumptions and sources. */
export const procedureTable: Record<CatalogueProcedure, ProcedureRow> = {
  bonferroni: row('Bonferroni', 'fwer', 'none', 'Dunn 1961', adjustAll(bonferroni), {
    adjustEach: bonferroni,
  }),
  sidak: row(
    'Šidák',
    'fwer',
    'independent or positively orthant dependent tests',
    'Šidák 1967',
    adjustAll(sidak),
    {
      adjustEach: sidak,
    },
  ),
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
    { firstStage: firstStageLevel },
  ),
  'bky-unscaled': row(
    'two-stage Benjamini–Krieger–Yekutieli, held against alpha / (1 + alpha)',
    'fdr',
    'independent tests',
    'Benjamini, Krieger and Yekutieli 2006, definition 6',
    bkyUnscaled,
    { firstStage: firstStageLevel, heldAgainst: firstStageLevel },
  ),
  tsbh: row(
    'two-stage Benjamini–Hochberg, first stage at alpha',
    'fdr',
    'independent tests; approximate',
    'variant of Benjamini, Krieger and Yekutieli 2006',
    tsbh,
    { firstStage: (alpha) => alpha },
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
    'group sizes and mean ranks, or the data, and the adjustment that is stated with it',
  ),
  lsd: rowOfStatistics(
    'least significant difference',
    'none',
    'a significant omnibus test; holds the family-wise rate for three groups only',
    'Fisher 1935; Hayter 1986',
    'the raw p-values, the omnibus test and the number of groups',
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
  'weighted-bonferroni': rowInOrder(
    'weighted Bonferroni',
    'weights fixed beforehand',
    'Rosenthal and Rubin 1983',
    'the p-values and their weights',
    weightedBonferroni,
    ['weights'],
  ),
  'weighted-holm': rowInOrder(
    'weighted Holm',
    'weights fixed beforehand',
    'Holm 1979',
    'the p-values and their weights',
    weightedHolm,
    ['weights'],
  ),
  shaffer: rowInOrder(
    'Shaffer S1',
    'pairwise comparisons of one set of groups',
    'Shaffer 1986',
    'the p-values and the number of groups',
    shaffer,
    ['groups'],
  ),
  'fixed-sequence': rowInOrder(
    'fixed sequence',
    'order fixed beforehand',
    'Maurer, Hothorn and Lehmacher 1995; Westfall and Krishen 2001',
    'the p-values in the order of testing',
    fixedSequence,
    [],
  ),
  fallback: rowInOrder(
    'fallback',
    'order and weights fixed beforehand',
    'Wiens 2003; Wiens and Dmitrienko 2005',
    'the p-values in the order of testing and their weights',
    fallback,
    ['weights'],
  ),
  graphical: rowInOrder(
    'graphical procedure',
    'weights and transitions fixed beforehand',
    'Bretz, Maurer, Brannath and Posch 2009',
    'the p-values, their weights and the transitions between them',
    graphical,
    ['weights', 'transitions'],
  ),
  'fisher-hayter': rowOfStatistics(
    'Fisher–Hayter',
    'fwer',
    'a significant omnibus test; all pairs; normal, equal variances',
    'Hayter 1986',
    't statistics with the pooled variance, its df, the number of groups and the omnibus p-value',
  ),
  'steel-dwass': rowOfStatistics(
    'Steel–Dwass–Critchlow–Fligner',
    'fwer',
    'all pairs; distributions of the same shape; large samples',
    'Steel 1960; Dwass 1960; Critchlow and Fligner 1991',
    'the data of each group',
  ),
}
