import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { comments } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadComment } from './load-comment'

export const resolveCommentInput = z.object({ commentId: z.string(), resolved: z.boolean() })

export type ResolveCommentResult = { commentId: string }

/** Marks a comment as settled, or as open again. A settled one does not enter the letter. */
export function resolveComment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof resolveCommentInput>,
  now: number,
): ResolveCommentResult {
  return transact(db, (tx) => {
    const { commentId, resolved } = input
    const comment = loadComment(tx, actor, commentId)
    tx.update(comments)
      .set(resolved ? { resolvedAt: now, resolvedBy: actor.id } : { resolvedAt: null, resolvedBy: null })
      .where(eq(comments.id, commentId))
      .run()
    recordEvent(tx, actor, 'comment resolved', now, {
      manuscriptId: comment.manuscriptId,
      subject: commentId,
      detail: { resolved },
    })
    return { commentId }
  })
}
