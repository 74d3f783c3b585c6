import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { composeEnded } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import {
  closeAssignment,
  findOpenAssignment,
  getRecipient,
  loadManuscript,
  refuseState,
} from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const endAssignmentInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().min(1, 'Please say why.').max(2000),
})

export type EndAssignmentResult = { manuscriptId: string }

/** Takes a review back from whoever has it; what they decided on the points stays. */
export function endAssignment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof endAssignmentInput>,
  now: number,
): EndAssignmentResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'assignment.end', input.manuscriptId)
    const assignment = findOpenAssignment(tx, manuscript.id)
    if (!assignment) throw refuseState(manuscript.state)
    moveManuscript(tx, actor, manuscript.id, 'end the assignment', now)
    closeAssignment(tx, assignment, manuscript.id, 'ended', input.reason, now)
    recordEvent(tx, actor, 'assignment ended', now, {
      manuscriptId: manuscript.id,
      subject: assignment.reviewerId,
    })
    const to = getRecipient(tx, assignment.reviewerId)
    queueMail(tx, composeEnded({ to, manuscriptId: manuscript.id, reference: manuscript.reference }), now)
    return { manuscriptId: manuscript.id }
  })
}
