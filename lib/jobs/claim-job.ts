import { and, eq, sql } from 'drizzle-orm'
import type { Db, Reader } from '@/db/client'
import { jobs } from '@/db/schema'
import type { JobKind } from '@/lib/rules/words'

export type ClaimedJob = {
  id: string
  kind: JobKind
  subjectId: string
  /** This one included. */
  attempts: number
  maxAttempts: number
  leasedBy: string
}

type Claim = { kind: JobKind; worker: string; lease: number }

/**
 * Takes the job of a kind that has been due longest: one that waits, or one whose worker let its lease run
 * out. One statement, so that two workers cannot take the same.
 */
export function claimJob(db: Db, { kind, worker, lease }: Claim, now: number): ClaimedJob | null {
  const due = sql`(
    select id from ${jobs}
    where kind = ${kind} and (
      (status = 'queued' and run_at <= ${now}) or (status = 'running' and lease_until <= ${now})
    )
    order by run_at, created_at, id limit 1
  )`
  const job = db
    .update(jobs)
    .set({
      status: 'running',
      attempts: sql`${jobs.attempts} + 1`,
      leasedBy: worker,
      leaseUntil: now + lease,
    })
    .where(eq(jobs.id, due))
    .returning({
      id: jobs.id,
      kind: jobs.kind,
      subjectId: jobs.subjectId,
      attempts: jobs.attempts,
      maxAttempts: jobs.maxAttempts,
    })
    .get()
  return job ? { ...job, leasedBy: worker } : null
}

/** Prolongs the lease; false where the job is another worker's by now. */
export function extendLease(db: Db, job: ClaimedJob, lease: number, now: number): boolean {
  return change(db, job, { leaseUntil: now + lease })
}

export function finishJob(db: Reader, job: ClaimedJob, now: number): boolean {
  return change(db, job, { status: 'done', finishedAt: now, trouble: null, ...free })
}

/** Puts a job back into the queue; `counted` is false where the try does not count, as when a worker is stopped. */
export function returnJob(
  db: Reader,
  job: ClaimedJob,
  { runAt, trouble, counted }: { runAt: number; trouble: string | null; counted: boolean },
): boolean {
  const attempts = counted ? job.attempts : job.attempts - 1
  return change(db, job, { status: 'queued', runAt, trouble, attempts, ...free })
}

export function failJob(db: Reader, job: ClaimedJob, trouble: string, now: number): boolean {
  return change(db, job, { status: 'failed', finishedAt: now, trouble, ...free })
}

const free = { leasedBy: null, leaseUntil: null }

/** Changes a job only while this claim on it holds: same worker, same try. */
function change(db: Reader, job: ClaimedJob, to: Partial<typeof jobs.$inferInsert>): boolean {
  const { changes } = db
    .update(jobs)
    .set(to)
    .where(
      and(
        eq(jobs.id, job.id),
        eq(jobs.status, 'running'),
        eq(jobs.leasedBy, job.leasedBy),
        eq(jobs.attempts, job.attempts),
      ),
    )
    .run()
  return changes === 1
}
