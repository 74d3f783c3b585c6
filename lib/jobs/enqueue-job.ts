import type { Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { jobs } from '@/db/schema'
import type { JobKind } from '@/lib/rules/words'

const maxAttempts: Record<JobKind, number> = { 'run-audit': 3, 'send-mail': 8 }

/** Puts a job in the queue, in the transaction of what causes it. */
export function enqueueJob(tx: Tx, kind: JobKind, subjectId: string, now: number): void {
  tx.insert(jobs)
    .values({
      id: newId('job'),
      kind,
      subjectId,
      status: 'queued',
      maxAttempts: maxAttempts[kind],
      runAt: now,
      createdAt: now,
    })
    .run()
}
