import type { Procedure } from '../vocabulary'
import { invert } from './adjusted'
import type { Comparison, Evidence, Witness } from './comparison'
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
  const witnesses = listWitnesses(comparison, series)
  const rangesOf = (is: Witness['is']) => witnesses.filter((each) => each.is === is).map(({ range }) => range)
  const known = combine(rangesOf('raw'))
  const printed = combine(rangesOf('adjusted'))?.range ?? null
  if (known && printed && isOutOfReach(printed, known.range, used.m)) {
    const raw = clip(join(known.range, invert(used.procedure, printed, used.m)))
    return { raw, direct: true, conflict: true, adjusted: printed, witnesses }
  }
  if (known) {
    return { raw: clip(known.range), direct: true, conflict: known.conflict, adjusted: printed, witnesses }
  }
  if (printed) {
    const raw = invert(used.procedure, printed, used.m)
    return { raw, direct: false, conflict: false, adjusted: printed, witnesses }
  }
  const either = combine(rangesOf('open'))
  return {
    raw: either?.range ?? null,
    direct: either !== null,
    conflict: either?.conflict ?? false,
    adjusted: null,
    witnesses,
  }
}

export function isOneSided({ items }: Comparison): boolean {
  return items.some(({ report }) => report.oneSided)
}

/** Statistics first, then printed p-values; of a test stated as one-sided half of the statistic's two-sided p. */
function listWitnesses(comparison: Comparison, series: readonly Series[]): Witness[] {
  const oneSided = isOneSided(comparison)
  const byStatistic = statisticsOf(comparison).flatMap((statistic): Witness[] => {
    const range = rangeOfP(statistic)
    if (!range) return []
    const own = oneSided ? { low: range.low / 2, high: range.high / 2 } : range
    return [{ id: statistic.id, range: own, is: 'raw' }]
  })
  const byPrint = comparison.items.flatMap(({ report }): Witness[] => {
    const found = series.find(
      ({ source, presented }) => source === report.place.source && presented === report.scale,
    )
    if (found?.is === 'one-sided' || report.markOnly) return []
    const isRaw = found?.is === 'raw' || (report.scale === 'raw' && found?.is !== 'adjusted')
    const isAdjusted = found?.is === 'adjusted' || report.scale === 'adjusted'
    const is = isRaw ? 'raw' : isAdjusted ? 'adjusted' : 'open'
    return [{ id: report.id, range: rangeOfReport(report), is }]
  })
  return [...byStatistic, ...byPrint]
}

/** No common procedure multiplies a p by more than m times the harmonic sum (Benjamini and Yekutieli 2001). */
function isOutOfReach(adjusted: Interval, raw: Interval, m: number): boolean {
  const most = m * (1 + Math.log(Math.max(1, m)))
  return adjusted.low > Math.min(1, raw.high * most * 1.05)
}
