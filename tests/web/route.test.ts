import { expect, test } from 'vitest'
import { z } from 'zod'
import type { Db } from '@/db/client'
import { describeError } from '@/lib/log'
import { REFUSALS, refuse, type RefusalKind } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { parse, readForm, readJson, readQuery } from '@/lib/web/parse'
import { route, type RouteCall } from '@/lib/web/route'
import { makeDb } from '../support/db'

const actor: Actor = {
  kind: 'person',
  id: 'pe_1',
  name: 'Ada',
  email: 'a@x.example',
  roles: [],
  sessionId: null,
}
const settings = getSettings({ ASSIZE_URL: 'https://desk.ternharbour.example' })
const db: Db = makeDb()

type Handle = (call: RouteCall<{ id: string }>) => object | null | undefined | Promise<object>

function call(handle: Handle, init: RequestInit = {}, given: Actor | null = actor): Promise<Response> {
  const request = new Request('http://127.0.0.1:3000/api/things/7', init)
  const context = { params: Promise.resolve({ id: '7' }) }
  return route(handle)(request, context, { db, settings, actor: given, now: 5 })
}

const refused = (kind: RefusalKind) =>
  call(() => {
    throw refuse(kind, 'Because.', { size: 'too big' })
  })

test('a handler is given who asks, the parameters and the time; its answer is JSON that nobody stores', async () => {
  const response = await call(({ params, actor, now }) => ({ id: params.id, by: actor.id, now }))
  expect(await response.json()).toEqual({ id: '7', by: 'pe_1', now: 5 })
  expect(response.headers.get('cache-control')).toBe('private, no-store')
})

test('without a session the answer is 401 and the handler is not called', async () => {
  const response = await call(
    () => {
      throw new Error('called')
    },
    {},
    null,
  )
  expect(response.status).toBe(401)
  expect(response.headers.get('content-type')).toBe('application/problem+json')
})

test.each([
  ['invalid', 422],
  ['forbidden', 404],
  ['not-found', 404],
  ['conflict', 409],
  ['too-large', 413],
  ['unreadable', 422],
  ['too-many', 429],
] as const)('a refusal %s answers %i with its message', async (kind, status) => {
  const response = await refused(kind)
  expect(response.status).toBe(status)
  expect(await response.json()).toMatchObject({
    status,
    title: expect.any(String),
    fields: { size: 'too big' },
  })
})

test('every kind of refusal has a status below 500', async () => {
  for (const kind of REFUSALS) expect((await refused(kind)).status).toBeLessThan(500)
})

test('forbidden and not found look the same, so that nothing is told about what exists', async () => {
  const [one, other] = await Promise.all([
    call(() => {
      throw refuse('forbidden', 'This is another’s.')
    }),
    call(() => {
      throw refuse('not-found', 'There is nothing here that you can open.')
    }),
  ])
  expect([one.status, await one.text()]).toEqual([other.status, await other.text()])
})

test('null is not found, undefined is done', async () => {
  expect((await call(() => null)).status).toBe(404)
  expect((await call(() => undefined)).status).toBe(204)
})

test('what nobody foresaw answers 500 with a number and none of its message', async () => {
  const response = await call(() => {
    throw new Error('secret path /var/lib/x')
  })
  const body = await response.text()
  expect(response.status).toBe(500)
  expect(body).not.toContain('secret')
  expect(JSON.parse(body).detail).toMatch(/noted under [0-9a-f]{8}/) // eight hexadecimal digits
})

test.each([
  ['its own address', { origin: 'https://desk.ternharbour.example' }, 200],
  ['the host it is asked by', { origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000' }, 200],
  ['another site', { origin: 'https://elsewhere.example', host: '127.0.0.1:3000' }, 403],
  ['a sandboxed frame', { origin: 'null', host: '127.0.0.1:3000' }, 403],
  ['nowhere', { host: '127.0.0.1:3000' }, 403],
])('a change that comes from %s', async (_from, headers, status) => {
  const response = await call(() => ({ done: true }), { method: 'POST', headers })
  expect(response.status).toBe(status)
})

test('a reading may come from anywhere: it changes nothing', async () => {
  expect((await call(() => ({}), { headers: { origin: 'https://elsewhere.example' } })).status).toBe(200)
})

const schema = z.object({ title: z.string().min(1, 'Please give a title.'), size: z.coerce.number().max(9) })

test('input that does not fit names each field', () => {
  const wrong = () => parse(schema, { title: '', size: 10 })
  expect(wrong).toThrow('Please check the marked fields.')
  try {
    wrong()
  } catch (error) {
    expect(error).toMatchObject({
      refusal: 'invalid',
      fields: { title: 'Please give a title.', size: expect.any(String) },
    })
  }
})

test('a form reads as an object; a repeated field as a list; the framework’s own fields are left out', () => {
  const form = new FormData()
  form.append('title', 'Kelp')
  form.append('role', 'editor')
  form.append('role', 'reviewer')
  form.append('$ACTION_ID_1', 'x')
  expect(readForm(form)).toEqual({ title: 'Kelp', role: ['editor', 'reviewer'] })
  expect(readQuery(new Request('http://x.example/?a=1&b=2&b=3'))).toEqual({ a: '1', b: ['2', '3'] })
})

test('a body of JSON has its limit, and what is not JSON is refused in words', async () => {
  const post = (body: string) => new Request('http://x.example/', { method: 'POST', body })
  await expect(readJson(post('{"a":1}'))).resolves.toEqual({ a: 1 })
  await expect(readJson(post(''))).resolves.toEqual({})
  await expect(readJson(post('{'))).rejects.toMatchObject({ refusal: 'invalid' })
  await expect(readJson(post(`"${'x'.repeat(1024 * 1024)}"`))).rejects.toMatchObject({ refusal: 'too-large' })
})

test('the log keeps an error’s kind and place, not the values of a statement', () => {
  const error = new Error('Failed query: insert into people\nparams: a.keel@ternharbour.example')
  expect(JSON.stringify(describeError(error))).not.toContain('keel')
  expect(describeError(error).message).toBe('Failed query: insert into people')
  expect(describeError(error).stack).toContain('route.test.ts')
})
