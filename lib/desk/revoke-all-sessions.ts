import { and, eq, isNull, ne } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { sessions } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'

export const revokeAllSessionsInput = z.object({})

/** Signs the actor out everywhere, here too. */
export function revokeAllSessions(
  db: Db,
  actor: Actor,
  _input: z.infer<typeof revokeAllSessionsInput>,
  now: number,
): void {
  transact(db, (tx) => {
    endSessions(tx, actor.id, now)
    recordEvent(tx, actor, 'signed out everywhere', now)
  })
}

/** Ends a person's sessions, except the one kept. */
export function endSessions(tx: Tx, personId: string, now: number, kept: string | null = null): void {
  tx.update(sessions)
    .set({ revokedAt: now })
    .where(
      and(
        eq(sessions.personId, personId),
        isNull(sessions.revokedAt),
        kept === null ? undefined : ne(sessions.id, kept),
      ),
    )
    .run()
}
