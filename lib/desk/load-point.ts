import { eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { points, rounds } from '@/db/schema'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { loadReview } from './load-manuscript'

/** A point of the round that the actor reviews now. */
export function loadPoint(tx: Reader, actor: Actor, pointId: string) {
  const point = tx
    .select({
      id: points.id,
      roundId: points.roundId,
      status: points.status,
      reason: points.reason,
      severity: points.severity,
      rule: points.rule,
      manuscriptId: rounds.manuscriptId,
    })
    .from(points)
    .innerJoin(rounds, eq(rounds.id, points.roundId))
    .where(eq(points.id, pointId))
    .get()
  if (!point) throw refuseUnknown()
  const { round } = loadReview(tx, actor, 'point.decide', point.manuscriptId)
  if (round.id !== point.roundId) throw refuse('conflict', 'This point belongs to an earlier round.')
  return point
}
