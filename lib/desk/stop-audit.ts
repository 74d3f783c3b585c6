import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { audits } from '@/db/schema'
import { composeStuck } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadAudit } from './load-audit'
import { getRecipient } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const stopAuditInput = z.object({
  auditId: z.string(),
  /** What is wrong and what to do, one or two sentences for the submitter. */
  trouble: z.string().trim().min(1).max(2000),
})

/** `stopped` is false where the audit had ended before. */
export type StopAuditResult = { stopped: boolean }

/** Ends an audit that cannot be made; the manuscript is stuck until its submitter does something. For the worker. */
export function stopAudit(
  db: Db,
  actor: Actor,
  input: z.infer<typeof stopAuditInput>,
  now: number,
): StopAuditResult {
  return transact(db, (tx) => {
    const { auditId, trouble } = input
    const at = loadAudit(tx, actor, auditId)
    if (at.ended) return { stopped: false }
    tx.update(audits).set({ status: 'stuck', trouble, finishedAt: now }).where(eq(audits.id, auditId)).run()
    if (at.awaited) {
      moveManuscript(tx, actor, at.manuscriptId, 'stop the audit', now)
      const to = getRecipient(tx, at.submitterId)
      queueMail(tx, composeStuck({ to, manuscriptId: at.manuscriptId, reference: at.reference }), now)
    }
    recordEvent(tx, actor, 'audit stopped', now, {
      manuscriptId: at.manuscriptId,
      subject: auditId,
      detail: { round: at.round },
    })
    return { stopped: true }
  })
}
