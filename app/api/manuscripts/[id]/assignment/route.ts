import { answerAssignment, answerAssignmentInput } from '@/lib/desk/answer-assignment'
import { endAssignment, endAssignmentInput } from '@/lib/desk/end-assignment'
import { offerAssignment, offerAssignmentInput } from '@/lib/desk/offer-assignment'
import { parse, readInput, readObject } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { id: string }

/** Offers it to a reviewer. */
export const POST = route<Params>(async ({ request, params, db, actor, now }) => {
  const input = parse(offerAssignmentInput, { ...(await readObject(request)), manuscriptIds: [params.id] })
  return offerAssignment(db, actor, input, now)
})

/** The reviewer's answer. */
export const PATCH = route<Params>(async ({ request, params, db, actor, now }) =>
  answerAssignment(
    db,
    actor,
    await readInput(request, answerAssignmentInput, { manuscriptId: params.id }),
    now,
  ),
)

export const DELETE = route<Params>(async ({ request, params, db, actor, now }) =>
  endAssignment(db, actor, await readInput(request, endAssignmentInput, { manuscriptId: params.id }), now),
)
