import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const createDraftInput = z.object({
  title: z.string().trim().max(500).default(''),
})

export type CreateDraftResult = { manuscriptId: string }

/** Begins a manuscript: a draft with its first round, seen by nobody else. */
export function createDraft(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof createDraftInput>,
  _now: number,
): CreateDraftResult {
  throw new Error('not yet')
}
