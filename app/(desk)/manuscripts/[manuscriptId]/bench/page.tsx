import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query'
import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { BenchScreen } from '@/components/bench/bench-screen'
import { manuscriptKeys } from '@/components/manuscripts/resources'
import { getDb } from '@/db/current'
import { getAudit } from '@/db/queries/audit'
import { listComments } from '@/db/queries/comments'
import { listPoints } from '@/db/queries/points'
import { requireActor } from '@/lib/web/actor'
import { findManuscript, manuscriptTitle } from '../find-manuscript'

type Props = { params: Promise<{ manuscriptId: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId, 'Bench')
}

export default async function BenchPage({ params }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  if (!manuscript?.actions.includes('readAudit')) notFound()
  const actor = await requireActor()
  const db = getDb()
  const client = new QueryClient()
  client.setQueryData(manuscriptKeys.audit(manuscriptId), getAudit(db, actor, manuscriptId))
  if (manuscript.actions.includes('readVerdict')) {
    client.setQueryData(manuscriptKeys.points(manuscriptId), listPoints(db, actor, manuscriptId))
  }
  if (manuscript.actions.includes('readComments')) {
    client.setQueryData(manuscriptKeys.comments(manuscriptId), listComments(db, actor, manuscriptId))
  }
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <BenchScreen manuscript={manuscript} />
    </HydrationBoundary>
  )
}
