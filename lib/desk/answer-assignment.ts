import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const answerAssignmentInput = z.object({
  manuscriptId: z.string(),
  accept: z.boolean(),
  /** Needed to decline. */
  reason: z.string().trim().max(2000).default(''),
  /** Declining because of a conflict of interest: declares it at once. */
  conflict: z.boolean().default(false),
})

export type AnswerAssignmentResult = { manuscriptId: string; accepted: boolean }

export function answerAssignment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof answerAssignmentInput>,
  _now: number,
): AnswerAssignmentResult {
  throw new Error('not yet')
}
