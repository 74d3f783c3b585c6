import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { comments } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { AUDIENCES } from '@/lib/rules/words'
import { loadComment } from './load-comment'

export const changeCommentInput = z.object({
  commentId: z.string(),
  body: z.string().trim().min(1, 'Please write something.').max(10_000),
  audience: z.enum(AUDIENCES).optional(),
})

export type ChangeCommentResult = { commentId: string }

/** One's own comment only, and not what the authors have been sent. */
export function changeComment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof changeCommentInput>,
  now: number,
): ChangeCommentResult {
  return transact(db, (tx) => {
    const { commentId, body, audience } = input
    const comment = loadComment(tx, actor, commentId)
    if (!comment.own) throw refuse('conflict', 'Only who wrote a comment changes it.')
    if (comment.audience === 'authors' && comment.verdictStatus === 'released') {
      throw refuse('conflict', 'The authors have been sent this comment; please write another.')
    }
    tx.update(comments).set({ body, audience, changedAt: now }).where(eq(comments.id, commentId)).run()
    recordEvent(tx, actor, 'comment changed', now, {
      manuscriptId: comment.manuscriptId,
      subject: commentId,
      detail: { audience: audience ?? comment.audience },
    })
    return { commentId }
  })
}
