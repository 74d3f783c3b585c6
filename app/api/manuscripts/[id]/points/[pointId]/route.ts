import { decidePoint, decidePointInput } from '@/lib/desk/decide-point'
import { movePoint, movePointInput } from '@/lib/desk/move-point'
import { writeAnswer, writeAnswerInput } from '@/lib/desk/write-answer'
import { parse, readInput, readObject } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { id: string; pointId: string }

/** With a position it moves the point, else it decides on it. */
export const PATCH = route<Params>(async ({ request, params, db, actor, now }) => {
  const input = { ...(await readObject(request)), pointId: params.pointId }
  return 'position' in input
    ? movePoint(db, actor, parse(movePointInput, input), now)
    : decidePoint(db, actor, parse(decidePointInput, input), now)
})

/** The authors' answer to it. */
export const PUT = route<Params>(async ({ request, params, db, actor, now }) =>
  writeAnswer(db, actor, await readInput(request, writeAnswerInput, { pointId: params.pointId }), now),
)
