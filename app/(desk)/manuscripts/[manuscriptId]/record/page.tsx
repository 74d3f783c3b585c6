import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import { RecordTable } from '@/components/record/record-table'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { UrlPager } from '@/components/ui/url-pager'
import { getDb } from '@/db/current'
import { listRecord } from '@/db/queries/record'
import { requireActor } from '@/lib/web/actor'
import { findManuscript, manuscriptTitle } from '../find-manuscript'

type Props = {
  params: Promise<{ manuscriptId: string }>
  searchParams: Promise<{ page?: string | string[] }>
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId, 'Record')
}

export default async function ManuscriptRecordPage({ params, searchParams }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  if (!manuscript?.actions.includes('readRecord')) notFound()
  const page = Math.max(1, Math.floor(Number((await searchParams).page)) || 1)
  const record = listRecord(getDb(), await requireActor(), { manuscriptId, page })
  return (
    <Page>
      <PageHead
        above={
          <Link href={`/manuscripts/${manuscriptId}`} className="text-tide hover:underline">
            {manuscript.reference ?? 'Manuscript'}
          </Link>
        }
        title="Record"
        lead={manuscript.title}
      />
      {record.rows.length === 0 ? (
        <EmptyState>Nothing has been recorded of this manuscript.</EmptyState>
      ) : (
        <>
          <RecordTable rows={record.rows} showManuscript={false} />
          <UrlPager {...record} things="lines" />
        </>
      )}
    </Page>
  )
}
