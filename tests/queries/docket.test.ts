import { eq } from 'drizzle-orm'
import { expect, test, vi } from 'vitest'
import { getAudit } from '@/db/queries/audit'
import { getDocketFacets, listDocket } from '@/db/queries/docket'
import { getManuscript } from '@/db/queries/manuscript'
import { assignments, manuscripts } from '@/db/schema'
import { changeHouseRules } from '@/lib/desk/change-house-rules'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { docketFilter } from '@/lib/rules/docket'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import type { Actor, Role } from '@/lib/rules/roles'
import { STATES } from '@/lib/rules/states'
import { declare } from '../support/relate'
import { makeSmallAudit } from '../support/small-audit'
import {
  day,
  finishAudit,
  makeManuscript,
  makePerson,
  makeWorld,
  morning,
  type World,
} from '../support/world'

function list({ db }: World, actor: Actor, filter: object = {}, now = morning) {
  return listDocket(db, actor, docketFilter.parse({ pageSize: 200, ...filter }), now)
}

function titles(world: World, actor: Actor, filter: object = {}, now = morning): string[] {
  return list(world, actor, filter, now).rows.map((row) => row.title)
}

/** One manuscript in each state, titled by it, handed in by the world's submitter or by somebody else. */
function fill(world: World, by = world.submitter): string[] {
  return STATES.map((state) => makeManuscript(world, state, by, state))
}

test('everybody sees what the table of permissions gives them, whatever their roles and conflicts', () => {
  const world = makeWorld()
  const { db, editor } = world
  const several: Role[][] = [
    ['submitter'],
    ['reviewer'],
    ['editor'],
    ['administrator'],
    ['submitter', 'reviewer'],
    ['reviewer', 'editor'],
    ['submitter', 'reviewer', 'editor', 'administrator'],
  ]
  const actors = several.map((roles) => makePerson(db, roles, `Who ${roles.join(' ')}`))
  const first = fill(world)
  changeHouseRules(
    db,
    editor,
    { ...defaultFullHouseRules, submitterSeesAudit: true, blinding: 'double' },
    morning,
  )
  const ids = [
    ...first,
    ...actors.filter((a) => a.roles.includes('submitter')).flatMap((a) => fill(world, a)),
  ]
  for (const actor of actors.filter((a) => a.roles.includes('reviewer'))) {
    // Every third review is theirs; of every fourth manuscript they have a conflict.
    for (const [i, id] of ids.entries()) {
      if (i % 3 === 0 && getSubmitter(world, id) !== actor.id) {
        db.update(assignments).set({ reviewerId: actor.id }).where(eq(assignments.manuscriptId, id)).run()
        if (i % 4 === 0) declare(world, actor, id)
      }
    }
  }
  for (const actor of [...actors, world.submitter, world.reviewer, world.editor]) {
    const rows = new Map(list(world, actor).rows.map((row) => [row.id, row]))
    for (const id of ids) {
      const view = getManuscript(db, actor, id)
      const listed = actor.roles.some((role) => role !== 'administrator') ? view !== null : false
      expect(rows.has(id), `${actor.name} ${view?.state ?? 'unseen'}`).toBe(listed)
      const row = rows.get(id)
      if (!row || !view) continue
      expect(row.sight).toBe(view.sight)
      expect(row.outcomes !== null).toBe(getAudit(db, actor, id) !== null)
      expect(row.submitter?.name ?? null).toBe(view.submitter?.name ?? null)
      expect(row.reviewer).toEqual(view.assignment?.reviewer ?? null)
    }
    expect(rows.size).toBe(list(world, actor).total)
  }
})

function getSubmitter({ db }: World, id: string): string | undefined {
  return db.select({ by: manuscripts.submitterId }).from(manuscripts).where(eq(manuscripts.id, id)).get()?.by
}

test('states, parts and one’s own narrow the docket', () => {
  const world = makeWorld()
  fill(world)
  expect(titles(world, world.editor, { states: ['ready', 'stuck'] }).sort()).toEqual(['ready', 'stuck'])
  expect(titles(world, world.editor)).not.toContain('draft')
  expect(titles(world, world.submitter)).toContain('draft')
  expect(titles(world, world.editor, { as: 'submitter' })).toEqual([])
  expect(titles(world, world.editor, { mine: true }).sort()).toEqual(
    ['assigned', 'closed', 'in review', 'returned', 'verdict drafted'].sort(),
  )
})

test('rows come in the order asked for, those without a value last, page by page', () => {
  const world = makeWorld()
  fill(world)
  const { editor } = world
  const way = ['received', 'stuck', 'ready', 'assigned', 'in review', 'verdict drafted', 'returned']
  expect(titles(world, editor, { sort: 'state', direction: 'asc' }).slice(0, 7)).toEqual(way)
  expect(titles(world, editor, { sort: 'received', direction: 'asc' })[0]).toBe('received')
  expect(titles(world, editor, { sort: 'received', direction: 'desc' })[0]).toBe('withdrawn')
  expect(titles(world, editor, { sort: 'title', direction: 'asc' })).toEqual(
    STATES.filter((state) => state !== 'draft').sort(),
  )
  for (const direction of ['asc', 'desc'] as const) {
    const due = titles(world, editor, { sort: 'due', direction })
    expect(due.slice(0, 3).sort()).toEqual(['assigned', 'in review', 'verdict drafted'])
    const named = list(world, editor, { sort: 'reviewer', direction }).rows
    expect(named.slice(0, 5).every((row) => row.reviewer?.name === 'Rurik Tane')).toBe(true)
    expect(named.slice(5).every((row) => row.reviewer === null)).toBe(true)
  }
  const all = titles(world, editor, { sort: 'title' })
  const pages = [1, 2, 3].map((page) => list(world, editor, { sort: 'title', page, pageSize: 4 }))
  expect(pages.flatMap((page) => page.rows.map((row) => row.title))).toEqual(all)
  expect(pages.map((page) => page.total)).toEqual([9, 9, 9])
})

test('due dates are held against the moment that is given', () => {
  const world = makeWorld()
  const { db, editor, reviewer } = world
  const ids = ['late', 'soon', 'later'].map((title) => makeManuscript(world, 'ready', world.submitter, title))
  const dues = [morning + 2 * day, morning + 8 * day, morning + 12 * day]
  for (const [i, id] of ids.entries()) {
    offerAssignment(db, editor, { manuscriptIds: [id], reviewerId: reviewer.id, dueAt: dues[i] }, world.now())
  }
  const now = morning + 3 * day
  expect(titles(world, editor, { due: 'overdue' }, now)).toEqual(['late'])
  expect(titles(world, editor, { due: 'this week' }, now)).toEqual(['soon'])
  expect(getDocketFacets(db, editor, {}, now)).toMatchObject({
    total: 3,
    due: { overdue: 1, 'this week': 1 },
    states: { assigned: 3, ready: 0 },
  })
})

test('the worst outcome of the current audit filters and counts', () => {
  const world = makeWorld()
  const ids = ['both', 'holds', 'none'].map((title) =>
    makeManuscript(world, 'received', world.submitter, title),
  )
  finishAudit(world, ids[0] ?? '')
  const audit = makeSmallAudit()
  audit.families = audit.families.filter((family) => family.outcome === 'holds')
  finishAudit(world, ids[1] ?? '', audit)
  const { db, editor, reviewer } = world
  expect(titles(world, editor, { outcome: 'fails' })).toEqual(['both'])
  expect(titles(world, editor, { outcome: 'holds' })).toEqual(['holds'])
  expect(titles(world, editor, { outcome: 'undecidable' })).toEqual([])
  expect(getDocketFacets(db, editor, {}, morning).outcomes).toEqual({
    holds: 1,
    fails: 1,
    undecidable: 0,
    uncorrected: 0,
  })
  const row = list(world, editor, { search: 'both' }).rows[0]
  expect(row).toMatchObject({
    outcomes: { holds: 1, fails: 1, undecidable: 0, uncorrected: 0 },
    openPoints: 4,
  })
  // Who may not read the audit cannot find manuscripts by what is in it either.
  offerAssignment(db, editor, { manuscriptIds: [ids[0] ?? ''], reviewerId: reviewer.id }, world.now())
  expect(titles(world, reviewer, {})).toEqual(['both'])
  expect(titles(world, reviewer, { outcome: 'fails' })).toEqual([])
  expect(titles(world, world.submitter, { outcome: 'fails' })).toEqual([])
  expect(getDocketFacets(db, reviewer, {}, morning).outcomes.fails).toBe(0)
})

/** How SQLite reads each query that listing the docket makes. */
function explain(world: World, actor: Actor, filter: object): string[] {
  const { $client } = world.db
  const seen = vi.spyOn($client, 'prepare')
  list(world, actor, filter)
  const texts = seen.mock.calls.map(([text]) => text)
  seen.mockRestore()
  return texts.map((text) => {
    const unbound = Array.from(text.matchAll(/\?/g), () => null)
    const plan = $client.prepare<unknown[], { detail: string }>(`explain query plan ${text}`).all(...unbound)
    return plan.map((row) => row.detail).join('\n')
  })
}

test('an editor’s docket is read along the index of its order, a reviewer’s along their assignments', () => {
  const world = makeWorld()
  makeManuscript(world, 'in review')
  const edited = explain(world, world.editor, { sort: 'received' })
  expect(edited.some((plan) => /manuscripts USING INDEX manuscripts_received/.test(plan))).toBe(true)
  const dated = explain(world, world.editor, { sort: 'due', direction: 'asc' })
  expect(dated.some((plan) => /manuscripts USING INDEX manuscripts_due/.test(plan))).toBe(true)
  const reviewed = explain(world, world.reviewer, { sort: 'due', direction: 'asc' })
  expect(reviewed.some((plan) => /assignments_reviewer_status_due/.test(plan))).toBe(true)
  const own = explain(world, world.submitter, { sort: 'received' })
  expect(own.some((plan) => /manuscripts_submitter_received/.test(plan))).toBe(true)
  for (const plan of [...edited, ...dated, ...reviewed, ...own]) {
    expect(plan).not.toMatch(/SCAN (assignments|rounds|audits|families|points|conflicts)\b(?! USING)/)
  }
})
