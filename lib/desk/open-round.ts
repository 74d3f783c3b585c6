import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { holdHouseRules } from './hold-house-rules'
import { findBegunRound, getRoundRow, loadManuscript, refuseState } from './load-manuscript'

export const openRoundInput = z.object({ manuscriptId: z.string() })

export type OpenRoundResult = { roundId: string; round: number }

/**
 * Begins the revision of a manuscript that was returned: files are added to it and `handIn` makes the move.
 * It starts from what was said on the round before.
 */
export function openRound(
  db: Db,
  actor: Actor,
  input: z.infer<typeof openRoundInput>,
  now: number,
): OpenRoundResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'manuscript.open-round', input.manuscriptId)
    if (manuscript.state !== 'returned') throw refuseState(manuscript.state)
    if (findBegunRound(tx, manuscript.id)) {
      throw refuse('conflict', 'The revision is begun already; please reload the page.')
    }
    const before = getRoundRow(tx, manuscript)
    const said = tx
      .select({
        alpha: rounds.alpha,
        correction: rounds.correction,
        primaryOutcome: rounds.primaryOutcome,
      })
      .from(rounds)
      .where(eq(rounds.id, before.id))
      .get()
    const roundId = newId('round')
    const number = before.number + 1
    tx.insert(rounds)
      .values({
        ...said,
        id: roundId,
        manuscriptId: manuscript.id,
        number,
        houseRulesVersion: holdHouseRules(tx, now),
        openedAt: now,
      })
      .run()
    recordEvent(tx, actor, 'round opened', now, { manuscriptId: manuscript.id, detail: { round: number } })
    return { roundId, round: number }
  })
}
