import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { comments } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { AUDIENCES, COMMENT_TARGETS } from '@/lib/rules/words'
import { loadComment } from './load-comment'
import { getRoundRow, loadManuscript, refuseState } from './load-manuscript'

export const writeCommentInput = z.object({
  manuscriptId: z.string(),
  audience: z.enum(AUDIENCES),
  target: z.enum(COMMENT_TARGETS).default('whole'),
  /** Key of the family, finding or report within the audit. */
  targetKey: z.string().max(50).nullish(),
  targetLabel: z.string().trim().max(300).default(''),
  page: z.number().int().min(1).nullish(),
  boxes: z
    .array(z.tuple([z.number(), z.number(), z.number(), z.number()]))
    .max(100)
    .default([]),
  /** The comment it replies to. */
  parentId: z.string().nullish(),
  body: z.string().trim().min(1, 'Please write something.').max(10_000),
})

export type WriteCommentResult = { commentId: string }

/** Comments on the round that is under review. A manuscript that is closed or withdrawn takes no more. */
export function writeComment(
  db: Db,
  actor: Actor,
  input: z.infer<typeof writeCommentInput>,
  now: number,
): WriteCommentResult {
  return transact(db, (tx) => {
    const manuscript = loadManuscript(tx, actor, 'comment.write', input.manuscriptId)
    if (manuscript.state === 'closed' || manuscript.state === 'withdrawn') throw refuseState(manuscript.state)
    const round = getRoundRow(tx, manuscript)
    if (input.parentId != null) {
      const parent = loadComment(tx, actor, input.parentId)
      if (parent.roundId !== round.id) throw refuse('conflict', 'This comment belongs to an earlier round.')
    }
    const { audience, target, targetLabel, boxes, body } = input
    const commentId = newId('comment')
    tx.insert(comments)
      .values({
        id: commentId,
        roundId: round.id,
        authorId: actor.id,
        audience,
        target,
        targetKey: input.targetKey ?? null,
        targetLabel,
        page: input.page ?? null,
        boxes,
        parentId: input.parentId ?? null,
        body,
        createdAt: now,
      })
      .run()
    recordEvent(tx, actor, 'comment written', now, {
      manuscriptId: manuscript.id,
      subject: commentId,
      detail: { audience, target },
    })
    return { commentId }
  })
}
