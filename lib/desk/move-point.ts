import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const movePointInput = z.object({
  pointId: z.string(),
  /** Where it shall stand among the points of its round, from 0. */
  position: z.number().int().min(0),
})

export type MovePointResult = { pointId: string }

export function movePoint(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof movePointInput>,
  _now: number,
): MovePointResult {
  throw new Error('not yet')
}
