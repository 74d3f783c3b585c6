import type { Procedure } from '../vocabulary'
import { adjustRanges, adjustStatistics, isSingleStep, worksOnP, worksOnT } from './adjusted'
import type { Comparison, Evidence } from './comparison'
import { statisticsOf } from './evidence'
import { clip, intersect, join, type Interval } from './interval'

/** 'raw': no correction is called for; 'any': a correction is claimed without a name, so that several are possible. */
export type Yardstick = {
  procedure: Procedure | 'raw' | 'any'
  m: number
  groups: number
  alpha: number
}

/**
 * The adjusted p of every comparison by the yardstick. `trusted`: the printed adjusted values are those of the
 * yardstick, so that their digits count as evidence too. Where the procedure needs what is not printed, the printed
 * adjusted values are taken as they are; with none of these, anything between raw p and 1 is possible.
 */
export function adjustFamily(
  comparisons: readonly Comparison[],
  evidence: readonly Evidence[],
  { procedure, m, groups, alpha }: Yardstick,
  trusted: boolean,
): Interval[] {
  const raw = evidence.map((each) => each.raw)
  const computed = comparisons.map((comparison, i) => {
    if (procedure === 'raw') return clip(raw[i] ?? { low: 0, high: 1 })
    if (procedure !== 'any' && worksOnT(procedure))
      return adjustStatistics(procedure, statisticsOf(comparison), groups)
    return null
  })
  const onP = adjustOnP(procedure, raw, m, alpha)
  return comparisons.map((_, i) => {
    const printed = evidence[i]?.adjusted ?? null
    // a step-wise procedure is not undone from its adjusted values: these are taken as they are
    if (printed && (procedure === 'any' || (!evidence[i]?.direct && !isExactlyUndone(procedure))))
      return printed
    const due = computed[i] ?? onP?.[i] ?? null
    if (!due) return printed ?? { low: raw[i]?.low ?? 0, high: 1 }
    return ((trusted || m > comparisons.length) && printed && intersect(due, printed)) || due
  })
}

function isExactlyUndone(procedure: Yardstick['procedure']): boolean {
  return procedure === 'raw' || (procedure !== 'any' && isSingleStep(procedure))
}

/** For a correction without a name the range runs from the most lenient common procedure to the strictest. */
function adjustOnP(
  procedure: Yardstick['procedure'],
  raw: readonly (Interval | null)[],
  m: number,
  alpha: number,
): Interval[] | null {
  if (procedure === 'raw') return null
  if (procedure !== 'any') return worksOnP(procedure) ? adjustRanges(procedure, raw, m, alpha) : null
  const strict = adjustRanges('bonferroni', raw, m, alpha)
  return adjustRanges('bh', raw, m, alpha).map((range, i) => join(range, strict[i] ?? range))
}

/** Whether an adjusted p decides at the level: true and false for certain, null where its range holds the level. */
export function isSignificant({ low, high }: Interval, alpha: number): boolean | null {
  if (high <= alpha * (1 + 1e-12)) return true
  return low >= alpha ? false : null
}
