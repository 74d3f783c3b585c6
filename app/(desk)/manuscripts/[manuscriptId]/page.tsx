import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query'
import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { Overview } from '@/components/manuscripts/overview'
import { manuscriptKeys } from '@/components/manuscripts/resources'
import { getDb } from '@/db/current'
import { listComments } from '@/db/queries/comments'
import { getSettings } from '@/lib/settings'
import { requireActor } from '@/lib/web/actor'
import {
  answerAction,
  closeAction,
  declareConflictAction,
  endAssignmentAction,
  handInAgainAction,
  liftConflictAction,
  offerAction,
  runAuditAgainAction,
  withdrawAction,
} from './actions'
import { findManuscript, manuscriptTitle } from './find-manuscript'

type Props = { params: Promise<{ manuscriptId: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId)
}

export default async function ManuscriptPage({ params }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  if (!manuscript) notFound()
  const client = new QueryClient()
  if (manuscript.actions.includes('readComments')) {
    const comments = listComments(getDb(), await requireActor(), manuscriptId)
    client.setQueryData(manuscriptKeys.comments(manuscriptId), comments)
  }
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <Overview
        manuscript={manuscript}
        limitBytes={getSettings().uploadLimitBytes}
        actions={{
          offer: offerAction,
          answer: answerAction,
          endAssignment: endAssignmentAction,
          declareConflict: declareConflictAction,
          liftConflict: liftConflictAction,
          withdraw: withdrawAction,
          close: closeAction,
          runAuditAgain: runAuditAgainAction,
          handInAgain: handInAgainAction,
        }}
      />
    </HydrationBoundary>
  )
}
