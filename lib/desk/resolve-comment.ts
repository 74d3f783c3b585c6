import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const resolveCommentInput = z.object({ commentId: z.string(), resolved: z.boolean() })

export type ResolveCommentResult = { commentId: string }

export function resolveComment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof resolveCommentInput>,
  _now: number,
): ResolveCommentResult {
  throw new Error('not yet')
}
