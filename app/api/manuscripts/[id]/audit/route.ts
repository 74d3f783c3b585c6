import { getAudit } from '@/db/queries/audit'
import { runAuditAgain } from '@/lib/desk/run-audit-again'
import { getRound } from '@/lib/web/parse'
import { answerJson, route } from '@/lib/web/route'

type Params = { id: string }

export const GET = route<Params>(({ request, db, actor, params }) =>
  answerJson(getAudit(db, actor, params.id, getRound(request))),
)

/** Runs the audit again. */
export const POST = route<Params>(({ db, actor, params, now }) =>
  runAuditAgain(db, actor, { manuscriptId: params.id }, now),
)
