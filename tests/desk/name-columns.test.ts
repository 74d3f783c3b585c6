import { and, desc, eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { audits, jobs, manuscripts, points, record, rounds } from '@/db/schema'
import { getTableColumns } from '@/db/queries/table-columns'
import { getAuditFiles } from '@/lib/jobs/audit-files-of'
import { decidePoint } from '@/lib/desk/decide-point'
import { handIn } from '@/lib/desk/hand-in'
import { nameColumns } from '@/lib/desk/name-columns'
import type { NamedColumns } from '@/lib/rules/named-columns'
import { isRefusal } from '@/lib/rules/refusal'
import {
  addTableRow,
  finishAudit,
  getNewestAudit,
  getRoundId,
  listPointIds,
  makeDraft,
  makeManuscript,
  makeWorld,
  type World,
} from '../support/world'

const third: NamedColumns = [{ sheet: 0, row: 1, column: 2, role: 'p-adjusted' }]

function tryNaming(world: World, actor: World['editor'], input: Parameters<typeof nameColumns>[2]) {
  try {
    return nameColumns(world.db, actor, input, world.now())
  } catch (error) {
    if (!isRefusal(error)) throw error
    return error.refusal
  }
}

const stateOf = ({ db }: World, id: string) =>
  db.select({ state: manuscripts.state }).from(manuscripts).where(eq(manuscripts.id, id)).get()?.state

test('a submitter names columns of a draft: stored, recorded, and used when it is audited', () => {
  const world = makeWorld()
  const { db, submitter, now } = world
  const manuscriptId = makeDraft(world)
  const fileId = addTableRow(db, manuscriptId)
  expect(getTableColumns(db, submitter, fileId)).toMatchObject({
    columns: [],
    revision: 0,
    mayName: true,
    asksAudit: false,
  })
  expect(nameColumns(db, submitter, { fileId, revision: 0, columns: third }, now())).toEqual({
    revision: 1,
    auditId: null,
  })
  const line = db.select().from(record).where(eq(record.event, 'columns named')).get()
  expect(line).toMatchObject({
    actorId: submitter.id,
    manuscriptId,
    subject: fileId,
    detail: { round: 1, changes: 'sheet 1, row 2, column 3: p-adjusted', count: 1 },
  })
  const { auditId } = handIn(db, submitter, { manuscriptId }, now())
  expect(getAuditFiles(db, '/uploads', auditId)?.table).toMatchObject({
    name: 'Inglis results.csv',
    roles: third,
  })
  expect(getTableColumns(db, submitter, fileId)).toMatchObject({ columns: third, mayName: false })
  expect(tryNaming(world, submitter, { fileId, revision: 1, columns: [] })).toBe('conflict')
})

test('whoever saves on an older revision is refused, and nothing of theirs is kept', () => {
  const world = makeWorld()
  const manuscriptId = makeManuscript(world, 'in review')
  const fileId = addTableRow(world.db, manuscriptId)
  nameColumns(world.db, world.reviewer, { fileId, revision: 0, columns: third }, world.now())
  expect(tryNaming(world, world.editor, { fileId, revision: 0, columns: [] })).toBe('conflict')
  expect(getTableColumns(world.db, world.editor, fileId)).toMatchObject({ columns: third, revision: 1 })
})

test('what changes nothing asks for no audit', () => {
  const world = makeWorld()
  const manuscriptId = makeManuscript(world, 'in review')
  const fileId = addTableRow(world.db, manuscriptId)
  expect(tryNaming(world, world.reviewer, { fileId, revision: 0, columns: [] })).toEqual({
    revision: 0,
    auditId: null,
  })
  expect(world.db.select().from(record).where(eq(record.event, 'columns named')).all()).toEqual([])
})

test('a reviewer’s naming asks for a new audit; the review goes on and what is decided stays', () => {
  const world = makeWorld()
  const { db, reviewer, now } = world
  const manuscriptId = makeManuscript(world, 'in review')
  const fileId = addTableRow(db, manuscriptId)
  const [first = ''] = listPointIds(db, manuscriptId)
  decidePoint(db, reviewer, { pointId: first, status: 'kept' }, now())
  const { auditId } = nameColumns(db, reviewer, { fileId, revision: 0, columns: third }, now())
  expect(getNewestAudit(db, manuscriptId)).toBe(auditId)
  expect(stateOf(world, manuscriptId)).toBe('in review')
  expect(
    db
      .select()
      .from(jobs)
      .where(and(eq(jobs.kind, 'run-audit'), eq(jobs.subjectId, auditId ?? '')))
      .all(),
  ).toHaveLength(1)
  finishAudit(world, manuscriptId)
  expect(stateOf(world, manuscriptId)).toBe('in review')
  const all = db
    .select()
    .from(points)
    .where(eq(points.roundId, getRoundId(db, manuscriptId)))
    .all()
  expect(all.find(({ id }) => id === first)).toMatchObject({ status: 'kept', auditId })
  expect(new Set(all.map((point) => point.auditId))).toEqual(new Set([auditId]))
})

test('an editor’s naming of what waits for a reviewer sends it through the audit again', () => {
  const world = makeWorld()
  const { db, editor, now } = world
  const manuscriptId = makeManuscript(world, 'ready')
  const fileId = addTableRow(db, manuscriptId)
  nameColumns(db, editor, { fileId, revision: 0, columns: third }, now())
  expect(stateOf(world, manuscriptId)).toBe('received')
  finishAudit(world, manuscriptId)
  expect(stateOf(world, manuscriptId)).toBe('ready')
})

test('once a verdict is drafted or sent, columns are not named any more', () => {
  for (const state of ['verdict drafted', 'returned', 'closed', 'withdrawn'] as const) {
    const world = makeWorld()
    const manuscriptId = makeManuscript(world, state)
    const fileId = addTableRow(world.db, manuscriptId)
    const before = world.db.select().from(audits).orderBy(desc(audits.queuedAt)).all()
    for (const actor of [world.reviewer, world.editor, world.submitter])
      expect(tryNaming(world, actor, { fileId, revision: 0, columns: third }), state).toMatch(
        /conflict|not-found/,
      )
    expect(world.db.select().from(audits).orderBy(desc(audits.queuedAt)).all()).toEqual(before)
  }
})

test('the file of an earlier round is kept as it was', () => {
  const world = makeWorld()
  const manuscriptId = makeManuscript(world, 'in review')
  const fileId = addTableRow(world.db, manuscriptId)
  world.db.update(rounds).set({ number: 2 }).where(eq(rounds.manuscriptId, manuscriptId)).run()
  const round = world.db.select().from(rounds).where(eq(rounds.manuscriptId, manuscriptId)).get()
  world.db
    .insert(rounds)
    .values({ ...round, id: 'round_x', number: 1 } as typeof rounds.$inferInsert)
    .run()
  expect(tryNaming(world, world.editor, { fileId, revision: 0, columns: third })).toBe('conflict')
})

test('a reviewer under double blinding sees the table without its name', () => {
  const world = makeWorld({ blinding: 'double' })
  const manuscriptId = makeManuscript(world, 'in review')
  const fileId = addTableRow(world.db, manuscriptId)
  expect(getTableColumns(world.db, world.reviewer, fileId)).toMatchObject({
    file: { name: 'table.csv' },
    mayName: true,
  })
  expect(getTableColumns(world.db, world.administrator, fileId)).toBeNull()
})
