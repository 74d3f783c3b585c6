import { createHash } from 'node:crypto'
import { expect, test } from 'vitest'
import { transact, type Db } from '@/db/client'
import { getActorOfSession } from '@/db/queries/actor'
import { jobs, mailedLinks, mails, people } from '@/db/schema'
import { acceptInvitation } from '@/lib/desk/accept-invitation'
import { askPasswordReset } from '@/lib/desk/ask-password-reset'
import { changePassword } from '@/lib/desk/change-password'
import { createMailedLink, findMailedLink } from '@/lib/desk/mailed-link'
import { newPassword } from '@/lib/desk/password'
import { openSession } from '@/lib/desk/open-session'
import { setPassword, setPasswordInput } from '@/lib/desk/set-password'
import { signInPerson } from '@/lib/desk/sign-in-person'
import { knownPassword, makeAccount } from '../support/account'
import { makeDb } from '../support/db'

const client = { address: '192.0.2.7', agent: 'test' }
const email = 'a.keel@ternharbour.example'
const password = 'limpets on the north wall'
const hour = 3_600_000

function askToken(db: Db, now: number): string {
  askPasswordReset(db, { email }, now)
  const text = db.select({ text: mails.text }).from(mails).all().at(-1)?.text ?? ''
  // The link in the mail, such as http://localhost:3000/reset/q2T…
  return /\/reset\/([\w-]+)/.exec(text)?.[1] ?? ''
}

test('a mailed link holds 32 random bytes, of which the database keeps the hash alone', async () => {
  const db = makeDb()
  const person = await makeAccount(db)
  const token = transact(db, (tx) => createMailedLink(tx, person.id, 'password', 0))
  expect(Buffer.from(token, 'base64url')).toHaveLength(32)
  const row = db.select().from(mailedLinks).get()
  expect(row?.tokenHash).toBe(createHash('sha256').update(token).digest('hex'))
  expect(JSON.stringify(row)).not.toContain(token)
})

test('a forgotten password is set by the mailed link, once, and every session ends', async () => {
  const db = makeDb()
  const person = await makeAccount(db)
  const sessionId = openSession(db, person.id, '', 0)
  const token = askToken(db, 1000)
  expect(findMailedLink(db, token, 'password', 2000)).toMatchObject({ email })
  await setPassword(db, { token, password }, 2000)
  expect(getActorOfSession(db, sessionId, 3000)).toBeNull()
  await expect(signInPerson(db, client, { email, password }, 3000)).resolves.toBeDefined()
  await expect(signInPerson(db, client, { email, password: knownPassword }, 3000)).rejects.toThrow()
  await expect(setPassword(db, { token, password }, 4000)).rejects.toThrow('was used or has expired')
})

test('of two uses of one link at the same moment one wins', async () => {
  const db = makeDb()
  await makeAccount(db)
  const token = askToken(db, 0)
  const tried = await Promise.allSettled([
    setPassword(db, { token, password }, 1),
    setPassword(db, { token, password: `${password}!` }, 1),
  ])
  expect(tried.map((one) => one.status).sort()).toEqual(['fulfilled', 'rejected'])
})

test('a link to choose a password expires after an hour, an invitation after seven days', async () => {
  const db = makeDb()
  const person = await makeAccount(db)
  const token = askToken(db, 0)
  expect(findMailedLink(db, token, 'password', hour - 1)).not.toBeNull()
  expect(findMailedLink(db, token, 'password', hour)).toBeNull()
  const invitation = transact(db, (tx) => createMailedLink(tx, person.id, 'invitation', 0))
  expect(findMailedLink(db, invitation, 'invitation', 7 * 24 * hour - 1)).not.toBeNull()
  expect(findMailedLink(db, invitation, 'invitation', 7 * 24 * hour)).toBeNull()
})

test('a link of one purpose opens nothing of another', async () => {
  const db = makeDb()
  const person = await makeAccount(db, { status: 'invited' })
  const token = transact(db, (tx) => createMailedLink(tx, person.id, 'invitation', 0))
  await expect(setPassword(db, { token, password }, 1)).rejects.toThrow('was used or has expired')
})

test('using one link uses up the others of the person', async () => {
  const db = makeDb()
  await makeAccount(db)
  const first = askToken(db, 0)
  const second = askToken(db, 1)
  await setPassword(db, { token: second, password }, 2)
  expect(findMailedLink(db, first, 'password', 3)).toBeNull()
})

test('asking for an unknown, disabled or invited person writes nothing and says nothing', async () => {
  const db = makeDb()
  await makeAccount(db, { email: 'gone@ternharbour.example', status: 'disabled' })
  await makeAccount(db, { email: 'new@ternharbour.example', status: 'invited' })
  for (const asked of ['nobody@ternharbour.example', 'gone@ternharbour.example', 'new@ternharbour.example']) {
    expect(askPasswordReset(db, { email: asked }, 0)).toBeUndefined()
  }
  expect(db.select().from(mails).all()).toEqual([])
})

test('no mailbox is filled: three mails an hour', async () => {
  const db = makeDb()
  await makeAccount(db)
  for (let i = 0; i < 6; i++) askPasswordReset(db, { email }, i)
  expect(db.select().from(mails).all()).toHaveLength(3)
  expect(db.select().from(jobs).all()).toHaveLength(3)
  askPasswordReset(db, { email }, hour + 10)
  expect(db.select().from(mails).all()).toHaveLength(4)
})

test('an invited person comes in with the name and password they choose', async () => {
  const db = makeDb()
  const person = await makeAccount(db, { status: 'invited' })
  const token = transact(db, (tx) => createMailedLink(tx, person.id, 'invitation', 0))
  await acceptInvitation(db, { token, name: 'Ada M. Keel', affiliation: '', password }, 1)
  expect(db.select().from(people).get()).toMatchObject({ name: 'Ada M. Keel', status: 'active' })
  await expect(signInPerson(db, client, { email, password }, 2)).resolves.toBeDefined()
})

test('a link of a person who was disabled meanwhile opens nothing', async () => {
  const db = makeDb()
  await makeAccount(db)
  const token = askToken(db, 0)
  db.update(people).set({ status: 'disabled' }).run()
  await expect(setPassword(db, { token, password }, 1)).rejects.toThrow('was used or has expired')
})

test('a password has at least twelve characters and is not the e-mail address', async () => {
  const db = makeDb()
  await makeAccount(db)
  const token = askToken(db, 0)
  expect(setPasswordInput.safeParse({ token, password: 'eleven char' }).success).toBe(false)
  expect(newPassword.safeParse('twelve chars').success).toBe(true)
  const own = setPassword(db, { token, password: email.toUpperCase() }, 1)
  await expect(own).rejects.toMatchObject({ refusal: 'invalid', fields: { password: expect.any(String) } })
})

test('changing the password asks for the present one, keeps this session and ends the others', async () => {
  const db = makeDb()
  const actor = await makeAccount(db)
  const elsewhere = openSession(db, actor.id, '', 0)
  const here = { ...actor, sessionId: openSession(db, actor.id, '', 0) }
  await expect(changePassword(db, here, { current: 'wrong', password }, 1)).rejects.toMatchObject({
    fields: { current: expect.any(String) },
  })
  await changePassword(db, here, { current: knownPassword, password }, 2)
  expect(getActorOfSession(db, elsewhere, 3)).toBeNull()
  expect(getActorOfSession(db, here.sessionId, 3)).not.toBeNull()
})

test('guessing the present password has its limit too', async () => {
  const db = makeDb()
  const actor = await makeAccount(db)
  for (let i = 0; i < 10; i++) {
    await expect(changePassword(db, actor, { current: 'wrong', password }, i)).rejects.toThrow('not right')
  }
  const right = changePassword(db, actor, { current: knownPassword, password }, 11)
  await expect(right).rejects.toMatchObject({ refusal: 'too-many' })
})
