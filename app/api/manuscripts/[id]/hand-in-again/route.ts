import { handInAgain } from '@/lib/desk/hand-in-again'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(({ params, db, actor, now }) =>
  handInAgain(db, actor, { manuscriptId: params.id }, now),
)
