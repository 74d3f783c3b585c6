import { getVerdict } from '@/db/queries/verdict'
import { draftVerdict, draftVerdictInput } from '@/lib/desk/draft-verdict'
import { getRound, readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ request, db, actor, params }) =>
  getVerdict(db, actor, params.id, getRound(request)),
)

export const PUT = route<Params>(async ({ request, params, db, actor, now }) =>
  draftVerdict(db, actor, await readInput(request, draftVerdictInput, { manuscriptId: params.id }), now),
)
