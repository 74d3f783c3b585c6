import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { join, resolve } from 'node:path'
import { eq } from 'drizzle-orm'
import { expect, onTestFinished, test, vi } from 'vitest'
import { openDb, type Db } from '@/db/client'
import { migrateDb } from '@/db/migrate'
import { audits, houseRulesVersions, jobs, manuscripts, record, reports } from '@/db/schema'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import { makeFolder } from '../support/folder'
import { makeHandedIn } from '../support/handed-in'
import { makePdf } from '../support/pdf'
import { makePerson } from '../support/world'

const root = resolve(import.meta.dirname, '../..')
const patient = { timeout: 150_000, interval: 25 }

const results =
  'Results. Holdfasts on rock and on sand differed, t(18) = 2.55, p = .020, and those on rock and on shell did not, t(18) = 1.10, p = .286.'
const words = 'kelp rock sand shell tide wave frond storm boat light salt depth crab snail ray'.split(' ')

/** A page unlike the others, so that none passes for a running head. */
function sayPage(i: number): string {
  return Array.from({ length: 60 }, (_, k) => words[(i * 7 + k * (1 + (i % 13))) % words.length]).join(' ')
}

async function makeDesk(pages: number) {
  const folder = makeFolder()
  const uploads = join(folder, 'uploads')
  const database = join(folder, 'assize.db')
  const db = openDb(database)
  onTestFinished(() => void db.$client.close())
  migrateDb(db)
  db.insert(houseRulesVersions).values({ body: defaultFullHouseRules, createdAt: Date.now() }).run()
  const submitter = makePerson(db, ['submitter'], 'Isla Inglis')
  const texts = [results, ...Array.from({ length: pages - 1 }, (_, i) => sayPage(i))]
  const bytes = await makePdf({ pages: texts })
  const files = { manuscript: { name: 'kelp.pdf', bytes } }
  const handedIn = await makeHandedIn({ db, submitter, now: Date.now }, uploads, files)
  return { db, ...handedIn, env: { ASSIZE_DATABASE: database, ASSIZE_UPLOADS: uploads } }
}

function startWorker(env: Record<string, string>): ChildProcess {
  const worker = spawn(process.execPath, ['--import', 'tsx', 'scripts/worker.ts'], {
    cwd: root,
    stdio: 'ignore',
    env: { ...process.env, ASSIZE_LEASE_SECONDS: '3', ASSIZE_SMTP_URL: 'smtp://127.0.0.1:1', ...env },
  })
  onTestFinished(() => void worker.kill('SIGKILL'))
  return worker
}

const getAudit = (db: Db) => db.select().from(audits).get()
const getJob = (db: Db) => db.select().from(jobs).where(eq(jobs.kind, 'run-audit')).get()
const untilReading = (db: Db) =>
  vi.waitFor(() => {
    const audit = getAudit(db)
    expect(audit).toMatchObject({ status: 'running', stage: 'reading' })
    expect(audit?.progress).toBeLessThan(1)
  }, patient)

test('an audit whose worker is killed is finished by another, once the lease has run out, exactly once', async () => {
  const { db, manuscriptId, env } = await makeDesk(200)
  const killed = startWorker(env)
  await untilReading(db)
  killed.kill('SIGKILL')
  await once(killed, 'exit')
  expect(getJob(db)).toMatchObject({ status: 'running', attempts: 1 })
  expect(getAudit(db)?.status).toBe('running')

  const second = startWorker(env)
  await vi.waitFor(() => expect(getAudit(db)?.status).toBe('done'), patient)
  second.kill('SIGTERM')
  const [code] = await once(second, 'exit')
  expect(code).toBe(0)
  expect(getJob(db)).toMatchObject({ status: 'done', attempts: 2, leasedBy: null })
  expect(db.select().from(manuscripts).where(eq(manuscripts.id, manuscriptId)).get()?.state).toBe('ready')
  expect(db.select().from(record).where(eq(record.event, 'audit finished')).all()).toHaveLength(1)
  const kept = db.select({ value: reports.value }).from(reports).orderBy(reports.position).all()
  expect(kept).toEqual([{ value: 0.02 }, { value: 0.286 }])
}, 240_000)

test('a worker that is told to stop twice returns its audit at once and ends in order', async () => {
  const { db, env } = await makeDesk(200)
  const worker = startWorker(env)
  await untilReading(db)
  worker.kill('SIGTERM')
  worker.kill('SIGINT')
  const [code] = await once(worker, 'exit')
  expect(code).toBe(0)
  expect(getJob(db)).toMatchObject({ status: 'queued', attempts: 0, leasedBy: null })
}, 240_000)
