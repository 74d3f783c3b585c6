import { withdrawManuscript, withdrawManuscriptInput } from '@/lib/desk/withdraw-manuscript'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(async ({ request, params, db, actor, now }) =>
  withdrawManuscript(
    db,
    actor,
    await readInput(request, withdrawManuscriptInput, { manuscriptId: params.id }),
    now,
  ),
)
