import { listReviewers } from '@/db/queries/reviewers'
import { route } from '@/lib/web/route'

export const GET = route(({ request, db, actor, now }) =>
  listReviewers(db, actor, new URL(request.url).searchParams.getAll('manuscriptIds').slice(0, 200), now),
)
