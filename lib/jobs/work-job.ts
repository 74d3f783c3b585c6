import { transact, type Db } from '@/db/client'
import { describeError, log } from '@/lib/log'
import type { Settings } from '@/lib/settings'
import { extendLease, failJob, finishJob, returnJob, type ClaimedJob } from './claim-job'
import { isHopeless, type JobRow } from './kind'
import { kinds } from './kinds'

export type Working = {
  db: Db
  settings: Settings
  clock: () => number
  /** Aborted when the worker must stop now. */
  signal: AbortSignal
}

/**
 * Does one claimed job. What it leads to is written in the one transaction that also marks it done, and only
 * while the claim holds: a job whose lease ran out in between is another worker's, and nothing is written.
 */
export async function workJob(job: ClaimedJob, working: Working): Promise<void> {
  const { db, settings, clock } = working
  const kind: JobRow = kinds[job.kind]
  if (job.attempts > job.maxAttempts) {
    return endFailed(job, kind, 'The worker ended while at it, again and again.', working)
  }
  const lost = new AbortController()
  const lease = settings.leaseMilliseconds
  const heartbeat = setInterval(() => {
    if (!extendLease(db, job, lease, clock())) lost.abort(new Error('the lease was lost'))
  }, lease / 3)
  try {
    const signal = AbortSignal.any([lost.signal, working.signal])
    const write = await kind.run({ db, settings, clock, signal, subjectId: job.subjectId })
    const kept = transact(db, () => {
      if (!finishJob(db, job, clock())) return false
      write(clock())
      return true
    })
    log.info({ job: job.id, kind: job.kind, kept }, 'job done')
  } catch (error) {
    if (lost.signal.aborted) log.warn({ job: job.id, kind: job.kind }, 'job lost')
    else if (working.signal.aborted) returnUncounted(job, working)
    else endTry(job, kind, error, working)
  } finally {
    clearInterval(heartbeat)
  }
}

function returnUncounted(job: ClaimedJob, { db, clock }: Working): void {
  returnJob(db, job, { runAt: clock(), trouble: null, counted: false })
  log.info({ job: job.id, kind: job.kind }, 'job returned')
}

function endTry(job: ClaimedJob, kind: JobRow, error: unknown, working: Working): void {
  const { message: trouble } = describeError(error)
  log.error({ err: error, job: job.id, kind: job.kind, attempt: job.attempts }, 'job trouble')
  if (isHopeless(error) || job.attempts >= job.maxAttempts) return endFailed(job, kind, trouble, working)
  const { db, clock } = working
  const now = clock()
  transact(db, () => {
    const returned = returnJob(db, job, { runAt: now + kind.backoff(job.attempts), trouble, counted: true })
    if (returned) kind.onTrouble(db, job.subjectId, { trouble, final: false }, now)
  })
}

function endFailed(job: ClaimedJob, kind: JobRow, trouble: string, { db, clock }: Working): void {
  const now = clock()
  transact(db, () => {
    if (failJob(db, job, trouble, now)) kind.onTrouble(db, job.subjectId, { trouble, final: true }, now)
  })
}
