import { and, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { getRulesOf } from '@/db/queries/rules-in-force'
import { assignments, conflicts, manuscripts, people, personRoles } from '@/db/schema'
import { composeAssigned } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { listOf } from '@/lib/rules/list-of'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { getRoundRow, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const offerAssignmentInput = z.object({
  manuscriptIds: listOf(z.string()).pipe(z.array(z.string()).min(1, 'Please choose a manuscript.').max(200)),
  reviewerId: z.string().min(1, 'Please choose a reviewer.'),
  /** End of the review, ms; without it the house rules' days from now. */
  dueAt: z.number().int().nullish(),
})

export type OfferAssignmentResult = { assignmentIds: string[] }

const day = 24 * 3_600_000

/** Offers the review of one or several manuscripts to a reviewer: all of them, or none. */
export function offerAssignment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof offerAssignmentInput>,
  now: number,
): OfferAssignmentResult {
  return transact(db, (tx) => {
    const { reviewerId } = input
    const chosen = [...new Set(input.manuscriptIds)].map((id) =>
      loadManuscript(tx, actor, 'assignment.offer', id),
    )
    const reviewer = requireActiveReviewer(tx, reviewerId)
    if (input.dueAt != null && input.dueAt <= now) {
      throw refuse('invalid', 'Please choose a due date that lies ahead.', { dueAt: 'It lies behind us.' })
    }
    const assignmentIds = chosen.map((manuscript) => {
      requireUnbiased(tx, manuscript, reviewerId)
      moveManuscript(tx, actor, manuscript.id, 'assign', now)
      const round = getRoundRow(tx, manuscript)
      const dueAt = input.dueAt ?? now + getRulesOf(tx, round.houseRulesVersion).reviewDays * day
      const id = newId('assignment')
      tx.insert(assignments)
        .values({
          id,
          manuscriptId: manuscript.id,
          roundId: round.id,
          reviewerId,
          assignedBy: actor.id,
          status: 'offered',
          dueAt,
          createdAt: now,
        })
        .run()
      tx.update(manuscripts).set({ dueAt }).where(eq(manuscripts.id, manuscript.id)).run()
      recordEvent(tx, actor, 'assigned', now, {
        manuscriptId: manuscript.id,
        subject: reviewerId,
        detail: { round: round.number, dueAt },
      })
      const about = { manuscriptId: manuscript.id, reference: manuscript.reference }
      queueMail(tx, composeAssigned({ ...about, to: reviewer, dueAt }), now)
      return id
    })
    return { assignmentIds }
  })
}

function requireActiveReviewer(tx: Tx, personId: string) {
  const row = tx
    .select({ name: people.name, email: people.email })
    .from(people)
    .innerJoin(personRoles, and(eq(personRoles.personId, people.id), eq(personRoles.role, 'reviewer')))
    .where(and(eq(people.id, personId), eq(people.status, 'active')))
    .get()
  if (row) return row
  throw refuse('invalid', 'Please choose a reviewer whose account is active.', {
    reviewerId: 'This person cannot review.',
  })
}

function requireUnbiased(
  tx: Tx,
  manuscript: { id: string; reference: string | null; submitterId: string },
  reviewerId: string,
): void {
  if (manuscript.submitterId === reviewerId) {
    throw refuse('conflict', `${manuscript.reference ?? 'A manuscript'} was handed in by this reviewer.`)
  }
  const conflict = tx
    .select({ id: conflicts.id })
    .from(conflicts)
    .where(
      and(
        eq(conflicts.manuscriptId, manuscript.id),
        eq(conflicts.personId, reviewerId),
        isNull(conflicts.liftedAt),
      ),
    )
    .get()
  if (conflict) {
    throw refuse(
      'conflict',
      `This reviewer has a conflict of interest on ${manuscript.reference ?? 'a manuscript'}.`,
    )
  }
}
