import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query'
import { notFound } from 'next/navigation'
import { docketKey, facetsKey } from '@/components/docket/docket-key'
import { DOCKET_PARTS, loadDocketParams, toDocketFilter } from '@/components/docket/docket-params'
import { DocketScreen } from '@/components/docket/docket-screen'
import { ButtonLink } from '@/components/ui/button'
import { KeyHelp } from '@/components/ui/key-help'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { getDocketFacets, listDocket } from '@/db/queries/docket'
import { getHouseRules } from '@/db/queries/house-rules'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { getNow } from '@/lib/web/now'
import { answerAssignmentAction, offerAssignmentAction } from './actions'

export const metadata = { title: 'Docket' }

export default async function DocketPage({ searchParams }: PageProps<'/docket'>) {
  const actor = await requireActor()
  if (!may(actor, 'docket.list')) notFound()
  const db = getDb()
  const parts = DOCKET_PARTS.filter((part) => actor.roles.includes(part))
  const filter = toDocketFilter(await loadDocketParams(searchParams), parts)
  const client = new QueryClient()
  const now = getNow()
  client.setQueryData(docketKey(filter), listDocket(db, actor, filter, now))
  client.setQueryData(facetsKey(filter.as), getDocketFacets(db, actor, filter, now))
  const maySubmit = may(actor, 'draft.create')
  return (
    <Page>
      <PageHead
        title="Docket"
        actions={
          <>
            <KeyHelp keys={[{ keys: ['/'], does: 'Go to the search' }]} />
            {maySubmit ? (
              <ButtonLink href="/hand-in" variant="primary">
                Hand in
              </ButtonLink>
            ) : null}
          </>
        }
      />
      <HydrationBoundary state={dehydrate(client)}>
        <DocketScreen
          parts={parts}
          mayAssign={may(actor, 'assignment.offer')}
          maySubmit={maySubmit}
          reviewDays={getHouseRules(db, actor)?.rules.reviewDays ?? 14}
          offer={offerAssignmentAction}
          answer={answerAssignmentAction}
        />
      </HydrationBoundary>
    </Page>
  )
}
