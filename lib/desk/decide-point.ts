import { z } from 'zod'
import type { Db } from '@/db/client'
import { POINT_STATUSES } from '@/lib/rules/words'
import { SEVERITIES } from '@/lib/checks/vocabulary'
import type { Actor } from '@/lib/rules/roles'

export const decidePointInput = z.object({
  pointId: z.string(),
  status: z.enum(POINT_STATUSES),
  reason: z.string().trim().max(2000).optional(),
  severity: z.enum(SEVERITIES).optional(),
  asks: z.string().trim().min(1).max(5000).optional(),
})

export type DecidePointResult = { pointId: string }

export function decidePoint(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof decidePointInput>,
  _now: number,
): DecidePointResult {
  throw new Error('not yet')
}
