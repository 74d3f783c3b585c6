import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const offerAssignmentInput = z.object({
  manuscriptIds: z.array(z.string()).min(1).max(200),
  reviewerId: z.string(),
  /** End of the review; without it the house rules' days from now. */
  dueAt: z.number().int().nullish(),
})

export type OfferAssignmentResult = { assignmentIds: string[] }

export function offerAssignment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof offerAssignmentInput>,
  _now: number,
): OfferAssignmentResult {
  throw new Error('not yet')
}
