import type { Bench } from '../families/case'
import type { Found } from './finding'
import { SEVERITIES } from '../vocabulary'
import type { Finding } from '../types'
import { ruleTable } from './table'

/** Every finding, the gravest first, then by page and by the order of the rules; ids f1, f2 … in that order. */
export function findAll(bench: Bench): Finding[] {
  const found = ruleTable.flatMap(({ rule, find }) =>
    find(bench).map((each) => ({ rule, ...temper(each, bench) })),
  )
  const page = (finding: { place: Finding['place'] }) => finding.place?.page ?? Infinity
  return found
    .map((finding, order) => ({ finding, order }))
    .sort(
      (a, b) =>
        SEVERITIES.indexOf(a.finding.severity) - SEVERITIES.indexOf(b.finding.severity) ||
        (page(a.finding) === page(b.finding) ? 0 : page(a.finding) - page(b.finding)) ||
        a.order - b.order,
    )
    .map(({ finding: { rule, ...rest } }, i) => ({ id: `f${i + 1}`, rule, ...rest }))
}

/**
 * What rests on a number that was recognised from a picture is a question to the reviewer first: a lost decimal point
 * is the recogniser's fault before it is the authors'.
 */
function temper(found: Found, { laidOut, reading }: Bench): Found {
  const pages = new Set((laidOut.recognised ?? []).map((place) => place.page))
  if (pages.size === 0 || (found.severity !== 'major' && found.severity !== 'minor')) return found
  const named = new Set(found.reports)
  const places = [found.place, ...reading.reports.filter(({ id }) => named.has(id)).map(({ place }) => place)]
  if (!places.some((place) => place !== null && pages.has(place.page))) return found
  const says = `${found.says} It rests on numbers that were recognised from a picture of the page: compare them with the page first.`
  return { ...found, severity: 'question', says }
}
