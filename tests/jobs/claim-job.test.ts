import { expect, test } from 'vitest'
import { transact, type Db } from '@/db/client'
import { jobs } from '@/db/schema'
import { claimJob, extendLease, failJob, finishJob, returnJob } from '@/lib/jobs/claim-job'
import { enqueueJob } from '@/lib/jobs/enqueue-job'
import { makeDb } from '../support/db'

const lease = 1000
const enqueue = (db: Db, subject: string, now: number) =>
  transact(db, (tx) => enqueueJob(tx, 'send-mail', subject, now))
const claim = (db: Db, worker: string, now: number) => claimJob(db, { kind: 'send-mail', worker, lease }, now)

function claimed(db: Db, worker: string, now: number) {
  const job = claim(db, worker, now)
  if (!job) throw new Error('nothing to claim')
  return job
}

test('the job that has been due longest is claimed first, each by one worker', () => {
  const db = makeDb()
  enqueue(db, 'later', 20)
  enqueue(db, 'first', 10)
  expect(claim(db, 'a', 30)).toMatchObject({ subjectId: 'first', attempts: 1, leasedBy: 'a' })
  expect(claim(db, 'b', 30)).toMatchObject({ subjectId: 'later' })
  expect(claim(db, 'c', 30)).toBeNull()
})

test('a job is not claimed before it is due, nor by a lane of another kind', () => {
  const db = makeDb()
  enqueue(db, 'one', 50)
  expect(claim(db, 'a', 49)).toBeNull()
  expect(claimJob(db, { kind: 'run-audit', worker: 'a', lease }, 60)).toBeNull()
  expect(claim(db, 'a', 50)).not.toBeNull()
})

test('a lease that runs out gives the job to another, and the first can do nothing more with it', () => {
  const db = makeDb()
  enqueue(db, 'one', 0)
  const first = claimed(db, 'a', 0)
  expect(claim(db, 'b', lease - 1)).toBeNull()
  const second = claimed(db, 'b', lease)
  expect(second.attempts).toBe(2)
  expect(extendLease(db, first, lease, lease)).toBe(false)
  expect(finishJob(db, first, lease)).toBe(false)
  expect(failJob(db, first, 'late', lease)).toBe(false)
  expect(returnJob(db, first, { runAt: 0, trouble: null, counted: true })).toBe(false)
  expect(finishJob(db, second, lease + 1)).toBe(true)
})

test('the same worker that claims a job anew cannot end its older try', () => {
  const db = makeDb()
  enqueue(db, 'one', 0)
  const first = claimed(db, 'a', 0)
  claimed(db, 'a', lease)
  expect(finishJob(db, first, lease)).toBe(false)
})

test('a heartbeat prolongs the lease', () => {
  const db = makeDb()
  enqueue(db, 'one', 0)
  const job = claimed(db, 'a', 0)
  expect(extendLease(db, job, lease, 900)).toBe(true)
  expect(claim(db, 'b', 1899)).toBeNull()
  expect(claim(db, 'b', 1900)).not.toBeNull()
})

test('a job that is returned waits for its time; a try that does not count is not counted', () => {
  const db = makeDb()
  enqueue(db, 'one', 0)
  returnJob(db, claimed(db, 'a', 0), { runAt: 500, trouble: 'busy', counted: true })
  expect(db.select().from(jobs).get()).toMatchObject({
    status: 'queued',
    attempts: 1,
    trouble: 'busy',
    leasedBy: null,
  })
  expect(claim(db, 'a', 499)).toBeNull()
  returnJob(db, claimed(db, 'a', 500), { runAt: 500, trouble: null, counted: false })
  expect(db.select().from(jobs).get()).toMatchObject({ status: 'queued', attempts: 1 })
})

test('what is done or failed is never claimed again', () => {
  const db = makeDb()
  enqueue(db, 'one', 0)
  enqueue(db, 'two', 0)
  finishJob(db, claimed(db, 'a', 0), 1)
  failJob(db, claimed(db, 'a', 0), 'no such address', 1)
  expect(claim(db, 'a', 10 * lease)).toBeNull()
})
