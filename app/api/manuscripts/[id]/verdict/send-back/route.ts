import { sendVerdictBack, sendVerdictBackInput } from '@/lib/desk/send-verdict-back'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(async ({ request, params, db, actor, now }) =>
  sendVerdictBack(
    db,
    actor,
    await readInput(request, sendVerdictBackInput, { manuscriptId: params.id }),
    now,
  ),
)
