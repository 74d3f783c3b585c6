import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { manuscripts, points, rounds, verdicts } from '@/db/schema'
import { getFigures } from '@/db/queries/figures'
import { STATES, type State } from '@/lib/rules/states'
import { day, getRoundId, makeManuscript, makeWorld, morning, type World } from '../support/world'

/** Puts a returned round's dates where a test wants them: `days` between hand-in and release. */
function makeReturned(world: World, days: number, releasedAt: number): string {
  const id = makeManuscript(world, 'returned')
  const roundId = getRoundId(world.db, id)
  world.db
    .update(rounds)
    .set({ handedInAt: releasedAt - days * day })
    .where(eq(rounds.id, roundId))
    .run()
  world.db.update(verdicts).set({ releasedAt }).where(eq(verdicts.roundId, roundId)).run()
  return id
}

test('every state but the draft is counted, in the order of the way', () => {
  const world = makeWorld()
  for (const state of ['draft', 'ready', 'ready', 'in review', 'stuck'] as const) makeManuscript(world, state)
  const { states } = getFigures(world.db, world.editor, morning)
  const counted = (state: State) => states.find((row) => row.state === state)?.manuscripts
  expect(states.map((row) => row.state)).toEqual(STATES.filter((state) => state !== 'draft'))
  expect([counted('ready'), counted('in review'), counted('stuck'), counted('closed')]).toEqual([2, 1, 1, 0])
})

test('the turnaround is the median over released rounds, and the last quarter leaves old ones out', () => {
  const world = makeWorld()
  const now = morning + 400 * day
  for (const days of [2, 4, 12]) makeReturned(world, days, now - 10 * day)
  makeReturned(world, 30, now - 91 * day)
  const { turnaround } = getFigures(world.db, world.editor, now)
  expect(turnaround.lastQuarter).toMatchObject({ rounds: 3, median: 4 })
  // The median of 2, 4, 12 and 30 lies midway between the two in the middle.
  expect(turnaround.ever).toMatchObject({ rounds: 4, median: 8 })
})

test('without a released verdict there is no median', () => {
  const world = makeWorld()
  makeManuscript(world, 'verdict drafted')
  const { turnaround, points: counted } = getFigures(world.db, world.editor, morning)
  expect(turnaround.ever).toEqual({ rounds: 0, median: null, slowestTenth: null })
  expect(counted).toEqual([])
})

test('what is due is overdue or falls in one of four weeks; what is returned is not due', () => {
  const world = makeWorld()
  const now = morning + 30 * day
  const due = (state: State, at: number) =>
    world.db
      .update(manuscripts)
      .set({ dueAt: at })
      .where(eq(manuscripts.id, makeManuscript(world, state)))
      .run()
  due('assigned', now - 1)
  due('in review', now)
  due('in review', now + 7 * day)
  due('verdict drafted', now + 27 * day)
  due('in review', now + 28 * day)
  due('returned', now - day)
  const figures = getFigures(world.db, world.editor, now)
  expect(figures.overdue).toBe(1)
  expect(figures.dueByWeek).toEqual([1, 1, 0, 1])
})

test('points count by rule once their verdict is released', () => {
  const world = makeWorld()
  const returned = makeManuscript(world, 'returned')
  makeManuscript(world, 'in review')
  const stored = world.db
    .select({ rule: points.rule, status: points.status })
    .from(points)
    .where(eq(points.roundId, getRoundId(world.db, returned)))
    .all()
    .filter((point) => point.rule !== null)
  const { points: counted } = getFigures(world.db, world.editor, morning)
  const total = counted.reduce((sum, row) => sum + row.kept + row.dropped + row.open, 0)
  expect(stored.length).toBeGreaterThan(0)
  expect(total).toBe(stored.length)
  expect(counted.reduce((sum, row) => sum + row.kept, 0)).toBe(
    stored.filter((point) => point.status === 'kept').length,
  )
})

test('the figures are the editor’s alone', () => {
  const world = makeWorld()
  for (const actor of [world.submitter, world.reviewer, world.administrator]) {
    expect(() => getFigures(world.db, actor, morning)).toThrow('nothing here')
  }
})
