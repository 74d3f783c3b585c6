import type { Audit, Claim, Decision, Family, Finding, Place, Report, Statistic } from '@/lib/checks/types'
import type { Outcome } from '@/lib/checks/vocabulary'
import { outcomeOfDecision } from '../charts/outcome-of-decision'

/** What can be chosen on the bench; each leads to a place on the page and back. */
export type Target = { kind: 'report' | 'statistic' | 'claim' | 'finding' | 'family'; id: string }

/** A place on a page that the bench draws, with how its number stands. */
export type MarkedPlace = {
  target: Target
  page: number
  boxes: Place['boxes']
  outcome: Outcome | null
  label: string
}

export type AuditIndex = {
  audit: Audit
  reports: ReadonlyMap<string, Report>
  statistics: ReadonlyMap<string, Statistic>
  claims: ReadonlyMap<string, Claim>
  families: ReadonlyMap<string, Family>
  findings: ReadonlyMap<string, Finding>
  decisions: ReadonlyMap<string, { decision: Decision; family: Family }>
  marks: ReadonlyMap<number, MarkedPlace[]>
}

/** Everything of an audit by its id, and what stands on which page; made once for an audit. */
export function indexAudit(audit: Audit): AuditIndex {
  const decisions = new Map(
    audit.families.flatMap((family) =>
      family.decisions.map((decision) => [decision.report, { decision, family }] as const),
    ),
  )
  const byId = <T extends { id: string }>(items: readonly T[]) =>
    new Map(items.map((item) => [item.id, item]))
  return {
    audit,
    reports: byId(audit.reports),
    statistics: byId(audit.statistics),
    claims: byId(audit.claims),
    families: byId(audit.families),
    findings: byId(audit.findings),
    decisions,
    marks: markPages(audit, decisions),
  }
}

/** How a printed value's call stands, null where none is made or it belongs to no family. */
export function outcomeOfReport(index: Pick<AuditIndex, 'decisions'>, reportId: string): Outcome | null {
  const held = index.decisions.get(reportId)
  return held ? outcomeOfDecision(held.decision, held.family) : null
}

/** Where a target stands; a family stands where its claim does, else where its first member does. */
export function placeOf(index: AuditIndex, { kind, id }: Target): Place | null {
  if (kind === 'report') return index.reports.get(id)?.place ?? null
  if (kind === 'statistic') return index.statistics.get(id)?.place ?? null
  if (kind === 'claim') return index.claims.get(id)?.place ?? null
  if (kind === 'finding') return placeOfFinding(index, id)
  const family = index.families.get(id)
  const claim = family?.claim ? index.claims.get(family.claim) : undefined
  return claim?.place ?? index.reports.get(family?.members[0] ?? '')?.place ?? null
}

function placeOfFinding(index: AuditIndex, id: string): Place | null {
  const finding = index.findings.get(id)
  if (!finding) return null
  return finding.place ?? index.reports.get(finding.reports[0] ?? '')?.place ?? null
}

export function isSame(a: Target | null, b: Target | null): boolean {
  return a !== null && b !== null && a.kind === b.kind && a.id === b.id
}

function markPages(audit: Audit, decisions: AuditIndex['decisions']): Map<number, MarkedPlace[]> {
  const marks = [
    ...audit.reports.map((report) => ({
      target: { kind: 'report' as const, id: report.id },
      place: report.place,
      outcome: outcomeOfReport({ decisions }, report.id),
    })),
    ...audit.claims.map((claim) => ({
      target: { kind: 'claim' as const, id: claim.id },
      place: claim.place,
      outcome: null,
    })),
  ]
  const pages = new Map<number, MarkedPlace[]>()
  for (const { target, place, outcome } of marks) {
    if (place.page === null || place.boxes.length === 0) continue
    const on = pages.get(place.page) ?? []
    on.push({ target, page: place.page, boxes: place.boxes, outcome, label: place.quote })
    pages.set(place.page, on)
  }
  for (const on of pages.values()) on.sort(inReadingOrder)
  return pages
}

/** From the top of the page; on one line from the left. */
function inReadingOrder(a: MarkedPlace, b: MarkedPlace): number {
  const [ax = 0, ay = 0] = a.boxes[0] ?? []
  const [bx = 0, by = 0] = b.boxes[0] ?? []
  return Math.abs(ay - by) > 4 ? by - ay : ax - bx
}
