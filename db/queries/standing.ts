import { and, eq, inArray, isNull } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { assignments, conflicts, manuscripts } from '@/db/schema'
import type { Standing } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'

/** How the actor stands to a manuscript. Nothing in it tells whether the actor may know of the manuscript. */
export function getStanding(db: Reader, actor: Actor, manuscriptId: string): Standing {
  const row = db
    .select({ submitterId: manuscripts.submitterId, state: manuscripts.state })
    .from(manuscripts)
    .where(eq(manuscripts.id, manuscriptId))
    .get()
  const mine = db
    .select({ status: assignments.status })
    .from(assignments)
    .where(
      and(
        eq(assignments.manuscriptId, manuscriptId),
        eq(assignments.reviewerId, actor.id),
        inArray(assignments.status, ['offered', 'accepted', 'done']),
      ),
    )
    .all()
  const conflict = db
    .select({ id: conflicts.id })
    .from(conflicts)
    .where(
      and(
        eq(conflicts.manuscriptId, manuscriptId),
        eq(conflicts.personId, actor.id),
        isNull(conflicts.liftedAt),
      ),
    )
    .get()
  return {
    relations: [
      ...(row?.submitterId === actor.id ? (['own'] as const) : []),
      ...(mine.some((a) => a.status === 'offered') ? (['offered'] as const) : []),
      ...(mine.some((a) => a.status !== 'offered') ? (['assigned'] as const) : []),
    ],
    conflicted: conflict !== undefined,
    handedIn: row !== undefined && row.state !== 'draft',
  }
}
