import { randomBytes } from 'node:crypto'
import type { Db } from '@/db/client'
import type { JobKind } from '@/lib/rules/words'
import type { Settings } from '@/lib/settings'
import { claimJob } from './claim-job'
import { workJob } from './work-job'

/** Does every job of a kind that is due, one after the other, in this process; returns how many. */
export async function runDueJobs(
  db: Db,
  settings: Settings,
  kind: JobKind,
  clock: () => number = Date.now,
): Promise<number> {
  const claim = { kind, worker: `here-${randomBytes(4).toString('hex')}`, lease: settings.leaseMilliseconds }
  const { signal } = new AbortController()
  let done = 0
  for (let job = claimJob(db, claim, clock()); job; job = claimJob(db, claim, clock())) {
    await workJob(job, { db, settings, clock, signal })
    done++
  }
  return done
}
