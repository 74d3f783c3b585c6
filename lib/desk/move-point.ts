import { asc, eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { points } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadPoint } from './load-point'

export const movePointInput = z.object({
  pointId: z.string(),
  /** Where it shall stand among the points of its round, from 0; beyond the last one is last. */
  position: z.number().int().min(0),
})

export type MovePointResult = { pointId: string }

export function movePoint(
  db: Db,
  actor: Actor,
  input: z.infer<typeof movePointInput>,
  now: number,
): MovePointResult {
  return transact(db, (tx) => {
    const { pointId, position } = input
    const point = loadPoint(tx, actor, pointId)
    const ids = tx
      .select({ id: points.id })
      .from(points)
      .where(eq(points.roundId, point.roundId))
      .orderBy(asc(points.position), asc(points.id))
      .all()
      .map(({ id }) => id)
    const order = ids.filter((id) => id !== pointId)
    order.splice(position, 0, pointId)
    for (const [index, id] of order.entries()) {
      if (ids[index] === id) continue
      tx.update(points).set({ position: index }).where(eq(points.id, id)).run()
    }
    recordEvent(tx, actor, 'point decided', now, {
      manuscriptId: point.manuscriptId,
      subject: pointId,
      detail: { rule: point.rule, position },
    })
    return { pointId }
  })
}
