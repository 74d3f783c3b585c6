import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const declareConflictInput = z.object({
  manuscriptId: z.string(),
  /** Whose; one's own without it. Only an editor declares another's. */
  personId: z.string().optional(),
  reason: z.string().trim().min(1).max(2000),
})

export type DeclareConflictResult = { conflictId: string; steppedAside: boolean }

export function declareConflict(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof declareConflictInput>,
  _now: number,
): DeclareConflictResult {
  throw new Error('not yet')
}
