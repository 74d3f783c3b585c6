import type { Procedure } from '../vocabulary'
import { invert } from './adjusted'
import type { Comparison, Evidence, Item } from './comparison'
import { rangeOfP, rangeOfReport, statisticsOf, type Series } from './evidence'
import { clip, combine, join, type Interval } from './interval'

/**
 * What is known of a comparison's raw p: from its statistics, and from every printed p that is raw. Where there is
 * none of these, what its adjusted p leaves possible. `used`: the procedure and m by which the manuscript adjusted.
 */
export function weighEvidence(
  comparison: Comparison,
  series: readonly Series[],
  used: { procedure: Procedure | null; m: number },
): Evidence {
  const isOf = (item: Item) =>
    series.find(
      ({ source, presented }) => source === item.report.place.source && presented === item.report.scale,
    )
  const adjusted: Interval[] = []
  const open: Interval[] = []
  const raw: Interval[] = statisticsOf(comparison).flatMap((statistic) => rangeOfP(statistic) ?? [])
  const sides = comparison.items.some(({ report }) => report.oneSided) ? 1 : 2
  if (sides === 1) raw.forEach((range, i) => (raw[i] = { low: range.low / 2, high: range.high / 2 }))
  for (const item of comparison.items) {
    const is = isOf(item)
    const range = rangeOfReport(item.report)
    if (is?.is === 'one-sided' || item.report.markOnly) continue
    const isRaw = is?.is === 'raw' || (item.report.scale === 'raw' && is?.is !== 'adjusted')
    const isAdjusted = is?.is === 'adjusted' || item.report.scale === 'adjusted'
    if (isRaw) raw.push(range)
    else if (isAdjusted) adjusted.push(range)
    else open.push(range)
  }
  const known = combine(raw)
  const printed = combine(adjusted)?.range ?? null
  if (known && printed && isOutOfReach(printed, known.range, used.m)) {
    const range = clip(join(known.range, invert(used.procedure, printed, used.m)))
    return { raw: range, direct: true, conflict: true, adjusted: printed }
  }
  if (known) return { raw: clip(known.range), direct: true, conflict: known.conflict, adjusted: printed }
  if (printed) {
    const range = invert(used.procedure, printed, used.m)
    return { raw: range, direct: false, conflict: false, adjusted: printed }
  }
  const either = combine(open)
  return {
    raw: either?.range ?? null,
    direct: either !== null,
    conflict: either?.conflict ?? false,
    adjusted: null,
  }
}

/** No common procedure multiplies a p by more than m times the harmonic sum (Benjamini and Yekutieli 2001). */
function isOutOfReach(adjusted: Interval, raw: Interval, m: number): boolean {
  const most = m * (1 + Math.log(Math.max(1, m)))
  return adjusted.low > Math.min(1, raw.high * most * 1.05)
}
