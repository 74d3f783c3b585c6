import { listComments } from '@/db/queries/comments'
import { writeComment, writeCommentInput } from '@/lib/desk/write-comment'
import { getRound, readInput } from '@/lib/web/parse'
import { requireSeen } from '@/lib/web/require-seen'
import { route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ request, db, actor, params }) => {
  requireSeen(db, actor, params.id, 'comment.read')
  return listComments(db, actor, params.id, getRound(request))
})

export const POST = route<Params>(async ({ request, params, db, actor, now }) =>
  writeComment(db, actor, await readInput(request, writeCommentInput, { manuscriptId: params.id }), now),
)
