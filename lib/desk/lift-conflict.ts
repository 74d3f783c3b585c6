import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { conflicts } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { loadManuscript } from './load-manuscript'

export const liftConflictInput = z.object({ conflictId: z.string() })

export type LiftConflictResult = { manuscriptId: string }

/** Ends a conflict that was declared in error or is over. Nobody lifts their own: it hides the manuscript. */
export function liftConflict(
  db: Db,
  actor: Actor,
  input: z.infer<typeof liftConflictInput>,
  now: number,
): LiftConflictResult {
  return transact(db, (tx) => {
    const conflict = tx
      .select({
        manuscriptId: conflicts.manuscriptId,
        personId: conflicts.personId,
        liftedAt: conflicts.liftedAt,
      })
      .from(conflicts)
      .where(eq(conflicts.id, input.conflictId))
      .get()
    if (!conflict) throw refuseUnknown()
    const manuscript = loadManuscript(tx, actor, 'conflict.lift', conflict.manuscriptId)
    if (conflict.liftedAt !== null) throw refuse('conflict', 'This conflict is lifted already.')
    tx.update(conflicts)
      .set({ liftedAt: now, liftedBy: actor.id })
      .where(eq(conflicts.id, input.conflictId))
      .run()
    recordEvent(tx, actor, 'conflict lifted', now, {
      manuscriptId: manuscript.id,
      subject: conflict.personId,
    })
    return { manuscriptId: manuscript.id }
  })
}
