import { and, eq, lt } from 'drizzle-orm'
import type { Db, Reader } from '@/db/client'
import { newId } from '@/db/ids'
import { sessions } from '@/db/schema'

export const sessionMilliseconds = 7 * 24 * 3_600_000
const seenEvery = 5 * 60_000

/** Opens a session and returns its id; the cookie carries the id alone. */
export function openSession(db: Reader, personId: string, agent: string, now: number): string {
  const id = newId('session')
  db.insert(sessions)
    .values({
      id,
      personId,
      createdAt: now,
      seenAt: now,
      expiresAt: now + sessionMilliseconds,
      agent: agent.slice(0, 200),
    })
    .run()
  return id
}

/** Keeps when a session was last used, to five minutes. */
export function noteSessionSeen(db: Db, sessionId: string, now: number): void {
  db.update(sessions)
    .set({ seenAt: now })
    .where(and(eq(sessions.id, sessionId), lt(sessions.seenAt, now - seenEvery)))
    .run()
}
