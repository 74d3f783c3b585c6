import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const writeAnswerInput = z.object({
  pointId: z.string(),
  body: z.string().trim().min(1).max(10_000),
})

export type WriteAnswerResult = { answerId: string }

export function writeAnswer(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof writeAnswerInput>,
  _now: number,
): WriteAnswerResult {
  throw new Error('not yet')
}
