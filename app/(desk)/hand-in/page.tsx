import { notFound } from 'next/navigation'
import { BeginDraft } from '@/components/hand-in/begin-draft'
import { DraftList } from '@/components/hand-in/draft-list'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { listDocket } from '@/db/queries/docket'
import { docketFilter } from '@/lib/rules/docket'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { getNow } from '@/lib/web/now'
import { createDraftAction, discardDraftAction } from './actions'

export const metadata = { title: 'Hand in' }

export default async function HandInPage() {
  const actor = await requireActor()
  if (!may(actor, 'draft.create')) notFound()
  const filter = docketFilter.parse({ as: 'submitter', states: ['draft'], pageSize: 200 })
  const drafts = listDocket(getDb(), actor, filter, getNow())
  return (
    <Page narrow>
      <PageHead
        title="Hand in"
        lead="A manuscript as PDF, with its results as a table if you have one. A draft is seen by nobody but you and keeps what you type."
        actions={<BeginDraft begin={createDraftAction} />}
      />
      {drafts.rows.length === 0 ? (
        <EmptyState>There is no draft; what you begin and have not handed in stands here.</EmptyState>
      ) : (
        <DraftList drafts={drafts.rows} discard={discardDraftAction} />
      )}
    </Page>
  )
}
