import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { getManuscript } from '@/db/queries/manuscript'
import { listPoints } from '@/db/queries/points'
import { listReviewers } from '@/db/queries/reviewers'
import { conflicts, mails, people } from '@/db/schema'
import { answerAssignment } from '@/lib/desk/answer-assignment'
import { decidePoint } from '@/lib/desk/decide-point'
import { declareConflict } from '@/lib/desk/declare-conflict'
import { endAssignment } from '@/lib/desk/end-assignment'
import { liftConflict } from '@/lib/desk/lift-conflict'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { declare } from '../support/relate'
import {
  day,
  dump,
  listPointIds,
  makeManuscript,
  makePerson,
  makeWorld,
  morning,
  writeVerdict,
  type World,
} from '../support/world'

function offer(
  { db, editor, reviewer, now }: World,
  manuscriptIds: string[],
  to = reviewer.id,
  dueAt?: number,
) {
  return offerAssignment(db, editor, { manuscriptIds, reviewerId: to, dueAt }, now())
}

function templatesTo({ db }: World, email: string): string[] {
  return db
    .select({ template: mails.template })
    .from(mails)
    .where(eq(mails.recipient, email))
    .orderBy(mails.createdAt)
    .all()
    .map(({ template }) => template)
}

test('several manuscripts are offered at once, due after the days of the house rules', () => {
  const world = makeWorld({ reviewDays: 10 })
  const ids = [makeManuscript(world, 'ready'), makeManuscript(world, 'ready')]
  const at = world.now() + 60_000
  expect(offer(world, ids).assignmentIds).toHaveLength(2)
  for (const id of ids) {
    const view = getManuscript(world.db, world.editor, id)
    expect(view?.state).toBe('assigned')
    expect(view?.dueAt).toBe(at + 10 * day)
    expect(view?.assignment).toMatchObject({ status: 'offered', reviewer: { name: 'Rurik Tane' } })
  }
  expect(templatesTo(world, world.reviewer.email)).toEqual(['assigned', 'assigned'])
})

test('one manuscript that cannot be offered keeps back the whole lot', () => {
  const world = makeWorld()
  const ids = [makeManuscript(world, 'ready'), makeManuscript(world, 'stuck')]
  const before = dump(world.db)
  expect(() => offer(world, ids)).toThrow('“stuck”')
  expect(dump(world.db)).toBe(before)
})

test('a review is offered neither to its submitter, nor over a conflict, nor to whom does not review', () => {
  const world = makeWorld()
  const both = makePerson(world.db, ['submitter', 'reviewer'], 'Bo Ferry')
  const own = makeManuscript(world, 'ready', both)
  expect(() => offer(world, [own], both.id)).toThrow('was handed in by this reviewer')

  const id = makeManuscript(world, 'ready')
  const conflictId = declare(world, world.reviewer, id)
  expect(() => offer(world, [id])).toThrow('conflict of interest')
  liftConflict(world.db, world.editor, { conflictId }, world.now())
  expect(() => offer(world, [id], world.editor.id)).toThrow('active')
  world.db.update(people).set({ status: 'disabled' }).where(eq(people.id, world.reviewer.id)).run()
  expect(() => offer(world, [id])).toThrow('active')
  world.db.update(people).set({ status: 'active' }).where(eq(people.id, world.reviewer.id)).run()
  expect(() => offer(world, [id], world.reviewer.id, morning)).toThrow('lies ahead')
  expect(offer(world, [id]).assignmentIds).toHaveLength(1)
})

test('declining wants a reason, frees the manuscript and tells the editor who assigned it', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'assigned')
  const decline = (reason: string) =>
    answerAssignment(
      world.db,
      world.reviewer,
      { manuscriptId: id, accept: false, reason, conflict: false },
      world.now(),
    )
  expect(() => decline('')).toThrow('say why')
  expect(decline('No time this month.')).toEqual({ manuscriptId: id, accepted: false })
  expect(getManuscript(world.db, world.editor, id)).toMatchObject({
    state: 'ready',
    dueAt: null,
    assignment: null,
  })
  expect(getManuscript(world.db, world.reviewer, id)).toBeNull()
  expect(templatesTo(world, world.editor.email)).toEqual(['declined'])
})

test('declining for a conflict declares it at once', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'assigned')
  answerAssignment(
    world.db,
    world.reviewer,
    { manuscriptId: id, accept: false, reason: 'My former student.', conflict: true },
    world.now(),
  )
  expect(() => offer(world, [id])).toThrow('conflict of interest')
  expect(getManuscript(world.db, world.editor, id)?.conflicts).toMatchObject([
    { person: { name: 'Rurik Tane' }, reason: 'My former student.' },
  ])
  const row = listReviewers(world.db, world.editor, [id], world.now()).find((r) => r.id === world.reviewer.id)
  expect(row?.barred).toEqual([{ manuscriptId: id, why: 'conflict' }])
})

test.each(['in review', 'verdict drafted'] as const)(
  'a conflict declared while “%s” ends the review, hides the manuscript and undoes what was decided',
  (state) => {
    const world = makeWorld()
    const id = makeManuscript(world, state)
    const { db, reviewer, editor, now } = world
    if (state === 'in review') {
      decidePoint(db, reviewer, { pointId: listPointIds(db, id)[0] ?? '', status: 'kept' }, now())
    }
    const { steppedAside } = declareConflict(db, reviewer, { manuscriptId: id, reason: 'Cousins.' }, now())
    expect(steppedAside).toBe(true)
    expect(getManuscript(db, reviewer, id)).toBeNull()
    expect(getManuscript(db, editor, id)).toMatchObject({ state: 'ready', assignment: null, dueAt: null })
    expect(listPoints(db, editor, id).map((point) => point.status)).toEqual(['open', 'open', 'open', 'open'])
    expect(templatesTo(world, editor.email).at(-1)).toBe('stepped-aside')
  },
)

test('an editor declares a conflict of a reviewer, and of themselves, and not twice', () => {
  const world = makeWorld()
  const { db, editor, reviewer, submitter, now } = world
  const id = makeManuscript(world, 'in review')
  const about = (personId?: string) =>
    declareConflict(db, editor, { manuscriptId: id, personId, reason: 'Same grant.' }, now())
  expect(() => about(submitter.id)).toThrow('a reviewer or an editor')
  expect(about(reviewer.id).steppedAside).toBe(true)
  expect(() => about(reviewer.id)).toThrow('declared already')
  expect(about().steppedAside).toBe(false)
  expect(getManuscript(db, editor, id)).toBeNull()
  expect(() => endAssignment(db, editor, { manuscriptId: id, reason: 'Late.' }, now())).toThrow(
    'nothing here',
  )
  expect(db.select().from(conflicts).all()).toHaveLength(2)
})

test('a review that was taken back is open to nobody, until it is offered again', () => {
  const world = makeWorld()
  const { db, editor, reviewer, now } = world
  const id = makeManuscript(world, 'in review')
  endAssignment(db, editor, { manuscriptId: id, reason: 'Overdue.' }, now())
  expect(getManuscript(db, reviewer, id)).toBeNull()
  expect(() => writeVerdict(world, id)).toThrow('nothing here')
  expect(templatesTo(world, reviewer.email)).toEqual(['assigned', 'ended'])
  const second = makePerson(db, ['reviewer'], 'Sefa Nock')
  offer(world, [id], second.id)
  expect(getManuscript(db, second, id)?.assignment?.reviewer.name).toBe('Sefa Nock')
})

test('reviewers are listed with what they have to do, the least loaded first', () => {
  const world = makeWorld()
  const second = makePerson(world.db, ['reviewer'], 'Sefa Nock')
  const ids = [makeManuscript(world, 'in review'), makeManuscript(world, 'assigned')]
  const at = getManuscript(world.db, world.editor, ids[0] ?? '')?.dueAt ?? 0
  const list = listReviewers(world.db, world.editor, ids, at + 1)
  expect(list.map(({ name, open, overdue, nextDueAt }) => ({ name, open, overdue, nextDueAt }))).toEqual([
    { name: second.name, open: 0, overdue: 0, nextDueAt: null },
    { name: 'Rurik Tane', open: 2, overdue: 1, nextDueAt: at },
  ])
  expect(listReviewers(world.db, world.reviewer, ids, at)).toEqual([])
})
