import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const withdrawManuscriptInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().max(2000).default(''),
})

export type WithdrawManuscriptResult = { manuscriptId: string }

export function withdrawManuscript(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof withdrawManuscriptInput>,
  _now: number,
): WithdrawManuscriptResult {
  throw new Error('not yet')
}
