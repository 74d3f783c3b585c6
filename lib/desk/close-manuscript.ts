import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { getRoundRow, loadManuscript } from './load-manuscript'
import { moveManuscript } from './move-manuscript'

export const closeManuscriptInput = z.object({ manuscriptId: z.string() })

export type CloseManuscriptResult = { manuscriptId: string }

/** Ends the way of a manuscript whose verdict is out: no further round. */
export function closeManuscript(
  db: Db,
  actor: Actor,
  input: z.infer<typeof closeManuscriptInput>,
  now: number,
): CloseManuscriptResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'manuscript.close', input.manuscriptId)
    moveManuscript(tx, actor, manuscript.id, 'close', now)
    const round = getRoundRow(tx, manuscript)
    tx.update(rounds).set({ closedAt: now }).where(eq(rounds.id, round.id)).run()
    recordEvent(tx, actor, 'closed', now, {
      manuscriptId: manuscript.id,
      detail: { round: round.number },
    })
    return { manuscriptId: manuscript.id }
  })
}
