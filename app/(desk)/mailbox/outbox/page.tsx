import { notFound } from 'next/navigation'
import { createLoader, parseAsInteger } from 'nuqs/server'
import { MailboxTabs } from '@/components/mailbox/mailbox-tabs'
import { OutboxTable } from '@/components/mailbox/outbox-table'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { UrlPager } from '@/components/ui/url-pager'
import { getDb } from '@/db/current'
import { listMails } from '@/db/queries/mails'
import { may } from '@/lib/rules/permissions'
import { getSettings } from '@/lib/settings'
import { requireActor } from '@/lib/web/actor'

export const metadata = { title: 'Outbox' }

const loadParams = createLoader({ page: parseAsInteger.withDefault(1) })

export default async function OutboxPage({ searchParams }: PageProps<'/mailbox/outbox'>) {
  const actor = await requireActor()
  if (!may(actor, 'outbox.read')) notFound()
  const { page } = await loadParams(searchParams)
  const mails = listMails(getDb(), actor, { page: Math.max(1, page) })
  return (
    <Page>
      <PageHead
        title="Mailbox"
        lead="A mail is written with what causes it and sent by the worker; it is tried again until it goes."
      />
      {getSettings().mailbox === null ? null : <MailboxTabs />}
      {mails.rows.length === 0 ? (
        <EmptyState>No mail has been written yet.</EmptyState>
      ) : (
        <>
          <OutboxTable mails={mails.rows} />
          <UrlPager {...mails} things="mails" />
        </>
      )}
    </Page>
  )
}
