import { and, eq, inArray, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { conflicts, personRoles, points } from '@/db/schema'
import { composeSteppedAside } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { closeAssignment, findOpenAssignment, getRecipient, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const declareConflictInput = z.object({
  manuscriptId: z.string(),
  /** Whose; one's own without it. Only an editor declares another's. */
  personId: z.string().optional(),
  reason: z.string().trim().min(1, 'Please say what the conflict is.').max(2000),
})

export type DeclareConflictResult = { conflictId: string; steppedAside: boolean }

/** From here on the person sees nothing of the manuscript; a review that they have ends, and counts no more. */
export function declareConflict(
  db: Db,
  actor: Actor,
  input: z.infer<typeof declareConflictInput>,
  now: number,
): DeclareConflictResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'conflict.declare', input.manuscriptId)
    const personId = input.personId ?? actor.id
    if (personId !== actor.id) requireReviewerOfOthers(tx, actor, personId)
    requireNone(tx, manuscript.id, personId)
    const assignment = findOpenAssignment(tx, manuscript.id)
    const steppedAside = assignment?.reviewerId === personId
    if (steppedAside) {
      // Before the conflict is written: the move asks for the actor's standing as it is now.
      moveManuscript(tx, actor, manuscript.id, 'step aside', now)
      closeAssignment(tx, assignment, manuscript.id, 'ended', 'conflict of interest', now)
      reopenPoints(tx, assignment.roundId, personId)
    }
    const conflictId = newId('conflict')
    tx.insert(conflicts)
      .values({
        id: conflictId,
        manuscriptId: manuscript.id,
        personId,
        declaredBy: actor.id,
        reason: input.reason,
        createdAt: now,
      })
      .run()
    recordEvent(tx, actor, 'conflict declared', now, {
      manuscriptId: manuscript.id,
      subject: personId,
      detail: { steppedAside },
    })
    if (steppedAside && assignment.assignedBy !== actor.id) {
      const to = getRecipient(tx, assignment.assignedBy)
      const about = { to, manuscriptId: manuscript.id, reference: manuscript.reference }
      queueMail(tx, composeSteppedAside({ ...about, reviewer: getRecipient(tx, personId).name }), now)
    }
    return { conflictId, steppedAside }
  })
}

function requireReviewerOfOthers(tx: Tx, actor: Actor, personId: string): void {
  if (!actor.roles.includes('editor')) throw refuseUnknown()
  const judges = tx
    .select({ role: personRoles.role })
    .from(personRoles)
    .where(and(eq(personRoles.personId, personId), inArray(personRoles.role, ['reviewer', 'editor'])))
    .get()
  if (!judges) {
    throw refuse('invalid', 'Please choose a reviewer or an editor.', {
      personId: 'This person does not review.',
    })
  }
}

function requireNone(tx: Tx, manuscriptId: string, personId: string): void {
  const there = tx
    .select({ id: conflicts.id })
    .from(conflicts)
    .where(
      and(
        eq(conflicts.manuscriptId, manuscriptId),
        eq(conflicts.personId, personId),
        isNull(conflicts.liftedAt),
      ),
    )
    .get()
  if (there) throw refuse('conflict', 'This conflict is declared already.')
}

/** What somebody with a conflict decided is for the next reviewer to decide. */
function reopenPoints(tx: Tx, roundId: string, personId: string): void {
  tx.update(points)
    .set({ status: 'open', decidedBy: null, decidedAt: null })
    .where(and(eq(points.roundId, roundId), eq(points.decidedBy, personId)))
    .run()
}
