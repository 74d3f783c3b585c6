import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { getHouseRules, listHouseRules } from '@/db/queries/house-rules'
import { getManuscript } from '@/db/queries/manuscript'
import { getPerson, listPeople } from '@/db/queries/people'
import { mailedLinks, mails, sessions } from '@/db/schema'
import { changeHouseRules } from '@/lib/desk/change-house-rules'
import { changePerson } from '@/lib/desk/change-person'
import { invitePerson } from '@/lib/desk/invite-person'
import { openSession } from '@/lib/desk/open-session'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'
import { makeDb } from '../support/db'
import { makeManuscript, makePerson, makeWorld, type World } from '../support/world'

function invite({ db, administrator, now }: World, email: string, name = 'Nia Holt') {
  const input = { email, name, affiliation: '', expertise: 'kelp', roles: ['reviewer' as const] }
  return invitePerson(db, administrator, input, now())
}

test('an invited person is mailed a link, and another one when they are invited again', () => {
  const world = makeWorld()
  const { personId } = invite(world, 'nia@ternharbour.example')
  expect(invite(world, 'nia@ternharbour.example', 'Nia Holt-Strand').personId).toBe(personId)
  expect(getPerson(world.db, world.administrator, personId)).toMatchObject({
    name: 'Nia Holt-Strand',
    status: 'invited',
    roles: ['reviewer'],
  })
  expect(world.db.select().from(mailedLinks).all()).toHaveLength(2)
  const sent = world.db.select().from(mails).where(eq(mails.template, 'invitation')).all()
  expect(sent.map((mail) => mail.recipient)).toEqual(['nia@ternharbour.example', 'nia@ternharbour.example'])
  expect(() => invite(world, world.reviewer.email)).toThrow('account with this address')
})

test('roles and names change; a disabled person is signed out and can come back', () => {
  const world = makeWorld()
  const { db, administrator, reviewer, now } = world
  openSession(db, reviewer.id, 'test', now())
  const change = (input: object) =>
    changePerson(db, administrator, { personId: reviewer.id, ...input }, now())
  change({ roles: ['reviewer', 'editor', 'editor'], name: 'R. Tane' })
  expect(getPerson(db, administrator, reviewer.id)).toMatchObject({
    name: 'R. Tane',
    roles: ['reviewer', 'editor'],
  })
  change({ status: 'disabled' })
  expect(
    db
      .select()
      .from(sessions)
      .all()
      .every((session) => session.revokedAt !== null),
  ).toBe(true)
  change({ status: 'active' })
  expect(getPerson(db, administrator, reviewer.id)?.status).toBe('active')
})

test('the last administrator stays one', () => {
  const world = makeWorld()
  const { db, administrator, now } = world
  const self = (input: object) =>
    changePerson(db, administrator, { personId: administrator.id, ...input }, now())
  expect(() => self({ roles: ['editor'] })).toThrow('stay administrator')
  expect(() => self({ status: 'disabled' })).toThrow('stay administrator')
  makePerson(db, ['administrator'], 'Bo Ferry')
  self({ roles: ['editor'] })
  expect(getPerson(db, world.editor, administrator.id)?.roles).toEqual(['editor'])
})

test('an invitation is not accepted for somebody else', () => {
  const world = makeWorld()
  const { personId } = invite(world, 'nia@ternharbour.example')
  expect(() =>
    changePerson(world.db, world.administrator, { personId, status: 'active' }, world.now()),
  ).toThrow('not accepted')
})

test('people are found by name, address, role and expertise', () => {
  const world = makeWorld()
  invite(world, 'nia@kelpbay.example')
  const names = (filter: object) => listPeople(world.db, world.editor, filter).map((person) => person.name)
  expect(names({})).toEqual(['Alva Quist', 'Edda Moss', 'Isla Inglis', 'Nia Holt', 'Rurik Tane'])
  expect(names({ role: 'reviewer' })).toEqual(['Nia Holt', 'Rurik Tane'])
  expect(names({ role: 'reviewer', status: 'active' })).toEqual(['Rurik Tane'])
  expect(names({ search: 'KELP' })).toEqual(['Nia Holt'])
  expect(listPeople(world.db, world.reviewer)).toEqual([])
  expect(getPerson(world.db, world.reviewer, world.editor.id)).toBeNull()
  expect(getPerson(world.db, world.reviewer, world.reviewer.id)?.email).toBe(world.reviewer.email)
})

test('a manuscript keeps the rules of the day it was handed in', () => {
  const world = makeWorld({ reviewDays: 14 })
  const { db, editor, reviewer, submitter, now } = world
  const before = makeManuscript(world, 'ready')
  expect(changeHouseRules(db, editor, { ...defaultFullHouseRules, reviewDays: 7 }, now())).toEqual({
    version: 2,
  })
  const after = makeManuscript(world, 'ready')
  expect(getManuscript(db, editor, before)?.rules.reviewDays).toBe(14)
  expect(getManuscript(db, editor, after)?.rules.reviewDays).toBe(7)
  expect(getHouseRules(db, reviewer)).toMatchObject({ version: 2, createdBy: 'Edda Moss' })
  expect(getHouseRules(db, reviewer, 1)?.rules.reviewDays).toBe(14)
  expect(getHouseRules(db, reviewer, 9)).toBeNull()
  expect(getHouseRules(db, submitter)).toBeNull()
  expect(listHouseRules(db, editor).map((view) => view.version)).toEqual([2, 1])
})

test('where nobody has decided anything the defaults hold, and become the first version with the first draft', () => {
  const db = makeDb()
  const editor = makePerson(db, ['editor', 'submitter'], 'Edda Moss')
  expect(getHouseRules(db, editor)).toEqual({
    version: 0,
    rules: defaultFullHouseRules,
    createdBy: null,
    createdAt: null,
  })
  const world = { ...makeWorld(), db, submitter: editor }
  makeManuscript(world, 'received')
  expect(getHouseRules(db, editor)).toMatchObject({ version: 1, rules: defaultFullHouseRules })
})
