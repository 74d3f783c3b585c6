import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { people } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { hashPassword, isPasswordRight, newPassword, requireUnlikeEmail } from './password'
import { requirePermission } from './permission'
import { endSessions } from './revoke-all-sessions'
import { forgiveTries, takeTry } from './sign-in-tries'

export const changePasswordInput = z.object({
  current: z.string().min(1, 'Please give your present password.').max(200),
  password: newPassword,
})

/** Changes the actor's own password and ends their other sessions. */
export async function changePassword(
  db: Db,
  actor: Actor,
  input: z.infer<typeof changePasswordInput>,
  now: number,
): Promise<void> {
  requirePermission(actor, 'account.change')
  requireUnlikeEmail(input.password, actor.email)
  const tried = transact(db, (tx) => takeTry(tx, 'change', actor.id, now))
  const stored = db.select({ hash: people.passwordHash }).from(people).where(eq(people.id, actor.id)).get()
  if (!(await isPasswordRight(stored?.hash ?? null, input.current))) {
    throw refuse('invalid', 'The present password is not right.', { current: 'This is not right.' })
  }
  const passwordHash = await hashPassword(input.password)
  transact(db, (tx) => {
    forgiveTries(tx, [tried])
    tx.update(people).set({ passwordHash }).where(eq(people.id, actor.id)).run()
    endSessions(tx, actor.id, now, actor.sessionId)
    recordEvent(tx, actor, 'password changed', now, { detail: { by: 'themselves' } })
  })
}
