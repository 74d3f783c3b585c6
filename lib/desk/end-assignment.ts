import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const endAssignmentInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().min(1).max(2000),
})

export type EndAssignmentResult = { manuscriptId: string }

export function endAssignment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof endAssignmentInput>,
  _now: number,
): EndAssignmentResult {
  throw new Error('not yet')
}
