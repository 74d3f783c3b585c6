import { and, count, desc, eq, isNotNull, isNull, notInArray, or } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { conflicts, mails, manuscripts } from '@/db/schema'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import type { MailStatus } from '@/lib/rules/words'

/** Without the text: a released letter is not the administrator's to read. */
export type MailRow = {
  id: string
  template: string
  recipient: string
  subject: string
  status: MailStatus
  attempts: number
  trouble: string | null
  createdAt: number
  sentAt: number | null
}

export type MailPage = { rows: MailRow[]; total: number; page: number; pageSize: number }

/**
 * The outbox, newest first. For administrators, but for what concerns a manuscript of their own, or of a
 * conflict: to whom a review was offered would tell who the reviewer is.
 */
export function listMails(
  db: Reader,
  actor: Actor,
  filter: { status?: MailStatus; page?: number; pageSize?: number } = {},
): MailPage {
  const { status, page = 1, pageSize = 50 } = filter
  if (!may(actor, 'outbox.read')) return { rows: [], total: 0, page, pageSize }
  const ones = db
    .select({ id: manuscripts.id })
    .from(manuscripts)
    .leftJoin(
      conflicts,
      and(
        eq(conflicts.manuscriptId, manuscripts.id),
        eq(conflicts.personId, actor.id),
        isNull(conflicts.liftedAt),
      ),
    )
    .where(or(eq(manuscripts.submitterId, actor.id), isNotNull(conflicts.id)))
  const where = and(
    or(isNull(mails.manuscriptId), notInArray(mails.manuscriptId, ones)),
    status && eq(mails.status, status),
  )
  const rows = db
    .select({
      id: mails.id,
      template: mails.template,
      recipient: mails.recipient,
      subject: mails.subject,
      status: mails.status,
      attempts: mails.attempts,
      trouble: mails.trouble,
      createdAt: mails.createdAt,
      sentAt: mails.sentAt,
    })
    .from(mails)
    .where(where)
    .orderBy(desc(mails.createdAt), desc(mails.id))
    .limit(pageSize)
    .offset((page - 1) * pageSize)
    .all()
  const counted = db.select({ n: count() }).from(mails).where(where).get()
  return { rows, total: counted?.n ?? 0, page, pageSize }
}
