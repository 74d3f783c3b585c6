import { eq, sql } from 'drizzle-orm'
import { createTransport } from 'nodemailer'
import { transact, type Db, type Tx } from '@/db/client'
import { mails } from '@/db/schema'
import { setAsMail } from '@/lib/letters/set-as-mail'
import { hopeless, type JobCall, type Write } from '@/lib/jobs/kind'
import { recordEvent } from '@/lib/record/record-event'
import { systemActor } from '@/lib/rules/roles'
import { linkTemplates } from './account-mails'

/** Hands a mail of the outbox to the mail server. Delivered at least once; the message id stays the same. */
export async function sendMail({ db, settings, subjectId }: JobCall): Promise<Write> {
  const mail = db.select().from(mails).where(eq(mails.id, subjectId)).get()
  if (!mail) throw hopeless('The mail is no longer in the outbox.')
  if (mail.status === 'sent') return () => undefined
  const transport = createTransport({
    url: settings.smtpUrl,
    connectionTimeout: 15_000,
    greetingTimeout: 15_000,
    socketTimeout: 60_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  try {
    await transport.sendMail({
      from: settings.mailFrom,
      to: mail.recipient,
      subject: mail.subject,
      text: mail.text,
      html: setAsMail(mail.subject, mail.html),
      messageId: mail.messageId,
      date: new Date(mail.createdAt),
      headers: { 'Auto-Submitted': 'auto-generated' },
    })
  } catch (error) {
    throw toTrouble(error)
  } finally {
    transport.close()
  }
  return (now) => transact(db, (tx) => noteSent(tx, mail, now))
}

type SentMail = { id: string; template: string; manuscriptId: string | null }

function noteSent(tx: Tx, mail: SentMail, now: number): void {
  tx.update(mails)
    .set({
      status: 'sent',
      sentAt: now,
      attempts: sql`${mails.attempts} + 1`,
      trouble: null,
      ...(linkTemplates.includes(mail.template) ? { text: removed, html: removed } : {}),
    })
    .where(eq(mails.id, mail.id))
    .run()
  recordEvent(tx, systemActor, 'mail sent', now, {
    manuscriptId: mail.manuscriptId,
    subject: mail.id,
    detail: { template: mail.template },
  })
}

const removed = 'This mail held a link that opens an account; it was taken out once the mail was sent.'

/** A refusal for good (5xx) of the sender, the recipient or the text; one of our sign-in there can be mended. */
function toTrouble(error: unknown): Error {
  if (!(error instanceof Error)) return new Error('The mail server could not be reached.')
  const { responseCode, code } = error as { responseCode?: unknown; code?: unknown }
  const status = typeof responseCode === 'number' ? responseCode : null
  const known = status === null ? String(code ?? 'no answer') : String(status)
  // The server's own words may repeat the address; the kind is enough here.
  const message = `The mail server did not take the mail (${known}).`
  const forGood = code === 'EENVELOPE' || code === 'EMESSAGE'
  if (forGood && (status === null || status >= 500)) return hopeless(message, error)
  return new Error(message, { cause: error })
}

/** Keeps what went wrong; a mail that is given up is failed, and the record says so. */
export function noteMailTrouble(
  db: Db,
  mailId: string,
  { trouble, final }: { trouble: string; final: boolean },
  now: number,
): void {
  transact(db, (tx) => {
    const status = final ? { status: 'failed' as const } : {}
    const mail = tx
      .update(mails)
      .set({ trouble, attempts: sql`${mails.attempts} + 1`, ...status })
      .where(eq(mails.id, mailId))
      .returning({ template: mails.template, manuscriptId: mails.manuscriptId })
      .get()
    if (!mail || !final) return
    recordEvent(tx, systemActor, 'mail failed', now, {
      manuscriptId: mail.manuscriptId,
      subject: mailId,
      detail: { template: mail.template },
    })
  })
}
