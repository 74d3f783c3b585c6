import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import { ColumnEditor } from '@/components/columns/column-editor'
import { findTable } from '@/components/columns/find-table'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { findManuscript, manuscriptTitle } from '../find-manuscript'

type Props = { params: Promise<{ manuscriptId: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId, 'Results table')
}

export default async function TablePage({ params }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  const file = manuscript && findTable(manuscript)
  if (!file) notFound()
  return (
    <Page>
      <PageHead
        above={
          <Link href={`/manuscripts/${manuscriptId}`} className="text-tide hover:underline">
            {manuscript.reference ?? manuscript.title}
          </Link>
        }
        title="How the results table is read"
      />
      <p className="mb-5 max-w-prose text-ink-soft">
        {file.name}: what each column was taken for, and what was read with it. A column that was misread can
        be named by hand.
      </p>
      <ColumnEditor heading="h2" key={file.id} fileId={file.id} manuscriptId={manuscriptId} />
    </Page>
  )
}
