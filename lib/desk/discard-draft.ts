import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const discardDraftInput = z.object({ manuscriptId: z.string() })

export type DiscardDraftResult = { manuscriptId: string }

export function discardDraft(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof discardDraftInput>,
  _now: number,
): DiscardDraftResult {
  throw new Error('not yet')
}
