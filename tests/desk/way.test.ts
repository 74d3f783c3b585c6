import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { getManuscript } from '@/db/queries/manuscript'
import { mails, manuscripts, record } from '@/db/schema'
import { STATES } from '@/lib/rules/states'
import { makeManuscript, makeWorld } from '../support/world'

test.each(STATES)('a manuscript comes to “%s” by the commands', (state) => {
  const world = makeWorld()
  const id = makeManuscript(world, state)
  expect(getManuscript(world.db, world.submitter, id)?.state).toBe(state)
})

test('the whole way leaves its line in the record at every step', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'closed')
  const events = world.db
    .select({ event: record.event, by: record.actorName })
    .from(record)
    .where(eq(record.manuscriptId, id))
    .all()
    .map(({ event, by }) => `${event} / ${by}`)
  expect(events).toEqual([
    'draft begun / Isla Inglis',
    'draft changed / Isla Inglis',
    'file added / Isla Inglis',
    'handed in / Isla Inglis',
    'audit finished / Assize',
    'assigned / Edda Moss',
    'assignment accepted / Rurik Tane',
    'point decided / Rurik Tane',
    'point decided / Rurik Tane',
    'verdict drafted / Rurik Tane',
    'verdict released / Edda Moss',
    'closed / Edda Moss',
  ])
})

test('mails go to whom they concern, and only the released letter speaks of the manuscript', () => {
  const world = makeWorld()
  const id = makeManuscript(world, 'returned')
  const sent = world.db.select().from(mails).where(eq(mails.manuscriptId, id)).orderBy(mails.createdAt).all()
  expect(sent.map(({ template, recipient }) => `${template} → ${recipient}`)).toEqual([
    'handed-in → isla.inglis@ternharbour.example',
    'assigned → rurik.tane@ternharbour.example',
    'verdict-drafted → edda.moss@ternharbour.example',
    'verdict → corin.inglis@kelpbay.example',
    'verdict → isla.inglis@ternharbour.example',
  ])
  for (const mail of sent) {
    const all = `${mail.subject} ${mail.text} ${mail.html}`
    expect(all).not.toContain('Kelp')
    if (mail.template === 'handed-in' || mail.template === 'verdict') expect(all).not.toContain('Tane')
    if (mail.template === 'assigned') expect(all).not.toContain('Inglis')
  }
  expect(sent.at(-1)?.html).toContain('please see <strong>point 1</strong>')
})

test('references count up within the year, and start again in the next', () => {
  const world = makeWorld()
  const ids = [makeManuscript(world, 'received'), makeManuscript(world, 'received')]
  const lateWorld = { ...world, now: () => Date.UTC(2027, 0, 1, 0, 5) }
  ids.push(makeManuscript(lateWorld, 'received'))
  const references = ids.map(
    (id) =>
      world.db.select({ r: manuscripts.reference }).from(manuscripts).where(eq(manuscripts.id, id)).get()?.r,
  )
  expect(references).toEqual(['THC-2026-0001', 'THC-2026-0002', 'THC-2027-0001'])
})
