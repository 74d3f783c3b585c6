import type { Tx } from '@/db/client'
import { newId } from '@/db/ids'
import { mails } from '@/db/schema'
import { enqueueJob } from '@/lib/jobs/enqueue-job'
import { getSettings } from '@/lib/settings'

export type Mail = {
  /** Name of its kind, such as 'verdict' or 'invitation', for the outbox. */
  template: string
  /** One address. */
  recipient: string
  subject: string
  text: string
  html: string
  manuscriptId?: string | null
}

/** Puts a mail into the outbox and its sending into the queue, in the transaction of what causes it. */
export function queueMail(tx: Tx, mail: Mail, now: number): string {
  const id = newId('mail')
  tx.insert(mails)
    .values({
      ...mail,
      // A subject is one line: a line break in a title must not begin another header.
      subject: mail.subject.replace(/\s+/g, ' ').trim(),
      id,
      manuscriptId: mail.manuscriptId ?? null,
      messageId: `<${id}@${getDomain(getSettings().mailFrom)}>`,
      status: 'queued',
      createdAt: now,
    })
    .run()
  enqueueJob(tx, 'send-mail', id, now)
  return id
}

/** Domain of a sender such as "Tern Harbour Core <desk@ternharbour.example>". */
export function getDomain(sender: string): string {
  return /@([^\s>@]+)>?\s*$/.exec(sender)?.[1] ?? 'localhost'
}
