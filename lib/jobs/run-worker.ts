import { setTimeout as wait } from 'node:timers/promises'
import { JOB_KINDS, type JobKind } from '@/lib/rules/words'
import { log } from '@/lib/log'
import { claimJob } from './claim-job'
import { workJob, type Working } from './work-job'

type Loop = Omit<Working, 'signal'> & {
  /** Unlike any other worker's that is alive. */
  worker: string
  /** Aborted when no new job is to be begun. */
  stopping: AbortSignal
  /** Aborted when a job that is under way is to be returned. */
  stopped: AbortSignal
}

const idle = 500

/** Works until it is told to stop. Each kind has its own lane, so that no mail waits for an audit. */
export async function runWorker(loop: Loop): Promise<void> {
  await Promise.all(JOB_KINDS.map((kind) => runLane(kind, loop)))
}

async function runLane(kind: JobKind, loop: Loop): Promise<void> {
  const { db, settings, clock, worker, stopping, stopped } = loop
  while (!stopping.aborted) {
    try {
      const job = claimJob(db, { kind, worker, lease: settings.leaseMilliseconds }, clock())
      if (job) await workJob(job, { db, settings, clock, signal: stopped })
      else await rest(stopping)
    } catch (error) {
      // Such as a database that was locked for too long: the job's lease runs out, and it is tried again.
      log.error({ err: error, kind }, 'lane')
      await rest(stopping)
    }
  }
}

async function rest(stopping: AbortSignal): Promise<void> {
  await wait(idle, undefined, { signal: stopping }).catch((error: unknown) => {
    if (!stopping.aborted) throw error
  })
}
