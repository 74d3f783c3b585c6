import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { composeWithdrawn } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { closeAssignment, findOpenAssignment, getRecipient, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const withdrawManuscriptInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().max(2000).default(''),
})

export type WithdrawManuscriptResult = { manuscriptId: string }

/** Takes a manuscript back before a verdict is out; whoever is due for it is told and is no longer due. */
export function withdrawManuscript(
  db: Db,
  actor: Actor,
  input: z.infer<typeof withdrawManuscriptInput>,
  now: number,
): WithdrawManuscriptResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'manuscript.withdraw', input.manuscriptId)
    const from = manuscript.state
    moveManuscript(tx, actor, manuscript.id, 'withdraw', now)
    const assignment = findOpenAssignment(tx, manuscript.id)
    if (assignment) {
      closeAssignment(tx, assignment, manuscript.id, 'ended', 'withdrawn', now)
      const to = getRecipient(tx, assignment.reviewerId)
      queueMail(
        tx,
        composeWithdrawn({ to, manuscriptId: manuscript.id, reference: manuscript.reference }),
        now,
      )
    }
    recordEvent(tx, actor, 'withdrawn', now, {
      manuscriptId: manuscript.id,
      detail: { from, reason: input.reason },
    })
    return { manuscriptId: manuscript.id }
  })
}
