import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { people, personRoles } from '@/db/schema'
import { composeInvitation } from '@/lib/mail/account-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { listOf } from '@/lib/rules/list-of'
import { refuse } from '@/lib/rules/refusal'
import { ROLES, type Actor } from '@/lib/rules/roles'
import { createMailedLink } from './mailed-link'
import { requirePermission } from './permission'

export const invitePersonInput = z.object({
  email: z.string().trim().toLowerCase().pipe(z.email('Please give an e-mail address.')),
  name: z.string().trim().min(1, 'Please give a name.').max(200),
  affiliation: z.string().trim().max(300).default(''),
  expertise: z.string().trim().max(1000).default(''),
  roles: listOf(z.enum(ROLES)).pipe(z.array(z.enum(ROLES)).min(1, 'Please choose a role.')),
})

export type InvitePersonResult = { personId: string }

/** Makes an account and mails the link that opens it; who has not come yet is sent another link. */
export function invitePerson(
  db: Db,
  actor: Actor,
  input: z.infer<typeof invitePersonInput>,
  now: number,
): InvitePersonResult {
  return transact(db, (tx) => {
    requirePermission(actor, 'people.invite')
    const { email, name, affiliation, expertise } = input
    const there = tx
      .select({ id: people.id, status: people.status })
      .from(people)
      .where(eq(people.email, email))
      .get()
    if (there && there.status !== 'invited') {
      const message = 'There is an account with this address already.'
      throw refuse('conflict', message, { email: message })
    }
    const personId = there?.id ?? newId('person')
    if (there) {
      tx.update(people).set({ name, affiliation, expertise }).where(eq(people.id, personId)).run()
      tx.delete(personRoles).where(eq(personRoles.personId, personId)).run()
    } else {
      tx.insert(people)
        .values({ id: personId, email, name, affiliation, expertise, status: 'invited', createdAt: now })
        .run()
    }
    const roles = [...new Set(input.roles)]
    tx.insert(personRoles)
      .values(roles.map((role) => ({ personId, role })))
      .run()
    const token = createMailedLink(tx, personId, 'invitation', now)
    queueMail(tx, composeInvitation({ email, name }, token), now)
    recordEvent(tx, actor, 'person invited', now, {
      subject: personId,
      detail: { roles: roles.join(', '), again: there !== undefined },
    })
    return { personId }
  })
}
