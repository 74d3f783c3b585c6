import { expect, test } from 'vitest'
import { listSessions } from '@/db/queries/sessions'
import { openSession, sessionMilliseconds } from '@/lib/desk/open-session'
import { revokeSession } from '@/lib/desk/revoke-session'
import { makeWorld, morning } from '../support/world'

test('one sees where one is signed in, the own session marked, and nobody else’s', () => {
  const { db, reviewer, editor } = makeWorld()
  const first = openSession(db, reviewer.id, 'first', morning)
  const second = openSession(db, reviewer.id, 'second', morning + 1)
  openSession(db, editor.id, 'another person', morning)
  const seen = listSessions(db, { ...reviewer, sessionId: first }, morning + 2)
  expect(seen.map(({ id, own }) => ({ id, own }))).toEqual([
    { id: second, own: false },
    { id: first, own: true },
  ])
})

test('a session that was ended or has run out is not listed', () => {
  const { db, reviewer } = makeWorld()
  const ended = openSession(db, reviewer.id, 'ended', morning)
  openSession(db, reviewer.id, 'runs out', morning)
  revokeSession(db, reviewer, { sessionId: ended }, morning + 1)
  expect(listSessions(db, reviewer, morning + 2).map(({ agent }) => agent)).toEqual(['runs out'])
  expect(listSessions(db, reviewer, morning + sessionMilliseconds)).toEqual([])
})
