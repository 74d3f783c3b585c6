import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { people } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse } from '@/lib/rules/refusal'
import { systemActor } from '@/lib/rules/roles'
import { openSession } from './open-session'
import { isPasswordRight } from './password'
import { forgiveTries, takeTry } from './sign-in-tries'

export const signInPersonInput = z.object({
  email: z.string().trim().toLowerCase().min(1).max(254),
  password: z.string().min(1).max(200),
})

export type Client = { address: string; agent: string }

/**
 * Opens a session for whoever knows the password. Not one transaction: the hash is compared between two, so
 * that the database is not held for the time it takes.
 */
export async function signInPerson(
  db: Db,
  client: Client,
  input: z.infer<typeof signInPersonInput>,
  now: number,
): Promise<{ personId: string; name: string; sessionId: string }> {
  const tries = transact(db, (tx) => [
    takeTry(tx, 'email', input.email, now),
    takeTry(tx, 'address', client.address, now),
  ])
  const person = db
    .select({ id: people.id, name: people.name, status: people.status, hash: people.passwordHash })
    .from(people)
    .where(eq(people.email, input.email))
    .get()
  const hash = person?.status === 'active' ? person.hash : null
  const right = await isPasswordRight(hash, input.password)
  if (!person || !right) {
    if (person) {
      transact(db, (tx) => recordEvent(tx, systemActor, 'sign-in refused', now, { subject: person.id }))
    }
    throw refuse('invalid', 'The e-mail address or the password is not right; please try again.')
  }
  return transact(db, (tx) => {
    forgiveTries(tx, tries)
    const sessionId = openSession(tx, person.id, client.agent, now)
    const actor = { ...systemActor, kind: 'person' as const, id: person.id, name: person.name }
    recordEvent(tx, actor, 'signed in', now)
    return { personId: person.id, name: person.name, sessionId }
  })
}
