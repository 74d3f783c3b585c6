import { eq } from 'drizzle-orm'
import NextAuth from 'next-auth'
import { expect, test } from 'vitest'
import { transact, type Db } from '@/db/client'
import { getActorOfSession } from '@/db/queries/actor'
import { people, personRoles, record, sessions, signInTries } from '@/db/schema'
import { sessionMilliseconds } from '@/lib/desk/open-session'
import { revokeAllSessions } from '@/lib/desk/revoke-all-sessions'
import { signInPerson } from '@/lib/desk/sign-in-person'
import { takeTry } from '@/lib/desk/sign-in-tries'
import { getSettings } from '@/lib/settings'
import { getAuthOptions, getClient } from '@/lib/web/auth-options'
import { knownPassword, makeAccount } from '../support/account'
import { makeDb } from '../support/db'

const client = { address: '192.0.2.7', agent: 'test' }
const email = 'a.keel@ternharbour.example'
const minute = 60_000

const signIn = (
  db: Db,
  password: string,
  now: number,
  given: Partial<typeof client> & { email?: string } = {},
) => signInPerson(db, { ...client, ...given }, { email: given.email ?? email, password }, now)

async function failTimes(db: Db, times: number, start: number) {
  for (let i = 0; i < times; i++) await expect(signIn(db, 'not the password', start + i)).rejects.toThrow()
}

test('the right password opens a session that names the person with their roles', async () => {
  const db = makeDb()
  await makeAccount(db, { roles: ['reviewer', 'editor'] })
  const { sessionId } = await signIn(db, knownPassword, 1000)
  expect(getActorOfSession(db, sessionId, 2000)).toMatchObject({
    email,
    roles: ['editor', 'reviewer'],
    sessionId,
  })
})

test('a wrong password, an unknown address and a disabled account get the same answer', async () => {
  const db = makeDb()
  await makeAccount(db)
  await makeAccount(db, { email: 'gone@ternharbour.example', status: 'disabled' })
  await makeAccount(db, { email: 'new@ternharbour.example', status: 'invited' })
  const messages = await Promise.all(
    [
      signIn(db, 'not the password', 1),
      signIn(db, knownPassword, 1, { email: 'nobody@ternharbour.example' }),
      signIn(db, knownPassword, 1, { email: 'gone@ternharbour.example' }),
      signIn(db, knownPassword, 1, { email: 'new@ternharbour.example' }),
    ].map((tried) => tried.catch((error: Error) => error.message)),
  )
  expect(new Set(messages)).toEqual(
    new Set(['The e-mail address or the password is not right; please try again.']),
  )
})

test('after ten failures within fifteen minutes even the right password waits, and the wait is named', async () => {
  const db = makeDb()
  await makeAccount(db)
  await failTimes(db, 10, 0)
  await expect(signIn(db, knownPassword, 5 * minute)).rejects.toMatchObject({
    refusal: 'too-many',
    message: 'That was tried too often; please wait 10 minutes and try again.',
  })
  await expect(signIn(db, knownPassword, 15 * minute + 10)).resolves.toBeDefined()
})

test('tries that succeed do not count, and a refused try does not lengthen the wait', async () => {
  const db = makeDb()
  await makeAccount(db)
  for (let i = 0; i < 12; i++) await signIn(db, knownPassword, i)
  expect(db.select().from(signInTries).all()).toEqual([])
  await failTimes(db, 10, 100)
  await expect(signIn(db, knownPassword, 14 * minute)).rejects.toMatchObject({ refusal: 'too-many' })
  await expect(signIn(db, knownPassword, 15 * minute + 200)).resolves.toBeDefined()
})

test('many tries at once cannot slip past the limit', async () => {
  const db = makeDb()
  await makeAccount(db)
  const tried = await Promise.allSettled(Array.from({ length: 14 }, () => signIn(db, 'not the password', 1)))
  const kinds = tried.map((one) => (one.status === 'rejected' ? one.reason.refusal : 'in'))
  expect(kinds.filter((kind) => kind === 'invalid')).toHaveLength(10)
  expect(kinds.filter((kind) => kind === 'too-many')).toHaveLength(4)
})

test('one network address cannot try many accounts without end', async () => {
  const db = makeDb()
  for (let i = 0; i < 60; i++) transact(db, (tx) => takeTry(tx, 'address', client.address, i))
  const another = signIn(db, 'not the password', 61, { email: 'p61@ternharbour.example' })
  await expect(another).rejects.toMatchObject({ refusal: 'too-many' })
  const elsewhere = signIn(db, 'not the password', 61, { address: '192.0.2.8' })
  await expect(elsewhere).rejects.toMatchObject({ refusal: 'invalid' })
})

test('what is kept of a try names neither the e-mail nor the network address', async () => {
  const db = makeDb()
  await makeAccount(db)
  await failTimes(db, 1, 0)
  const kept = JSON.stringify([db.select().from(signInTries).all(), db.select().from(record).all()])
  expect(kept).not.toContain(email)
  expect(kept).not.toContain(client.address)
  expect(
    db
      .select()
      .from(record)
      .all()
      .map((row) => row.event),
  ).toEqual(['sign-in refused'])
})

test('a session ends when it is revoked, when it expires and when the person may no longer come in', async () => {
  const db = makeDb()
  const actor = await makeAccount(db)
  const { sessionId } = await signIn(db, knownPassword, 1000)
  expect(getActorOfSession(db, sessionId, 1000 + sessionMilliseconds)).toBeNull()
  db.update(people).set({ status: 'disabled' }).where(eq(people.id, actor.id)).run()
  expect(getActorOfSession(db, sessionId, 2000)).toBeNull()
  db.update(people).set({ status: 'active' }).where(eq(people.id, actor.id)).run()
  expect(getActorOfSession(db, sessionId, 2000)).not.toBeNull()
  revokeAllSessions(db, actor, {}, 3000)
  expect(getActorOfSession(db, sessionId, 4000)).toBeNull()
})

test('a role that is taken away is gone at the next request', async () => {
  const db = makeDb()
  const actor = await makeAccount(db, { roles: ['editor'] })
  const { sessionId } = await signIn(db, knownPassword, 1000)
  db.delete(personRoles).where(eq(personRoles.personId, actor.id)).run()
  expect(getActorOfSession(db, sessionId, 2000)?.roles).toEqual([])
})

test('of the addresses that proxies wrote, the last one counts', () => {
  expect(getClient({ 'x-forwarded-for': '203.0.113.9, 192.0.2.7' }).address).toBe('192.0.2.7')
  expect(getClient({}).address).toBe('')
})

type Sent = { status: number; cookies: Record<string, string>; raw: string[]; body: unknown }

/** Speaks to the sign-in handler as a browser would, with its cookies. */
function makeBrowser(db: Db, url = 'http://localhost:3000') {
  const settings = getSettings({ ASSIZE_URL: url, ASSIZE_SECRET: 'a secret of the tests alone' })
  const cookies: Record<string, string> = {}
  return async (method: string, path: string, body: Record<string, string> = {}): Promise<Sent> => {
    const sent: Sent = { status: 200, cookies, raw: [], body: undefined }
    const headers = new Map<string, unknown>()
    const response = {
      getHeader: (name: string) => headers.get(name),
      setHeader(name: string, value: unknown) {
        headers.set(name, value)
        return response
      },
      status(code: number) {
        sent.status = code
        return response
      },
      json: (value: unknown) => void (sent.body = value),
      send: (value: unknown) => void (sent.body = value),
      end: () => undefined,
    }
    const request = {
      method,
      query: { nextauth: path.split('/') },
      cookies: { ...cookies },
      headers: {},
      body,
    }
    await NextAuth(request as never, response as never, getAuthOptions(db, settings))
    sent.raw = [headers.get('Set-Cookie') ?? []].flat() as string[]
    for (const line of sent.raw) {
      // "name=value; Path=/; …"
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? []
      cookies[name] = decodeURIComponent(value)
    }
    return sent
  }
}

async function signInByBrowser(db: Db, password: string, url?: string) {
  const ask = makeBrowser(db, url)
  const csrf = (await ask('GET', 'csrf')).body as { csrfToken: string }
  const form = { csrfToken: csrf.csrfToken, json: 'true' }
  const answer = await ask('POST', 'callback/credentials', { ...form, email, password })
  return { ask, form, answer }
}

test('through the handler: the cookie is sealed, http-only and same-site, and secure under https', async () => {
  const db = makeDb()
  await makeAccount(db)
  const plain = await signInByBrowser(db, knownPassword)
  const line = plain.answer.raw.find((one) => one.startsWith('next-auth.session-token=')) ?? ''
  expect(line).toContain('HttpOnly')
  expect(line).toContain('SameSite=Lax')
  expect(line).not.toContain('Secure')
  expect(decodeURIComponent(line)).not.toContain('se_')
  const sealed = await signInByBrowser(db, knownPassword, 'https://desk.ternharbour.example')
  expect(
    sealed.answer.raw.some(
      (one) => one.startsWith('__Secure-next-auth.session-token=') && one.includes('Secure'),
    ),
  ).toBe(true)
})

test('through the handler: a wrong password brings the message back and no session', async () => {
  const db = makeDb()
  await makeAccount(db)
  const { answer } = await signInByBrowser(db, 'not the password')
  expect(answer.status).toBe(401)
  const { url } = answer.body as { url: string }
  expect(new URL(url).searchParams.get('error')).toContain('is not right')
  expect(answer.raw.some((one) => one.includes('session-token='))).toBe(false)
})

test('through the handler: signing out revokes the row, so that a copied cookie is worth nothing', async () => {
  const db = makeDb()
  await makeAccount(db)
  const { ask, form } = await signInByBrowser(db, knownPassword)
  const { sessionId } = (await ask('GET', 'session')).body as { sessionId: string }
  expect(getActorOfSession(db, sessionId, Date.now())).not.toBeNull()
  await ask('POST', 'signout', form)
  expect(getActorOfSession(db, sessionId, Date.now())).toBeNull()
  expect(db.select().from(sessions).where(eq(sessions.id, sessionId)).get()?.revokedAt).not.toBeNull()
})
