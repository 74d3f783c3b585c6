import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { manuscripts, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadDraft } from './load-draft'

export const discardDraftInput = z.object({ manuscriptId: z.string() })

export type DiscardDraftResult = { manuscriptId: string }

/** Throws away what was never handed in: the draft, or the revision that is begun. */
export function discardDraft(
  db: Db,
  actor: Actor,
  input: z.infer<typeof discardDraftInput>,
  now: number,
): DiscardDraftResult {
  return transact(db, (tx) => {
    const { manuscript, round } = loadDraft(tx, actor, input.manuscriptId)
    if (manuscript.state === 'draft') {
      tx.delete(manuscripts).where(eq(manuscripts.id, manuscript.id)).run()
    } else {
      tx.delete(rounds).where(eq(rounds.id, round.id)).run()
    }
    recordEvent(tx, actor, 'draft discarded', now, {
      manuscriptId: manuscript.id,
      detail: { round: round.number },
    })
    return { manuscriptId: manuscript.id }
  })
}
