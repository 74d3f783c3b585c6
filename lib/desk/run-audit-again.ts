import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { getRoundRow, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'
import { queueAudit } from './queue-audit'

export const runAuditAgainInput = z.object({ manuscriptId: z.string() })

export type RunAuditAgainResult = { auditId: string }

/** The same files, read again; the audit there was is kept. */
export function runAuditAgain(
  db: Db,
  actor: Actor,
  input: z.infer<typeof runAuditAgainInput>,
  now: number,
): RunAuditAgainResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'audit.run-again', input.manuscriptId)
    moveManuscript(tx, actor, manuscript.id, 'run the audit again', now)
    const round = getRoundRow(tx, manuscript)
    const auditId = queueAudit(tx, round.id, now)
    recordEvent(tx, actor, 'audit asked again', now, {
      manuscriptId: manuscript.id,
      subject: auditId,
      detail: { round: round.number },
    })
    return { auditId }
  })
}
