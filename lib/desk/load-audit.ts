import { desc, eq, sql } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { audits, manuscripts, rounds } from '@/db/schema'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import type { State } from '@/lib/rules/states'

const RENEWED: readonly State[] = ['assigned', 'in review', 'verdict drafted']

/**
 * For the worker: an audit, its manuscript, and whether it is the one the manuscript waits for. It is not when
 * the manuscript was withdrawn meanwhile, or another audit was asked for.
 */
export function loadAudit(tx: Reader, actor: Actor, auditId: string) {
  if (actor.kind !== 'system') throw refuseUnknown()
  const row = tx
    .select({
      status: audits.status,
      roundId: audits.roundId,
      round: rounds.number,
      manuscriptId: manuscripts.id,
      reference: manuscripts.reference,
      submitterId: manuscripts.submitterId,
      state: manuscripts.state,
    })
    .from(audits)
    .innerJoin(rounds, eq(rounds.id, audits.roundId))
    .innerJoin(manuscripts, eq(manuscripts.id, rounds.manuscriptId))
    .where(eq(audits.id, auditId))
    .get()
  if (!row) throw refuse('not-found', 'There is no such audit.')
  const newest = tx
    .select({ id: audits.id })
    .from(audits)
    .where(eq(audits.roundId, row.roundId))
    .orderBy(desc(audits.queuedAt), desc(sql`rowid`))
    .limit(1)
    .get()
  const ended = row.status === 'done' || row.status === 'stuck'
  const isNewest = newest?.id === auditId
  return {
    ...row,
    ended,
    awaited: row.state === 'received' && isNewest,
    // An audit made again while somebody reviews changes the points and not the state.
    renews: RENEWED.includes(row.state) && isNewest,
  }
}
