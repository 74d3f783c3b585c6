import { getManuscript } from '@/db/queries/manuscript'
import { changeDraft, changeDraftInput } from '@/lib/desk/change-draft'
import { discardDraft } from '@/lib/desk/discard-draft'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ db, actor, params }) => getManuscript(db, actor, params.id))

export const PATCH = route<Params>(async ({ request, params, db, actor, now }) =>
  changeDraft(db, actor, await readInput(request, changeDraftInput, { manuscriptId: params.id }), now),
)

export const DELETE = route<Params>(({ params, db, actor, now }) =>
  discardDraft(db, actor, { manuscriptId: params.id }, now),
)
