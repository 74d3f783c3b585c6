import { z } from 'zod'
import type { Db } from '@/db/client'
import { AUDIENCES } from '@/lib/rules/words'
import type { Actor } from '@/lib/rules/roles'

export const changeCommentInput = z.object({
  commentId: z.string(),
  body: z.string().trim().min(1).max(10_000),
  audience: z.enum(AUDIENCES).optional(),
})

export type ChangeCommentResult = { commentId: string }

export function changeComment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof changeCommentInput>,
  _now: number,
): ChangeCommentResult {
  throw new Error('not yet')
}
