import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { points } from '@/db/schema'
import { SEVERITIES } from '@/lib/checks/vocabulary'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { POINT_STATUSES } from '@/lib/rules/words'
import { loadPoint } from './load-point'

export const decidePointInput = z.object({
  pointId: z.string(),
  status: z.enum(POINT_STATUSES),
  reason: z.string().trim().max(2000).optional(),
  severity: z.enum(SEVERITIES).optional(),
  asks: z.string().trim().min(1, 'Please say what the authors are asked for.').max(5000).optional(),
})

export type DecidePointResult = { pointId: string }

/** Keeps a point for the letter, drops it, or opens it again; its severity and wording can change with it. */
export function decidePoint(
  db: Db,
  actor: Actor,
  input: z.infer<typeof decidePointInput>,
  now: number,
): DecidePointResult {
  return transact(db, (tx) => {
    const { pointId, status, reason, severity, asks } = input
    const point = loadPoint(tx, actor, pointId)
    const decision =
      status === 'open' ? { decidedBy: null, decidedAt: null } : { decidedBy: actor.id, decidedAt: now }
    tx.update(points)
      .set({ status, reason, severity, asks, ...decision })
      .where(eq(points.id, pointId))
      .run()
    recordEvent(tx, actor, 'point decided', now, {
      manuscriptId: point.manuscriptId,
      subject: pointId,
      detail: {
        rule: point.rule,
        status,
        from: point.status,
        severity: severity ?? point.severity,
        reworded: asks !== undefined,
      },
    })
    return { pointId }
  })
}
