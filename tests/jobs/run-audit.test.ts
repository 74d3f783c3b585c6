import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import type { Db } from '@/db/client'
import { audits, jobs, manuscripts, mails, record, reports } from '@/db/schema'
import { getAuditFiles } from '@/lib/jobs/audit-files-of'
import { claimJob } from '@/lib/jobs/claim-job'
import { runDueJobs } from '@/lib/jobs/run-due-jobs'
import { workJob } from '@/lib/jobs/work-job'
import { getSettings } from '@/lib/settings'
import { makeFolder } from '../support/folder'
import { makeHandedIn } from '../support/handed-in'
import { makePdf } from '../support/pdf'
import { makeManuscript, makeWorld } from '../support/world'

const text =
  'Results. Holdfasts on rock and on sand differed, t(18) = 2.55, p = .020, and those on rock and on shell did not, t(18) = 1.10, p = .286.'
const table = Buffer.from('comparison,t,df,p\nrock vs sand,2.55,18,.020\nrock vs shell,1.10,18,.286\n')

const settingsFor = (uploads: string, more: Record<string, string> = {}) =>
  getSettings({ ASSIZE_UPLOADS: uploads, ...more })
const eventsOf = (db: Db) =>
  db
    .select({ event: record.event })
    .from(record)
    .all()
    .map(({ event }) => event)
const auditJob = (db: Db) => db.select().from(jobs).where(eq(jobs.kind, 'run-audit')).get()

test('a manuscript that is handed in is audited from its files and becomes ready', async () => {
  const world = makeWorld()
  const uploads = makeFolder()
  const files = {
    manuscript: { name: 'kelp.pdf', bytes: await makePdf({ pages: [text] }) },
    table: { name: 'kelp.csv', bytes: table },
  }
  const { manuscriptId, auditId } = await makeHandedIn(world, uploads, files)
  expect(await runDueJobs(world.db, settingsFor(uploads), 'run-audit', world.now)).toBe(1)
  expect(world.db.select().from(audits).get()).toMatchObject({
    id: auditId,
    status: 'done',
    pages: 1,
    tableFile: 'kelp.csv',
    tableRows: 2,
  })
  expect(world.db.select().from(manuscripts).where(eq(manuscripts.id, manuscriptId)).get()?.state).toBe(
    'ready',
  )
  const values = world.db
    .select({ value: reports.value })
    .from(reports)
    .all()
    .map(({ value }) => value)
  expect(new Set(values)).toEqual(new Set([0.02, 0.286]))
  expect(auditJob(world.db)).toMatchObject({ status: 'done', attempts: 1, leasedBy: null })
  expect(eventsOf(world.db).filter((event) => event === 'audit finished')).toHaveLength(1)
})

test('a file that cannot be read makes the manuscript stuck, with the reason and a mail, and is not tried again', async () => {
  const world = makeWorld()
  const uploads = makeFolder()
  const locked = await makePdf({ options: { userPassword: 'kelp', pdfVersion: '1.7' } })
  const { manuscriptId } = await makeHandedIn(world, uploads, {
    manuscript: { name: 'kelp.pdf', bytes: locked },
  })
  await runDueJobs(world.db, settingsFor(uploads), 'run-audit', world.now)
  expect(world.db.select().from(audits).get()).toMatchObject({
    status: 'stuck',
    trouble: expect.stringContaining('password'),
  })
  expect(world.db.select().from(manuscripts).where(eq(manuscripts.id, manuscriptId)).get()?.state).toBe(
    'stuck',
  )
  expect(auditJob(world.db)).toMatchObject({ status: 'done' })
  expect(
    world.db
      .select()
      .from(mails)
      .all()
      .map((mail) => mail.template),
  ).toHaveLength(2)
})

test('an alpha that the submitter states goes before the house’s; a replaced file is not read', async () => {
  const world = makeWorld({ alpha: 0.01 })
  const uploads = makeFolder()
  const { auditId } = await makeHandedIn(world, uploads, {
    manuscript: { name: 'kelp.pdf', bytes: await makePdf() },
  })
  expect(getAuditFiles(world.db, uploads, auditId)).toMatchObject({ table: null, rules: { alpha: 0.01 } })
  expect(getAuditFiles(world.db, uploads, 'au_none')).toBeNull()
})

test('a fault that is not the file’s is tried again later, and at last the manuscript is not left waiting', async () => {
  const world = makeWorld()
  const manuscriptId = makeManuscript(world, 'received')
  const settings = settingsFor(makeFolder())
  let time = world.now()
  const clock = () => time
  await runDueJobs(world.db, settings, 'run-audit', clock)
  // The stored file is missing: its row names a hash that no file has.
  expect(auditJob(world.db)).toMatchObject({ status: 'queued', attempts: 1 })
  expect(auditJob(world.db)?.runAt).toBe(time + 10_000)
  expect(await runDueJobs(world.db, settings, 'run-audit', clock)).toBe(0)
  for (const later of [60_000, 600_000]) {
    time += later
    await runDueJobs(world.db, settings, 'run-audit', clock)
  }
  expect(auditJob(world.db)).toMatchObject({ status: 'failed', attempts: 3 })
  expect(world.db.select().from(manuscripts).where(eq(manuscripts.id, manuscriptId)).get()?.state).toBe(
    'stuck',
  )
  expect(world.db.select().from(audits).get()?.trouble).toContain('a fault on our side')
})

test('a job whose workers ended again and again is given up', async () => {
  const world = makeWorld()
  makeManuscript(world, 'received')
  const settings = settingsFor(makeFolder())
  let time = world.now()
  const claim = () =>
    claimJob(world.db, { kind: 'run-audit', worker: 'a', lease: settings.leaseMilliseconds }, time)
  for (let i = 0; i < 3; i++, time += settings.leaseMilliseconds) claim()
  await runDueJobs(world.db, settings, 'run-audit', () => time)
  expect(auditJob(world.db)).toMatchObject({ status: 'failed' })
  expect(world.db.select().from(audits).get()?.status).toBe('stuck')
})

test('a worker that is stopped returns its job, and the try does not count', async () => {
  const world = makeWorld()
  const uploads = makeFolder()
  await makeHandedIn(world, uploads, {
    manuscript: { name: 'kelp.pdf', bytes: await makePdf({ pages: [text] }) },
  })
  const settings = settingsFor(uploads)
  const job = claimJob(world.db, { kind: 'run-audit', worker: 'a', lease: 60_000 }, world.now())
  if (!job) throw new Error('nothing to claim')
  const stopped = AbortSignal.abort(new Error('stopped'))
  await workJob(job, { db: world.db, settings, clock: world.now, signal: stopped })
  expect(auditJob(world.db)).toMatchObject({ status: 'queued', attempts: 0, leasedBy: null })
})

test('a worker whose lease ran out meanwhile writes nothing', async () => {
  const world = makeWorld()
  const uploads = makeFolder()
  await makeHandedIn(world, uploads, {
    manuscript: { name: 'kelp.pdf', bytes: await makePdf({ pages: [text] }) },
  })
  const settings = settingsFor(uploads)
  const job =
    claimJob(world.db, { kind: 'run-audit', worker: 'a', lease: 1 }, 0) ??
    claimJob(world.db, { kind: 'run-audit', worker: 'a', lease: 1 }, world.now())
  if (!job) throw new Error('nothing to claim')
  claimJob(world.db, { kind: 'run-audit', worker: 'b', lease: 60_000_000 }, world.now())
  await workJob(job, { db: world.db, settings, clock: world.now, signal: new AbortController().signal })
  expect(auditJob(world.db)).toMatchObject({ status: 'running', leasedBy: 'b' })
  expect(world.db.select().from(reports).all()).toEqual([])
  expect(eventsOf(world.db)).not.toContain('audit finished')
})
