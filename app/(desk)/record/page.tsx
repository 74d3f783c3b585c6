import { notFound } from 'next/navigation'
import { createLoader } from 'nuqs/server'
import { RecordFilter } from '@/components/record/record-filter'
import { recordParsers } from '@/components/record/record-params'
import { RecordTable } from '@/components/record/record-table'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { UrlPager } from '@/components/ui/url-pager'
import { getDb } from '@/db/current'
import { listPeople } from '@/db/queries/people'
import { listRecord } from '@/db/queries/record'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'

export const metadata = { title: 'Record' }

const loadParams = createLoader(recordParsers)
const day = 86_400_000

export default async function RecordPage({ searchParams }: PageProps<'/record'>) {
  const actor = await requireActor()
  if (!may(actor, 'record.read')) notFound()
  const given = await loadParams(searchParams)
  const db = getDb()
  const record = listRecord(db, actor, {
    ...(given.event ? { events: [given.event] } : {}),
    ...(given.actor ? { actorId: given.actor } : {}),
    ...(given.manuscript ? { manuscriptId: given.manuscript } : {}),
    ...(given.from ? { from: given.from.getTime() } : {}),
    ...(given.to ? { to: given.to.getTime() + day } : {}),
    page: Math.max(1, given.page),
  })
  const people = may(actor, 'people.list') ? listPeople(db, actor) : []
  return (
    <Page>
      <PageHead title="Record" lead="Who did what and when. Lines are added and never changed." />
      <RecordFilter people={people.map(({ id, name }) => ({ id, name }))} />
      {record.rows.length === 0 ? (
        <EmptyState>No line of the record fits what you asked for.</EmptyState>
      ) : (
        <>
          <RecordTable rows={record.rows} />
          <UrlPager {...record} things="lines" />
        </>
      )}
    </Page>
  )
}
