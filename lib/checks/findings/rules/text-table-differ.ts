import { sameStatistic } from '../../families/agreement'
import type { Bench, Case } from '../../families/case'
import type { Item } from '../../families/comparison'
import { rangeOfReport } from '../../families/evidence'
import { overlaps } from '../../families/interval'
import type { Found, RuleRow } from '../finding'
import { showReport, showStatistic } from '../wording'

/** Major where the two lie on different sides of the level, else minor. One finding a comparison. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap((judged) =>
    judged.comparisons.flatMap(({ label, items }) => inItems(label, items, judged)),
  )
}

function inItems(label: string, items: readonly Item[], judged: Case): Found[] {
  for (const [i, a] of items.entries()) {
    for (const b of items.slice(i + 1)) {
      if (isOnePlace(a, b) || isProse(a, b) || isListed(a) || isListed(b)) continue
      const said = differ(a, b, judged)
      if (said) return [toFound(label, a, b, said, judged)]
    }
  }
  return []
}

/** Two columns of one row are two numbers, not one number twice. */
function isOnePlace(a: Item, b: Item): boolean {
  return a.block === b.block && a.report.place.source !== 'text'
}

/**
 * Two sentences often speak of two tests under one name; only an abstract that repeats one value counts as a
 * duplicate.
 */
function isProse(a: Item, b: Item): boolean {
  if (a.report.place.source !== 'text' || b.report.place.source !== 'text') return false
  const [first, second] = [a.report.section, b.report.section]
  const summary = (first === 'abstract') !== (second === 'abstract')
  return !summary || [a, b].some(({ report }) => countP(report.sentence) !== 1)
}

/** One of several p-values of a sentence without a statistic: which test it belongs to may be misread. */
function isListed({ report, statistic }: Item): boolean {
  return report.place.source === 'text' && statistic === null && countP(report.sentence) > 1
}

function countP(sentence: string): number {
  return (sentence.match(/\b[pq]\b\s*[=<>]/gi) ?? []).length
}

function kindOf({ report }: Item, { series }: Case): string {
  const own = series.find(
    ({ source, presented }) => source === report.place.source && presented === report.scale,
  )
  return own && own.is !== 'unknown' ? own.is : report.scale
}

function differ(a: Item, b: Item, judged: Case): string | null {
  if (a.statistic && b.statistic && sameStatistic(a.statistic, b.statistic) === false)
    return `${showStatistic(a.statistic)} and ${showStatistic(b.statistic)}`
  if (a.report.markOnly || b.report.markOnly || kindOf(a, judged) !== kindOf(b, judged)) return null
  const unit = 10 ** -Math.min(a.report.decimals, b.report.decimals)
  const close =
    a.report.relation === '=' &&
    b.report.relation === '=' &&
    Math.abs(a.report.value - b.report.value) <= 1.01 * unit
  if (close || overlaps(rangeOfReport(a.report), rangeOfReport(b.report))) return null
  return `${showReport(a.report)} and ${showReport(b.report)}`
}

function toFound(label: string, a: Item, b: Item, said: string, { family, alpha }: Case): Found {
  const [one, other] = [rangeOfReport(a.report), rangeOfReport(b.report)]
  const crosses =
    a.report.scale === b.report.scale &&
    ((one.high <= alpha && other.low > alpha) || (other.high <= alpha && one.low > alpha))
  return {
    severity: crosses ? 'major' : 'minor',
    family: family.id,
    reports: [a.report.id, b.report.id],
    place: a.report.place,
    says: `${label}: ${said} are printed for the same comparison (${where(a)}; ${where(b)}).`,
    asks: `Please check ${label} and give the same value in both places.`,
    cites: ['sampl'],
  }
}

function where({ report: { place } }: Item): string {
  if (place.source === 'results-table') return `results table, row ${place.row ?? '?'}`
  return `${place.source === 'text' ? 'text' : 'table'} on page ${place.page ?? '?'}`
}

export const textTableDiffer: RuleRow = {
  rule: 'text-table-differ',
  says: 'the same comparison has different values in text and table',
  find,
}
