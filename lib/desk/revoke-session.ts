import { and, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { sessions } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'

export const revokeSessionInput = z.object({ sessionId: z.string() })

/** Ends one of the actor's own sessions; ending an ended one does nothing. */
export function revokeSession(
  db: Db,
  actor: Actor,
  input: z.infer<typeof revokeSessionInput>,
  now: number,
): void {
  transact(db, (tx) => {
    const { changes } = tx
      .update(sessions)
      .set({ revokedAt: now })
      .where(
        and(eq(sessions.id, input.sessionId), eq(sessions.personId, actor.id), isNull(sessions.revokedAt)),
      )
      .run()
    if (changes > 0) recordEvent(tx, actor, 'signed out', now)
  })
}
