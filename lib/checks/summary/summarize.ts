import type { Interval } from '../numbers/printed-interval'
import { boundOmnibus, type OmnibusBounds } from './bound-omnibus'
import { boundComparisons, type ComparisonBounds } from './bound-comparisons'
import { getMoments, type GroupMoments, type SummaryGroup } from './groups'
import { computeAnova, computeWelchAnova, type Anova, type WelchAnova } from './omnibus'
import { listPairs, testPooled, testWelch, type Pair, type TTest } from './pairs'
import { getBox } from './rounding-box'
import {
  adjustTests,
  getCriticalT,
  isFor,
  SUMMARY_PROCEDURES,
  type Setting,
  type SummaryProcedure,
} from './simultaneous'

/**
 * `control`: name of the group that all others are compared with; without it all pairs are compared. `alpha` in
 * (0, 1), default 0.05: the level that p-values are held against. `confidence` in (0, 1), default 1 − alpha: joint
 * confidence of the intervals. `procedures`: those wanted, default all that fit; fewer are faster.
 */
export type SummaryOptions = {
  control?: string
  alpha?: number
  confidence?: number
  procedures?: readonly SummaryProcedure[]
}

/** `interval`: simultaneous confidence limits of the difference, null for Holm. `p` is null, with `interval`, where Welch's test is. */
export type AdjustedComparison = {
  procedure: SummaryProcedure
  p: number | null
  significant: boolean | null
  interval: Interval | null
}

/** `difference`: the second's mean less the first's. `bounds`: over the rounding of the print, null without decimals. */
export type SummaryComparison = {
  first: string
  second: string
  difference: number
  pooled: TTest
  welch: TTest | null
  adjusted: AdjustedComparison[]
  bounds: ComparisonBounds | null
}

/** `welch` is null where a standard deviation is 0; `bounds` is null where no number carries its decimals. */
export type Summary = {
  groups: GroupMoments[]
  control: string | null
  alpha: number
  confidence: number
  anova: Anova
  welch: WelchAnova | null
  bounds: OmnibusBounds | null
  comparisons: SummaryComparison[]
}

/**
 * Everything that follows from the printed sizes, means and standard deviations (or errors) of two or more groups:
 * the analysis of variance, Welch's, and all pairwise comparisons (or those with a control) with their raw and adjusted
 * p-values and simultaneous confidence limits. Where numbers carry their decimals, also what each statistic and
 * p-value can be within their rounding.
 * Assumes independent groups of normal observations; one variance except for Welch's tests and Games–Howell.
 * Relative accuracy 1e-10 for statistics, 1e-9 for p-values, 1e-8 for Tukey, Games–Howell and Dunnett.
 * Throws RangeError as `getMoments` does, for an unknown control, and for alpha or confidence outside (0, 1).
 */
export function summarize(groups: readonly SummaryGroup[], options: SummaryOptions = {}): Summary {
  const { alpha = 0.05, confidence = 1 - alpha, control = null } = options
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  if (!(confidence > 0 && confidence < 1)) {
    throw new RangeError(`the confidence lies between 0 and 1, not at ${confidence}`)
  }
  const moments = getMoments(groups)
  const pairs = listPairs(moments, control)
  const anova = computeAnova(moments)
  const setting = { groups: moments.length, df: anova.within.df, m: pairs.length, sizes: listSizes(pairs) }
  const wanted = SUMMARY_PROCEDURES.filter(
    (each) => isFor(each, control !== null) && (options.procedures ?? SUMMARY_PROCEDURES).includes(each),
  )

  const tests = pairs.map((pair) => ({
    pair,
    pooled: testPooled(pair, anova.within.ms, anova.within.df),
    welch: testWelch(pair),
  }))
  const columns = wanted.map((procedure) => adjustBy(procedure, tests, confidence, alpha, setting))
  const box = getBox(groups)
  const bounds = box && boundComparisons(box, pairs, wanted, setting)
  return {
    groups: moments,
    control,
    alpha,
    confidence,
    anova,
    welch: computeWelchAnova(moments),
    bounds: box && boundOmnibus(box),
    comparisons: tests.map(({ pair, pooled, welch }, i) => ({
      first: pair.first.group,
      second: pair.second.group,
      difference: pair.second.mean - pair.first.mean,
      pooled,
      welch,
      adjusted: columns.flatMap((column) => column[i] ?? []),
      bounds: bounds?.[i] ?? null,
    })),
  }
}

/** The first group's size before those of the others: the order that Dunnett takes where it is the control. */
const listSizes = (pairs: readonly Pair[]) =>
  pairs.flatMap(({ first, second }, i) => (i === 0 ? [first.n, second.n] : [second.n]))

type Tested = { pair: Pair; pooled: TTest; welch: TTest | null }

function adjustBy(
  procedure: SummaryProcedure,
  tests: readonly Tested[],
  confidence: number,
  alpha: number,
  setting: Setting,
): AdjustedComparison[] {
  const byWelch = procedure === 'games-howell'
  const used = tests.map(({ pooled, welch }) => (byWelch ? welch : pooled))
  const shared = byWelch ? null : getCriticalT(procedure, confidence, setting.df, setting)
  return adjustTests(procedure, used, setting).map((p, i) => {
    const [test, each] = [used[i], tests[i]]
    if (p === null || !test || !each) return { procedure, p: null, significant: null, interval: null }
    const critical = byWelch ? getCriticalT(procedure, confidence, test.df, setting) : shared
    const interval = critical === null ? null : getLimits(each.pair, critical * test.se)
    return { procedure, p, significant: p <= alpha, interval }
  })
}

function getLimits({ first, second }: Pair, half: number): Interval {
  const difference = second.mean - first.mean
  return { low: difference - half, high: difference + half }
}
