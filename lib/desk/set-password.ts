import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { people } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { systemActor } from '@/lib/rules/roles'
import { requireMailedLink, takeMailedLink } from './mailed-link'
import { hashPassword, newPassword, requireUnlikeEmail } from './password'
import { endSessions } from './revoke-all-sessions'

export const setPasswordInput = z.object({ token: z.string().min(1).max(200), password: newPassword })

/** Sets a new password by a mailed link and ends every session of the person. */
export async function setPassword(
  db: Db,
  input: z.infer<typeof setPasswordInput>,
  now: number,
): Promise<{ email: string }> {
  const { email } = requireMailedLink(db, input.token, 'password', now)
  requireUnlikeEmail(input.password, email)
  const passwordHash = await hashPassword(input.password)
  return transact(db, (tx) => {
    const person = takeMailedLink(tx, input.token, 'password', now)
    tx.update(people).set({ passwordHash }).where(eq(people.id, person.personId)).run()
    endSessions(tx, person.personId, now)
    const actor = { ...systemActor, kind: 'person' as const, id: person.personId, name: person.name }
    recordEvent(tx, actor, 'password changed', now, { detail: { by: 'link' } })
    return { email: person.email }
  })
}
