import type { Reader } from '@/db/client'
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

/** The outbox, newest first. For administrators. */
export function listMails(
  _db: Reader,
  _actor: Actor,
  _filter: { status?: MailStatus; page?: number; pageSize?: number } = {},
): MailPage {
  throw new Error('not yet')
}
