import { changeComment, changeCommentInput } from '@/lib/desk/change-comment'
import { resolveComment, resolveCommentInput } from '@/lib/desk/resolve-comment'
import { parse, readObject } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

/** With `resolved` it settles the comment or opens it again, else it changes its text or audience. */
export const PATCH = route<{ id: string; commentId: string }>(async ({ request, params, db, actor, now }) => {
  const input = { ...(await readObject(request)), commentId: params.commentId }
  return 'resolved' in input
    ? resolveComment(db, actor, parse(resolveCommentInput, input), now)
    : changeComment(db, actor, parse(changeCommentInput, input), now)
})
