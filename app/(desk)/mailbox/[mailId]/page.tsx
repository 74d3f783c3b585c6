import { notFound } from 'next/navigation'
import { MailSheet } from '@/components/mailbox/mail-sheet'
import { ButtonLink } from '@/components/ui/button'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { getMailboxMail } from '@/lib/web/mailbox'

export const metadata = { title: 'Mail' }

export default async function MailPage({ params }: PageProps<'/mailbox/[mailId]'>) {
  const actor = await requireActor()
  if (!may(actor, 'mailbox.read')) notFound()
  const { mailId } = await params
  const mail = await getMailboxMail(actor, mailId)
  if (!mail) notFound()
  return (
    <Page>
      <PageHead
        title={mail.subject || 'Without a subject'}
        actions={<ButtonLink href="/mailbox">All mails</ButtonLink>}
      />
      <MailSheet mail={mail} />
    </Page>
  )
}
