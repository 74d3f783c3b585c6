import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { getRoundRow, hasManuscriptFile, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'
import { queueAudit } from './queue-audit'

export const handInAgainInput = z.object({ manuscriptId: z.string() })

export type HandInAgainResult = { auditId: string }

/** After what an audit was stuck on has been replaced: asks for the audit of the same round again. */
export function handInAgain(
  db: Db,
  actor: Actor,
  input: z.infer<typeof handInAgainInput>,
  now: number,
): HandInAgainResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'manuscript.replace-file', input.manuscriptId)
    moveManuscript(tx, actor, manuscript.id, 'replace a file', now)
    const round = getRoundRow(tx, manuscript)
    if (!hasManuscriptFile(tx, round.id)) {
      const message = 'Please add the manuscript as a PDF or a Word document.'
      throw refuse('invalid', message, { manuscript: message })
    }
    const auditId = queueAudit(tx, round.id, now)
    recordEvent(tx, actor, 'handed in', now, {
      manuscriptId: manuscript.id,
      detail: { round: round.number, again: true },
    })
    return { auditId }
  })
}
