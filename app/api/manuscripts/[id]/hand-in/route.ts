import { handIn } from '@/lib/desk/hand-in'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(({ params, db, actor, now }) =>
  handIn(db, actor, { manuscriptId: params.id }, now),
)
