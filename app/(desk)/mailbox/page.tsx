import { notFound, redirect } from 'next/navigation'
import { MailboxTabs } from '@/components/mailbox/mailbox-tabs'
import { ReceivedTable } from '@/components/mailbox/received-table'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { listMailbox } from '@/lib/web/mailbox'

export const metadata = { title: 'Mailbox' }

export default async function MailboxPage() {
  const actor = await requireActor()
  if (!may(actor, 'mailbox.read')) notFound()
  const mails = await listMailbox(actor)
  // With a real mail server nothing is received here.
  if (mails === null) redirect('/mailbox/outbox')
  return (
    <Page>
      <PageHead title="Mailbox" lead="This installation keeps its mails here instead of sending them on." />
      <MailboxTabs />
      {mails.length === 0 ? (
        <EmptyState>No mail has been sent yet.</EmptyState>
      ) : (
        <ReceivedTable mails={mails} />
      )}
    </Page>
  )
}
