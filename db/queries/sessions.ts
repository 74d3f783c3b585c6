import { and, desc, eq, gt, isNull } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { sessions } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'

export type SessionRow = {
  id: string
  createdAt: number
  seenAt: number
  agent: string
  /** The session that asks. */
  own: boolean
}

/** Where the actor is signed in at `now`, the one used last first. */
export function listSessions(db: Reader, actor: Actor, now: number): SessionRow[] {
  return db
    .select({
      id: sessions.id,
      createdAt: sessions.createdAt,
      seenAt: sessions.seenAt,
      agent: sessions.agent,
    })
    .from(sessions)
    .where(and(eq(sessions.personId, actor.id), isNull(sessions.revokedAt), gt(sessions.expiresAt, now)))
    .orderBy(desc(sessions.seenAt))
    .all()
    .map((session) => ({ ...session, own: session.id === actor.sessionId }))
}
