import { liftConflict } from '@/lib/desk/lift-conflict'
import { route } from '@/lib/web/route'

export const DELETE = route<{ conflictId: string }>(({ params, db, actor, now }) =>
  liftConflict(db, actor, { conflictId: params.conflictId }, now),
)
