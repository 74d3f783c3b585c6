import { z } from 'zod'
import type { Db } from '@/db/client'
import { AUDIENCES } from '@/lib/rules/words'
import { COMMENT_TARGETS } from '@/lib/rules/words'
import type { Actor } from '@/lib/rules/roles'

export const writeCommentInput = z.object({
  manuscriptId: z.string(),
  audience: z.enum(AUDIENCES),
  target: z.enum(COMMENT_TARGETS).default('whole'),
  targetKey: z.string().max(50).nullish(),
  targetLabel: z.string().trim().max(300).default(''),
  page: z.number().int().min(1).nullish(),
  boxes: z
    .array(z.tuple([z.number(), z.number(), z.number(), z.number()]))
    .max(100)
    .default([]),
  /** The comment it replies to. */
  parentId: z.string().nullish(),
  body: z.string().trim().min(1).max(10_000),
})

export type WriteCommentResult = { commentId: string }

export function writeComment(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof writeCommentInput>,
  _now: number,
): WriteCommentResult {
  throw new Error('not yet')
}
