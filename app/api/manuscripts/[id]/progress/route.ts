import { getAuditProgress } from '@/db/queries/audit-progress'
import { requireSeen } from '@/lib/web/require-seen'
import { answerJson, route } from '@/lib/web/route'

export const GET = route<{ id: string }>(({ db, actor, params }) => {
  requireSeen(db, actor, params.id, 'audit.follow')
  return answerJson(getAuditProgress(db, actor, params.id))
})
