import { and, eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { manuscripts, rounds } from '@/db/schema'
import { composeHandedIn } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { holdHouseRules } from './hold-house-rules'
import { getRecipient, hasManuscriptFile } from './load-manuscript'
import { loadDraft } from './load-draft'
import { moveManuscript } from './move-manuscript'
import { getNextReference } from './next-reference'
import { queueAudit } from './queue-audit'

export const handInInput = z.object({ manuscriptId: z.string() })

export type HandInResult = { reference: string; round: number; auditId: string }

/** Hands in a draft, or the revision that is begun: it is received, and its audit is asked for. */
export function handIn(db: Db, actor: Actor, input: z.infer<typeof handInInput>, now: number): HandInResult {
  return transact(db, (tx) => {
    const { manuscript, round } = loadDraft(tx, actor, input.manuscriptId)
    requireComplete(tx, manuscript, round.id)
    const { referencePrefix } = getSettings()
    moveManuscript(tx, actor, manuscript.id, round.number === 1 ? 'hand in' : 'open a round', now)
    const reference = manuscript.reference ?? getNextReference(tx, referencePrefix, now)
    tx.update(manuscripts)
      .set({ reference, currentRound: round.number, receivedAt: manuscript.receivedAt ?? now })
      .where(eq(manuscripts.id, manuscript.id))
      .run()
    // The rules of the day it is handed in: a draft may have lain for months.
    tx.update(rounds)
      .set({ handedInAt: now, houseRulesVersion: holdHouseRules(tx, now) })
      .where(eq(rounds.id, round.id))
      .run()
    tx.update(rounds)
      .set({ closedAt: now })
      .where(and(eq(rounds.manuscriptId, manuscript.id), eq(rounds.number, round.number - 1)))
      .run()
    const auditId = queueAudit(tx, round.id, now)
    recordEvent(tx, actor, 'handed in', now, {
      manuscriptId: manuscript.id,
      detail: { reference, round: round.number },
    })
    const to = getRecipient(tx, manuscript.submitterId)
    queueMail(tx, composeHandedIn({ to, manuscriptId: manuscript.id, reference, round: round.number }), now)
    return { reference, round: round.number, auditId }
  })
}

function requireComplete(
  tx: Tx,
  about: { title: string; correspondingAuthor: string; correspondingEmail: string },
  roundId: string,
): void {
  const missing: Record<string, string> = {}
  if (!about.title) missing.title = 'Please give the title.'
  if (!about.correspondingAuthor) missing.correspondingAuthor = 'Please name the corresponding author.'
  if (!about.correspondingEmail) missing.correspondingEmail = 'Please give the address the verdict goes to.'
  if (!hasManuscriptFile(tx, roundId))
    missing.manuscript = 'Please add the manuscript as a PDF or a Word document.'
  const [first, ...more] = Object.values(missing)
  if (first) {
    throw refuse('invalid', more.length ? 'Please fill in what is missing.' : first, missing)
  }
}
