import { count, min } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { jobs } from '@/db/schema'
import type { JobStatus } from '@/lib/rules/words'

export type QueueDepth = { queued: number; running: number; failed: number; oldestQueuedAt: number | null }

/** How many jobs wait, run and were given up, and since when the longest waiting one is due. */
export function getQueueDepth(db: Reader): QueueDepth {
  const rows = db
    .select({ status: jobs.status, n: count(), oldest: min(jobs.runAt) })
    .from(jobs)
    .groupBy(jobs.status)
    .all()
  const of = (status: JobStatus) => rows.find((row) => row.status === status)
  return {
    queued: of('queued')?.n ?? 0,
    running: of('running')?.n ?? 0,
    failed: of('failed')?.n ?? 0,
    oldestQueuedAt: of('queued')?.oldest ?? null,
  }
}
