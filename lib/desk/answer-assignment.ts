import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { assignments, conflicts } from '@/db/schema'
import { composeDeclined } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import {
  closeAssignment,
  findOpenAssignment,
  getRecipient,
  loadManuscript,
  refuseState,
} from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const answerAssignmentInput = z.object({
  manuscriptId: z.string(),
  accept: z.boolean(),
  /** Needed to decline. */
  reason: z.string().trim().max(2000).default(''),
  /** Declining because of a conflict of interest: declares it at once. */
  conflict: z.boolean().default(false),
})

export type AnswerAssignmentResult = { manuscriptId: string; accepted: boolean }

/** Accepts or declines a review that was offered. */
export function answerAssignment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof answerAssignmentInput>,
  now: number,
): AnswerAssignmentResult {
  return transact(db, (tx) => {
    const { accept, reason } = input
    const manuscript = loadManuscript(tx, actor, 'assignment.answer', input.manuscriptId)
    const offer = findOpenAssignment(tx, manuscript.id)
    if (offer?.reviewerId !== actor.id || offer.status !== 'offered') throw refuseState(manuscript.state)
    if (!accept && reason === '') {
      throw refuse('invalid', 'Please say why you decline.', { reason: 'Please say why.' })
    }
    moveManuscript(tx, actor, manuscript.id, accept ? 'accept' : 'decline', now)
    const about = { manuscriptId: manuscript.id, subject: offer.id }
    if (accept) {
      tx.update(assignments)
        .set({ status: 'accepted', answeredAt: now })
        .where(eq(assignments.id, offer.id))
        .run()
      recordEvent(tx, actor, 'assignment accepted', now, about)
      return { manuscriptId: manuscript.id, accepted: true }
    }
    closeAssignment(tx, offer, manuscript.id, 'declined', reason, now)
    recordEvent(tx, actor, 'assignment declined', now, { ...about, detail: { conflict: input.conflict } })
    if (input.conflict) {
      const id = newId('conflict')
      const pair = { manuscriptId: manuscript.id, personId: actor.id }
      tx.insert(conflicts)
        .values({ id, ...pair, declaredBy: actor.id, reason, createdAt: now })
        .run()
      recordEvent(tx, actor, 'conflict declared', now, { manuscriptId: manuscript.id, subject: actor.id })
    }
    const to = getRecipient(tx, offer.assignedBy)
    const mail = { to, manuscriptId: manuscript.id, reference: manuscript.reference }
    queueMail(tx, composeDeclined({ ...mail, reviewer: actor.name }), now)
    return { manuscriptId: manuscript.id, accepted: false }
  })
}
