import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const changeDraftInput = z.object({
  manuscriptId: z.string(),
  title: z.string().trim().max(500).optional(),
  correspondingAuthor: z.string().trim().max(200).optional(),
  correspondingEmail: z.union([z.literal(''), z.email()]).optional(),
  alpha: z.coerce.number().gt(0).lt(1).nullable().optional(),
  correction: z.string().trim().max(5000).optional(),
  primaryOutcome: z.string().trim().max(1000).optional(),
  note: z.string().trim().max(5000).optional(),
})

export type ChangeDraftResult = { manuscriptId: string }

/** Saves what was filled in so far: of the draft, or of a revision that is begun. What is absent stays. */
export function changeDraft(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof changeDraftInput>,
  _now: number,
): ChangeDraftResult {
  throw new Error('not yet')
}
