import { and, count, eq, gt } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { mailedLinks, people } from '@/db/schema'
import { composePasswordReset } from '@/lib/mail/account-mails'
import { queueMail } from '@/lib/mail/queue-mail'
import { recordEvent } from '@/lib/record/record-event'
import { systemActor } from '@/lib/rules/roles'
import { createMailedLink } from './mailed-link'

export const askPasswordResetInput = z.object({
  email: z.string().trim().toLowerCase().pipe(z.email('Please give an e-mail address.')),
})

const hour = 3_600_000
const mailsAnHour = 3

/** Mails a link to choose a new password. Answers the same whether there is such a person or not. */
export function askPasswordReset(db: Db, input: z.infer<typeof askPasswordResetInput>, now: number): void {
  transact(db, (tx) => {
    const person = tx
      .select({ id: people.id, name: people.name, email: people.email })
      .from(people)
      .where(and(eq(people.email, input.email), eq(people.status, 'active')))
      .get()
    if (!person) return
    const asked = tx
      .select({ n: count() })
      .from(mailedLinks)
      .where(
        and(
          eq(mailedLinks.personId, person.id),
          eq(mailedLinks.purpose, 'password'),
          gt(mailedLinks.createdAt, now - hour),
        ),
      )
      .get()
    // Nobody's mailbox is to be filled from here.
    if (asked && asked.n >= mailsAnHour) return
    const token = createMailedLink(tx, person.id, 'password', now)
    queueMail(tx, composePasswordReset(person, token), now)
    recordEvent(tx, systemActor, 'password asked', now, { subject: person.id })
  })
}
