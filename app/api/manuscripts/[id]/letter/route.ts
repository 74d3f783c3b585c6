import { getLetter } from '@/db/queries/letter'
import { composeLetterBody, composeLetterBodyInput } from '@/lib/desk/compose-letter-body'
import { getRound, readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { id: string }

/** The letter as it was sent. */
export const GET = route<Params>(({ request, db, actor, params }) =>
  getLetter(db, actor, params.id, getRound(request)),
)

/** The letter as it would be composed now; keeps nothing. */
export const POST = route<Params>(async ({ request, params, db, actor }) =>
  composeLetterBody(db, actor, await readInput(request, composeLetterBodyInput, { manuscriptId: params.id })),
)
