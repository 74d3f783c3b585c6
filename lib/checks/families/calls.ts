import type { ReadReport } from '../types'
import type { ClaimView } from './claims'
import type { Comparison } from './comparison'
import type { Series } from './evidence'

/** Results outrank the rest of the text, text outranks tables, the manuscript outranks the results file. */
function rank({ place, section }: ReadReport): number {
  if (place.source === 'results-table') return 0
  if (place.source === 'pdf-table') return 1
  return section === 'results' ? 3 : 2
}

/** "did not differ (p < 0.05)": the level that was not reached, rather than a value below it. */
function isCriterion({ called, relation, value }: ReadReport, alpha: number): boolean {
  return called === 'not significant' && (relation === '<' || relation === '<=') && value >= alpha
}

/** What the manuscript calls the comparison in words or marks; null where it does not, or where it says both. */
export function statedCall({ items }: Comparison, alpha: number): boolean | null {
  const called = items.filter(({ report }) => report.called !== null && !isCriterion(report, alpha))
  const best = Math.max(...called.map(({ report }) => rank(report)))
  const words = new Set(
    called.filter(({ report }) => rank(report) === best).map(({ report }) => report.called),
  )
  if (words.size !== 1) return null
  return words.has('significant')
}

/**
 * The call that the manuscript's own stated level implies for a value that it prints: adjusted values are held
 * against the level, raw ones against the lowered threshold. Null where the level or the scale is not stated.
 */
export function impliedCall(
  { items }: Comparison,
  view: ClaimView | null,
  series: readonly Series[],
  level: number | null,
): boolean | null {
  const threshold = view?.threshold ?? level
  if (!view || threshold === null) return null
  for (const { report } of items) {
    if (report.place.source === 'results-table') continue
    const own = series.find(
      ({ source, presented }) => source === report.place.source && presented === report.scale,
    )
    const lowered = level !== null && threshold < level
    const onScale = lowered ? own?.is === 'raw' || report.scale === 'raw' : report.scale === 'adjusted'
    if (!onScale) continue
    if (report.high <= threshold) return true
    if (report.low >= threshold) return false
  }
  return null
}
