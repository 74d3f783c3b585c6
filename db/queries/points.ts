import { and, asc, eq, type SQL } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { answers, people, points } from '@/db/schema'
import { SEVERITIES, type Rule, type Severity } from '@/lib/checks/vocabulary'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import type { PointStatus } from '@/lib/rules/words'
import { citesSchema } from './letter-points'
import { findReleasedRound, findRound } from './released-round'
import { findViewing } from './viewing'

export type PointRow = {
  id: string
  round: number
  /** Key of the finding it came from; null for the reviewer's own. */
  findingKey: string | null
  rule: Rule | null
  familyKey: string | null
  familyLabel: string
  status: PointStatus
  reason: string
  severity: Severity
  says: string
  asks: string
  quote: string
  page: number | null
  /** Of the results table, instead of a page. */
  row: number | null
  sheet: string | null
  cites: string[]
  position: number
  decidedBy: { id: string; name: string } | null
  decidedAt: number | null
  answer: { body: string; createdAt: number; changedAt: number | null } | null
}

/**
 * In their order. The submitter gets the kept points of a released round only, in the order of the letter,
 * without who decided and why. `round`: the current one unless told; for the submitter the newest released one.
 */
export function listPoints(db: Reader, actor: Actor, manuscriptId: string, round?: number): PointRow[] {
  const viewing = findViewing(db, actor, manuscriptId)
  if (!viewing) return []
  if (viewing.sight === 'submitter') {
    const released = findReleasedRound(db, manuscriptId, round)
    if (!released) return []
    return readPoints(db, released, eq(points.status, 'kept'))
      .map((point) => ({ ...point, reason: '', decidedBy: null, decidedAt: null }))
      .sort((a, b) => SEVERITIES.indexOf(a.severity) - SEVERITIES.indexOf(b.severity))
  }
  if (!may(actor, 'audit.read', viewing.standing)) return []
  const chosen = findRound(db, manuscriptId, round ?? viewing.manuscript.currentRound)
  return chosen ? readPoints(db, chosen) : []
}

function readPoints(db: Reader, round: { id: string; number: number }, only?: SQL): PointRow[] {
  const rows = db
    .select({
      id: points.id,
      findingKey: points.findingKey,
      rule: points.rule,
      familyKey: points.familyKey,
      familyLabel: points.familyLabel,
      status: points.status,
      reason: points.reason,
      severity: points.severity,
      says: points.says,
      asks: points.asks,
      quote: points.quote,
      page: points.page,
      row: points.row,
      sheet: points.sheet,
      cites: points.cites,
      position: points.position,
      decidedBy: { id: people.id, name: people.name },
      decidedAt: points.decidedAt,
      answer: { body: answers.body, createdAt: answers.createdAt, changedAt: answers.changedAt },
    })
    .from(points)
    .leftJoin(people, eq(people.id, points.decidedBy))
    .leftJoin(answers, eq(answers.pointId, points.id))
    .where(and(eq(points.roundId, round.id), only))
    .orderBy(asc(points.position), asc(points.id))
    .all()
  return rows.map((row) => ({ ...row, round: round.number, cites: citesSchema.parse(row.cites) }))
}
