import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { verdicts } from '@/db/schema'
import { composeSentBack } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { getRecipient, getRoundRow, loadManuscript, refuseState } from './load-manuscript'
import { findVerdict } from './load-verdict'
import { moveManuscript } from './move-manuscript'

export const sendVerdictBackInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().min(1, 'Please say what should change.').max(5000),
})

export type SendVerdictBackResult = { manuscriptId: string }

/** Asks the reviewer to look at their verdict again before it is released. */
export function sendVerdictBack(
  db: Db,
  actor: Actor,
  input: z.infer<typeof sendVerdictBackInput>,
  now: number,
): SendVerdictBackResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'verdict.send-back', input.manuscriptId)
    moveManuscript(tx, actor, manuscript.id, 'send the verdict back', now)
    const verdict = findVerdict(tx, getRoundRow(tx, manuscript).id)
    if (!verdict) throw refuseState(manuscript.state)
    tx.update(verdicts)
      .set({ status: 'sent back', sentBackReason: input.reason, changedAt: now })
      .where(eq(verdicts.id, verdict.id))
      .run()
    recordEvent(tx, actor, 'verdict sent back', now, { manuscriptId: manuscript.id, subject: verdict.id })
    const to = getRecipient(tx, verdict.reviewerId)
    queueMail(tx, composeSentBack({ to, manuscriptId: manuscript.id, reference: manuscript.reference }), now)
    return { manuscriptId: manuscript.id }
  })
}
