import type { CommentRow } from '@/db/queries/comments'

export type Thread = { first: CommentRow; replies: CommentRow[] }

/** Comments with what was replied to them, oldest first; a reply whose comment is not seen stands by itself. */
export function makeThreads(comments: readonly CommentRow[]): Thread[] {
  const seen = new Set(comments.map((comment) => comment.id))
  const isReply = (comment: CommentRow) => comment.parentId !== null && seen.has(comment.parentId)
  return comments
    .filter((comment) => !isReply(comment))
    .map((first) => ({ first, replies: comments.filter((comment) => comment.parentId === first.id) }))
}
