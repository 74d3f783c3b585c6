import { and, asc, count, eq, inArray, isNull, min, sql } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { assignments, conflicts, manuscripts, people, personRoles } from '@/db/schema'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { getStanding } from './standing'

export type ReviewerRow = {
  id: string
  name: string
  expertise: string
  /** Offered and accepted reviews that are not done. */
  open: number
  nextDueAt: number | null
  overdue: number
  /** Of the manuscripts asked about: those that cannot be offered to them, and why. */
  barred: { manuscriptId: string; why: 'conflict' | 'submitter' }[]
}

/** Active reviewers, the least loaded first. For editors; of the manuscripts asked about those they may see. */
export function listReviewers(
  db: Reader,
  actor: Actor,
  manuscriptIds: readonly string[],
  now: number,
): ReviewerRow[] {
  if (!may(actor, 'assignment.offer')) return []
  const asked = manuscriptIds.filter((id) => may(actor, 'assignment.offer', getStanding(db, actor, id)))
  const bars = listBars(db, asked)
  const rows = db
    .select({
      id: people.id,
      name: people.name,
      expertise: people.expertise,
      open: count(assignments.id),
      nextDueAt: min(assignments.dueAt),
      overdue: sql<number>`coalesce(sum(${assignments.dueAt} < ${now}), 0)`,
    })
    .from(people)
    .innerJoin(personRoles, and(eq(personRoles.personId, people.id), eq(personRoles.role, 'reviewer')))
    .leftJoin(
      assignments,
      and(eq(assignments.reviewerId, people.id), inArray(assignments.status, ['offered', 'accepted'])),
    )
    .where(eq(people.status, 'active'))
    .groupBy(people.id)
    .orderBy(asc(count(assignments.id)), asc(people.name))
    .all()
  return rows.map((row) => ({
    ...row,
    barred: bars
      .filter((bar) => bar.personId === row.id)
      .map(({ manuscriptId, why }) => ({ manuscriptId, why })),
  }))
}

function listBars(db: Reader, manuscriptIds: string[]) {
  const declared = db
    .select({ manuscriptId: conflicts.manuscriptId, personId: conflicts.personId })
    .from(conflicts)
    .where(and(inArray(conflicts.manuscriptId, manuscriptIds), isNull(conflicts.liftedAt)))
    .all()
  const own = db
    .select({ manuscriptId: manuscripts.id, personId: manuscripts.submitterId })
    .from(manuscripts)
    .where(inArray(manuscripts.id, manuscriptIds))
    .all()
  return [
    ...declared.map((row) => ({ ...row, why: 'conflict' as const })),
    ...own.map((row) => ({ ...row, why: 'submitter' as const })),
  ]
}
