import type { Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { audits } from '@/db/schema'
import { enqueueJob } from '@/lib/jobs/enqueue-job'

/** Asks for an audit of a round; the worker takes it from the queue. */
export function queueAudit(tx: Tx, roundId: string, now: number): string {
  const id = newId('audit')
  tx.insert(audits).values({ id, roundId, status: 'queued', queuedAt: now }).run()
  enqueueJob(tx, 'run-audit', id, now)
  return id
}
