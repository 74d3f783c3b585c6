import { declareConflict, declareConflictInput } from '@/lib/desk/declare-conflict'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(async ({ request, params, db, actor, now }) =>
  declareConflict(
    db,
    actor,
    await readInput(request, declareConflictInput, { manuscriptId: params.id }),
    now,
  ),
)
