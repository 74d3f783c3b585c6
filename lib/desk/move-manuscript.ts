import { eq } from 'drizzle-orm'
import type { Tx } from '@/db/client'
import { manuscripts } from '@/db/schema'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { canMove, MOVES, type MoveName } from '@/lib/rules/states'
import { requireOnManuscript } from './permission'

/** Makes one move of the table of states, or refuses: who may make it and from where is in the table alone. */
export function moveManuscript(
  tx: Tx,
  actor: Actor,
  manuscriptId: string,
  move: MoveName,
  now: number,
): void {
  const { by, to } = MOVES[move]
  if (by === 'system') {
    if (actor.kind !== 'system') throw refuse('forbidden', 'Only the system makes this change.')
  } else {
    requireOnManuscript(tx, actor, by, manuscriptId)
  }
  const row = tx
    .select({ state: manuscripts.state })
    .from(manuscripts)
    .where(eq(manuscripts.id, manuscriptId))
    .get()
  if (!row) throw refuseUnknown()
  if (!canMove(move, row.state)) {
    throw refuse('conflict', `The manuscript is “${row.state}” by now; please reload the page.`)
  }
  tx.update(manuscripts).set({ state: to, stateSince: now }).where(eq(manuscripts.id, manuscriptId)).run()
}
