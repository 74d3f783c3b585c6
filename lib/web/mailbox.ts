import {
  getReceivedMail,
  listReceivedMails,
  type ReceivedMailBody,
  type ReceivedMail,
} from '@/lib/mail/mailbox'
import { requirePermission } from '@/lib/desk/permission'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'

/** What the local mail server received, newest first; null where a real one is used. For administrators. */
export async function listMailbox(actor: Actor): Promise<ReceivedMail[] | null> {
  requirePermission(actor, 'mailbox.read')
  const { mailbox } = getSettings()
  return mailbox === null ? null : listReceivedMails(mailbox)
}

export async function getMailboxMail(actor: Actor, mailId: string): Promise<ReceivedMailBody | null> {
  requirePermission(actor, 'mailbox.read')
  const { mailbox } = getSettings()
  return mailbox === null ? null : getReceivedMail(mailbox, mailId)
}
