import { and, asc, eq, inArray, isNotNull } from 'drizzle-orm'
import type { Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { points } from '@/db/schema'
import type { Audit, Finding, Place } from '@/lib/checks/types'

/**
 * Makes a point of each finding. Where the round was audited before, what a reviewer decided on the same finding
 * stays decided; points that nobody decided go, and those kept that no longer have a finding stay as they are.
 */
export function raisePoints(tx: Tx, roundId: string, auditId: string, audit: Audit): void {
  const before = tx
    .select()
    .from(points)
    .where(and(eq(points.roundId, roundId), isNotNull(points.findingKey)))
    .orderBy(asc(points.position))
    .all()
  const decided = before.filter((point) => point.status !== 'open')
  const rows = audit.findings.map((finding, position) => {
    const row = toPoint(audit, finding, position)
    const match = decided.findIndex((point) => sameFinding(point, row))
    const [earlier] = match < 0 ? [] : decided.splice(match, 1)
    const kept = earlier && {
      id: earlier.id,
      status: earlier.status,
      reason: earlier.reason,
      severity: earlier.severity,
      asks: earlier.asks,
      decidedBy: earlier.decidedBy,
      decidedAt: earlier.decidedAt,
    }
    return { id: newId('point'), ...row, ...kept, roundId, auditId }
  })
  const leaving = before.filter(
    (point) => !decided.some(({ id, status }) => id === point.id && status === 'kept'),
  )
  if (leaving.length > 0) {
    const ids = leaving.map((point) => point.id)
    tx.delete(points).where(inArray(points.id, ids)).run()
  }
  for (const row of rows) tx.insert(points).values(row).run()
  moveBehind(tx, roundId, auditId, rows.length)
}

function toPoint(audit: Audit, finding: Finding, position: number) {
  const place = finding.place ?? firstPlace(audit, finding)
  const family = audit.families.find((candidate) => candidate.id === finding.family)
  return {
    findingKey: finding.id,
    rule: finding.rule,
    familyKey: finding.family,
    familyLabel: family?.label ?? '',
    status: 'open' as const,
    severity: finding.severity,
    says: finding.says,
    asks: finding.asks,
    quote: place?.quote ?? '',
    page: place?.page ?? null,
    row: place?.row ?? null,
    sheet: place?.sheet ?? null,
    cites: finding.cites,
    position,
  }
}

function firstPlace(audit: Audit, finding: Finding): Place | null {
  return audit.reports.find((report) => report.id === finding.reports[0])?.place ?? null
}

type Spot = {
  rule: string | null
  quote: string
  page: number | null
  row: number | null
  familyLabel: string
}

function sameFinding(a: Spot, b: Spot): boolean {
  return (
    a.rule === b.rule &&
    a.quote === b.quote &&
    a.page === b.page &&
    a.row === b.row &&
    a.familyLabel === b.familyLabel
  )
}

/** What is not of this audit (a reviewer's own points, say) stands after it, in its order. */
function moveBehind(tx: Tx, roundId: string, auditId: string, start: number): void {
  const others = tx
    .select({ id: points.id, auditId: points.auditId })
    .from(points)
    .where(eq(points.roundId, roundId))
    .orderBy(asc(points.position))
    .all()
    .filter((point) => point.auditId !== auditId)
  for (const [index, { id }] of others.entries()) {
    tx.update(points)
      .set({ position: start + index })
      .where(eq(points.id, id))
      .run()
  }
}
