import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { getAudit, readAudit } from '@/db/queries/audit'
import { getManuscript } from '@/db/queries/manuscript'
import { listPoints } from '@/db/queries/points'
import { jobs, mails, record, reports } from '@/db/schema'
import { decidePoint } from '@/lib/desk/decide-point'
import { keepAudit } from '@/lib/desk/keep-audit'
import { runAuditAgain } from '@/lib/desk/run-audit-again'
import { stopAudit } from '@/lib/desk/stop-audit'
import { withdrawManuscript } from '@/lib/desk/withdraw-manuscript'
import { systemActor } from '@/lib/rules/roles'
import { makeSmallAudit } from '../support/small-audit'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { endAssignment } from '@/lib/desk/end-assignment'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { addPoint } from '@/lib/desk/add-point'
import { dump, finishAudit, getNewestAudit, listPointIds, makeManuscript, makeWorld } from '../support/world'

test('an audit comes back from its rows as the engine gave it', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'ready')
  expect(getAudit(world.db, world.editor, id)?.audit).toEqual(makeSmallAudit())
})

test('an audit of five thousand reports is kept and read whole', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'received')
  const audit = makeSmallAudit()
  const [first] = audit.reports
  if (!first) throw new Error('the small audit has reports')
  audit.reports = Array.from({ length: 5000 }, (_, i) => ({ ...first, id: `r${i + 1}` }))
  finishAudit(world, id, audit)
  expect(readAudit(world.db, getNewestAudit(world.db, id)).reports).toEqual(audit.reports)
})

test('each finding becomes an open point at its place, with a place taken from its first report', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'ready')
  const points = listPoints(world.db, world.editor, id)
  expect(points.map(({ findingKey, status, severity }) => `${findingKey} ${status} ${severity}`)).toEqual([
    'n1 open note',
    'n2 open major',
    'n3 open minor',
    'n4 open question',
  ])
  expect(points[1]).toMatchObject({
    page: 5,
    row: null,
    familyLabel: 'attachment strength, all pairs of rocks',
  })
  expect(points[2]).toMatchObject({ page: null, row: 4, sheet: 'strength', quote: '1.2' })
})

test('a job that runs twice keeps one audit, and a stop after it changes nothing', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'received')
  const auditId = getNewestAudit(world.db, id)
  const keep = () => keepAudit(world.db, systemActor, { auditId, audit: makeSmallAudit() }, world.now())
  expect(keep()).toEqual({ kept: true })
  const after = dump(world.db)
  expect(keep()).toEqual({ kept: false })
  expect(stopAudit(world.db, systemActor, { auditId, trouble: 'Too slow.' }, world.now())).toEqual({
    stopped: false,
  })
  expect(dump(world.db)).toBe(after)
  expect(getManuscript(world.db, world.editor, id)?.state).toBe('ready')
})

test('an audit that cannot be made leaves the manuscript stuck, once, and its submitter is told', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'received')
  const auditId = getNewestAudit(world.db, id)
  const stop = () => stopAudit(world.db, systemActor, { auditId, trouble: 'Encrypted.' }, world.now())
  expect(stop()).toEqual({ stopped: true })
  expect(stop()).toEqual({ stopped: false })
  expect(keepAudit(world.db, systemActor, { auditId, audit: makeSmallAudit() }, world.now())).toEqual({
    kept: false,
  })
  const view = getManuscript(world.db, world.submitter, id)
  expect(view).toMatchObject({ state: 'stuck', progress: { status: 'stuck', trouble: 'Encrypted.' } })
  const told = world.db.select().from(mails).where(eq(mails.template, 'stuck')).all()
  expect(told.map(({ recipient }) => recipient)).toEqual([world.submitter.email])
})

test('an audit that ends after the manuscript was withdrawn is kept and moves nothing', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'received')
  withdrawManuscript(world.db, world.submitter, { manuscriptId: id, reason: '' }, world.now())
  finishAudit(world, id)
  expect(getManuscript(world.db, world.editor, id)?.state).toBe('withdrawn')
  expect(listPointIds(world.db, id)).toEqual([])
})

test('an audit that was asked for again counts instead of the one before', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'ready')
  const first = getNewestAudit(world.db, id)
  runAuditAgain(world.db, world.editor, { manuscriptId: id }, world.now())
  const second = getNewestAudit(world.db, id)
  expect(second).not.toBe(first)
  const queued = world.db.select({ s: jobs.subjectId }).from(jobs).where(eq(jobs.kind, 'run-audit')).all()
  expect(new Set(queued.map(({ s }) => s))).toEqual(new Set([first, second]))
  finishAudit(world, id)
  expect(getAudit(world.db, world.editor, id)?.auditId).toBe(second)
  expect(listPointIds(world.db, id)).toHaveLength(4)
  expect(world.db.select().from(reports).where(eq(reports.auditId, first)).all()).toHaveLength(2)
})

test('what was decided on a finding stays decided when the audit runs again', () => {
  const world = makeWorld()
  const { db, reviewer, editor, now } = world
  const id = makeManuscript(world, 'in review')
  const [, major = '', minor = ''] = listPointIds(db, id)
  decidePoint(db, reviewer, { pointId: major, status: 'kept', asks: 'Please say which were planned.' }, now())
  decidePoint(db, reviewer, { pointId: minor, status: 'kept' }, now())
  const { pointId: ownPoint } = addPoint(
    db,
    reviewer,
    { manuscriptId: id, severity: 'question', says: '', asks: 'Why four rocks?', familyLabel: '', quote: '' },
    now(),
  )
  endAssignment(db, editor, { manuscriptId: id, reason: 'On leave.' }, now())
  runAuditAgain(db, editor, { manuscriptId: id }, now())
  const audit = makeSmallAudit()
  // The second reading finds the major one again and the minor one no more.
  audit.findings = audit.findings.filter((finding) => finding.severity !== 'minor').reverse()
  finishAudit(world, id, audit)
  const points = listPoints(db, editor, id)
  expect(points.map(({ severity, status, asks }) => `${severity} ${status}: ${asks}`)).toEqual([
    'question open: Which procedure was used?',
    'major kept: Please say which were planned.',
    'note open: A third decimal would help.',
    'minor kept: Please print adjusted values of at most 1.',
    'question kept: Why four rocks?',
  ])
  expect(points.map((point) => point.position)).toEqual([0, 1, 2, 3, 4])
  expect(points.at(-1)?.id).toBe(ownPoint)
  offerAssignment(db, editor, { manuscriptIds: [id], reviewerId: reviewer.id }, now())
  answerAssignment(db, reviewer, { manuscriptId: id, accept: true, reason: '', conflict: false }, now())
  expect(decidePoint(db, reviewer, { pointId: major, status: 'dropped' }, now())).toEqual({ pointId: major })
  expect(db.select().from(record).where(eq(record.event, 'audit finished')).all()).toHaveLength(2)
})
