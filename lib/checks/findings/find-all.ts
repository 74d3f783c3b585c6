import type { Bench } from '../families/case'
import { SEVERITIES } from '../vocabulary'
import type { Finding } from '../types'
import { ruleTable } from './table'

/** Every finding, the gravest first, then by page and by the order of the rules; ids f1, f2 … in that order. */
export function findAll(bench: Bench): Finding[] {
  const found = ruleTable.flatMap(({ rule, find }) => find(bench).map((each) => ({ rule, ...each })))
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
