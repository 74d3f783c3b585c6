import { listPoints } from '@/db/queries/points'
import { addPoint, addPointInput } from '@/lib/desk/add-point'
import { getRound, readInput } from '@/lib/web/parse'
import { requireSeen } from '@/lib/web/require-seen'
import { route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ request, db, actor, params }) => {
  requireSeen(db, actor, params.id)
  return listPoints(db, actor, params.id, getRound(request))
})

export const POST = route<Params>(async ({ request, params, db, actor, now }) =>
  addPoint(db, actor, await readInput(request, addPointInput, { manuscriptId: params.id }), now),
)
