import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const sendVerdictBackInput = z.object({
  manuscriptId: z.string(),
  reason: z.string().trim().min(1).max(5000),
})

export type SendVerdictBackResult = { manuscriptId: string }

export function sendVerdictBack(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof sendVerdictBackInput>,
  _now: number,
): SendVerdictBackResult {
  throw new Error('not yet')
}
