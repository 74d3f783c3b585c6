import { createDraft, createDraftInput } from '@/lib/desk/create-draft'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const POST = route(async ({ request, db, actor, now }) =>
  createDraft(db, actor, await readInput(request, createDraftInput), now),
)
