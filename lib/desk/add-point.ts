import { count, eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { points } from '@/db/schema'
import { SEVERITIES } from '@/lib/checks/vocabulary'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadReview } from './load-manuscript'

export const addPointInput = z.object({
  manuscriptId: z.string(),
  severity: z.enum(SEVERITIES),
  says: z.string().trim().max(5000).default(''),
  asks: z.string().trim().min(1, 'Please say what the authors are asked for.').max(5000),
  familyKey: z.string().nullish(),
  familyLabel: z.string().trim().max(300).default(''),
  quote: z.string().trim().max(2000).default(''),
  page: z.number().int().min(1).nullish(),
})

export type AddPointResult = { pointId: string }

/** A point that the audit did not raise, kept for the letter from the start. */
export function addPoint(
  db: Db,
  actor: Actor,
  input: z.infer<typeof addPointInput>,
  now: number,
): AddPointResult {
  return transact(db, (tx) => {
    const { manuscriptId, severity, says, asks, familyKey, familyLabel, quote, page } = input
    const { round } = loadReview(tx, actor, 'point.decide', manuscriptId)
    const there = tx.select({ n: count() }).from(points).where(eq(points.roundId, round.id)).get()
    const pointId = newId('point')
    tx.insert(points)
      .values({
        id: pointId,
        roundId: round.id,
        familyKey: familyKey ?? null,
        familyLabel,
        status: 'kept',
        severity,
        says,
        asks,
        quote,
        page: page ?? null,
        cites: [],
        position: there?.n ?? 0,
        decidedBy: actor.id,
        decidedAt: now,
      })
      .run()
    recordEvent(tx, actor, 'point added', now, { manuscriptId, subject: pointId, detail: { severity } })
    return { pointId }
  })
}
