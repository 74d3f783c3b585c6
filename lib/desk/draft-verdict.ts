import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { verdicts } from '@/db/schema'
import { composeVerdictDrafted } from '@/lib/mail/desk-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { VERDICTS } from '@/lib/rules/words'
import { getRecipient, loadReview } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const draftVerdictInput = z.object({
  manuscriptId: z.string(),
  verdict: z.enum(VERDICTS),
  /** To the editor, never to the authors. */
  remark: z.string().trim().max(10_000).default(''),
  effortMinutes: z.coerce.number().int().min(0).max(100_000).nullish(),
  /** The letter, Markdown. */
  body: z.string().trim().min(1, 'Please write the letter.').max(200_000),
})

export type DraftVerdictResult = { verdictId: string }

/** Hands the verdict to the editors; until it is released its reviewer can still change it. */
export function draftVerdict(
  db: Db,
  actor: Actor,
  input: z.infer<typeof draftVerdictInput>,
  now: number,
): DraftVerdictResult {
  return transact(db, (tx) => {
    const { manuscriptId, verdict, remark, body } = input
    const { manuscript, assignment, round } = loadReview(tx, actor, 'verdict.draft', manuscriptId, [
      'in review',
      'verdict drafted',
    ])
    const values = {
      reviewerId: actor.id,
      verdict,
      remark,
      effortMinutes: input.effortMinutes ?? null,
      body,
      status: 'drafted' as const,
      changedAt: now,
    }
    const there = tx.select({ id: verdicts.id }).from(verdicts).where(eq(verdicts.roundId, round.id)).get()
    const verdictId = there?.id ?? newId('verdict')
    if (there) tx.update(verdicts).set(values).where(eq(verdicts.id, verdictId)).run()
    else
      tx.insert(verdicts)
        .values({ id: verdictId, roundId: round.id, draftedAt: now, ...values })
        .run()
    const first = manuscript.state === 'in review'
    if (first) {
      moveManuscript(tx, actor, manuscriptId, 'draft the verdict', now)
      const to = getRecipient(tx, assignment.assignedBy)
      queueMail(tx, composeVerdictDrafted({ to, manuscriptId, reference: manuscript.reference }), now)
    }
    recordEvent(tx, actor, first ? 'verdict drafted' : 'verdict changed', now, {
      manuscriptId,
      subject: verdictId,
      detail: { round: round.number, verdict },
    })
    return { verdictId }
  })
}
