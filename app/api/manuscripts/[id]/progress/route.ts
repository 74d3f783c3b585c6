import { getAuditProgress } from '@/db/queries/audit-progress'
import { answerJson, route } from '@/lib/web/route'

export const GET = route<{ id: string }>(({ db, actor, params }) =>
  answerJson(getAuditProgress(db, actor, params.id)),
)
