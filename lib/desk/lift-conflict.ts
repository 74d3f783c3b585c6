import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const liftConflictInput = z.object({ conflictId: z.string() })

export type LiftConflictResult = { manuscriptId: string }

export function liftConflict(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof liftConflictInput>,
  _now: number,
): LiftConflictResult {
  throw new Error('not yet')
}
