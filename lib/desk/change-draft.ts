import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { manuscripts, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadDraft } from './load-draft'

const emptyIsNull = (value: unknown) => (value === '' ? null : value)

export const changeDraftInput = z.object({
  manuscriptId: z.string(),
  title: z.string().trim().max(500).optional(),
  correspondingAuthor: z.string().trim().max(200).optional(),
  correspondingEmail: z.union([z.literal(''), z.email('Please give an e-mail address.')]).optional(),
  alpha: z.preprocess(emptyIsNull, z.coerce.number().gt(0).lt(1).nullable()).optional(),
  correction: z.string().trim().max(5000).optional(),
  primaryOutcome: z.string().trim().max(1000).optional(),
  note: z.string().trim().max(5000).optional(),
})

export type ChangeDraftResult = { manuscriptId: string }

/** Saves what was filled in so far: of the draft, or of a revision that is begun. What is absent stays. */
export function changeDraft(
  db: Db,
  actor: Actor,
  input: z.infer<typeof changeDraftInput>,
  now: number,
): ChangeDraftResult {
  return transact(db, (tx) => {
    const { manuscriptId, title, correspondingAuthor, correspondingEmail, ...said } = input
    const { round } = loadDraft(tx, actor, manuscriptId)
    const about = { title, correspondingAuthor, correspondingEmail }
    if (isGiven(about)) tx.update(manuscripts).set(about).where(eq(manuscripts.id, manuscriptId)).run()
    if (isGiven(said)) tx.update(rounds).set(said).where(eq(rounds.id, round.id)).run()
    recordEvent(tx, actor, 'draft changed', now, { manuscriptId, detail: { round: round.number } })
    return { manuscriptId }
  })
}

function isGiven(values: Record<string, unknown>): boolean {
  return Object.values(values).some((value) => value !== undefined)
}
