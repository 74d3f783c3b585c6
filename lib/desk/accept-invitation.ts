import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { people } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { systemActor } from '@/lib/rules/roles'
import { requireMailedLink, takeMailedLink } from './mailed-link'
import { hashPassword, newPassword, requireUnlikeEmail } from './password'

export const acceptInvitationInput = z.object({
  token: z.string().min(1).max(200),
  name: z.string().trim().min(1, 'Please give your name.').max(200),
  affiliation: z.string().trim().max(300).default(''),
  password: newPassword,
})

/** Makes an invited person active, with the name and password they choose. */
export async function acceptInvitation(
  db: Db,
  input: z.infer<typeof acceptInvitationInput>,
  now: number,
): Promise<{ email: string }> {
  const { email } = requireMailedLink(db, input.token, 'invitation', now)
  requireUnlikeEmail(input.password, email)
  const passwordHash = await hashPassword(input.password)
  return transact(db, (tx) => {
    const person = takeMailedLink(tx, input.token, 'invitation', now)
    tx.update(people)
      .set({ name: input.name, affiliation: input.affiliation, passwordHash, status: 'active' })
      .where(eq(people.id, person.personId))
      .run()
    const actor = { ...systemActor, kind: 'person' as const, id: person.personId, name: input.name }
    recordEvent(tx, actor, 'invitation accepted', now)
    return { email: person.email }
  })
}
