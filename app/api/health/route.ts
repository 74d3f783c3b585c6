import { getDb } from '@/db/current'
import { getQueueDepth } from '@/db/queries/queue-depth'
import { answerProblem, makeProblem, logUnknown } from '@/lib/web/problem'
import { answerJson } from '@/lib/web/route'

export const dynamic = 'force-dynamic'

/** For whoever watches the installation: asks no sign-in and names nothing. */
export function GET(): Response {
  try {
    return answerJson({ ok: true, queue: getQueueDepth(getDb()) })
  } catch (error) {
    return answerProblem(
      makeProblem('unavailable', 503, `The database does not answer (${logUnknown(error)}).`),
    )
  }
}
