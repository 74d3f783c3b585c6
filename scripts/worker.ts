import { randomBytes } from 'node:crypto'
import { hostname } from 'node:os'
import { openDb } from '@/db/client'
import { forgetOldTries } from '@/lib/desk/sign-in-tries'
import { removeStaleUploads } from '@/lib/intake/store/remove-stale-uploads'
import { runWorker } from '@/lib/jobs/run-worker'
import { log } from '@/lib/log'
import { getSettings } from '@/lib/settings'

/** How long a job may go on after the worker was told to stop; then it goes back into the queue. */
const grace = 10_000

const settings = getSettings()
const db = openDb(settings.database)
const stopping = new AbortController()
const stopped = new AbortController()

const stop = () => {
  if (stopping.signal.aborted) return stopped.abort()
  log.info('stopping')
  stopping.abort()
  setTimeout(() => stopped.abort(), grace).unref()
}
process.on('SIGTERM', stop).on('SIGINT', stop)

const removed = await removeStaleUploads(settings.uploads, Date.now())
forgetOldTries(db, Date.now())
if (removed > 0) log.info({ removed }, 'stale uploads')

const worker = `${hostname()}-${process.pid}-${randomBytes(4).toString('hex')}`
log.info({ worker }, 'working')
await runWorker({
  db,
  settings,
  clock: Date.now,
  worker,
  stopping: stopping.signal,
  stopped: stopped.signal,
})
db.$client.close()
log.info('stopped')
