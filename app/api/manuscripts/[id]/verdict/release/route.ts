import { releaseVerdict } from '@/lib/desk/release-verdict'
import { route } from '@/lib/web/route'

export const POST = route<{ id: string }>(({ params, db, actor, now }) =>
  releaseVerdict(db, actor, { manuscriptId: params.id }, now),
)
