import { getAudit } from '@/db/queries/audit'
import { runAuditAgain } from '@/lib/desk/run-audit-again'
import { getRound } from '@/lib/web/parse'
import { requireSeen } from '@/lib/web/require-seen'
import { answerJson, route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ request, db, actor, params }) => {
  requireSeen(db, actor, params.id, 'audit.follow')
  return answerJson(getAudit(db, actor, params.id, getRound(request)))
})

/** Runs the audit again. */
export const POST = route<Params>(({ db, actor, params, now }) =>
  runAuditAgain(db, actor, { manuscriptId: params.id }, now),
)
