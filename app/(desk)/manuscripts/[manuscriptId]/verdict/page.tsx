import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query'
import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { VerdictScreen } from '@/components/letters/verdict-screen'
import { manuscriptKeys } from '@/components/manuscripts/resources'
import { getDb } from '@/db/current'
import { getLetter } from '@/db/queries/letter'
import { listPoints } from '@/db/queries/points'
import { getVerdict } from '@/db/queries/verdict'
import { renderLetter } from '@/lib/letters/render-letter'
import { requireActor } from '@/lib/web/actor'
import {
  composeLetterAction,
  draftVerdictAction,
  previewLetterAction,
  releaseVerdictAction,
  sendVerdictBackAction,
} from '../actions'
import { findManuscript, manuscriptTitle } from '../find-manuscript'

type Props = { params: Promise<{ manuscriptId: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId, 'Verdict')
}

export default async function VerdictPage({ params }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  if (!manuscript?.actions.includes('readVerdict')) notFound()
  const actor = await requireActor()
  const db = getDb()
  const { round } = manuscript
  const verdict = getVerdict(db, actor, manuscriptId)
  const client = new QueryClient()
  client.setQueryData(manuscriptKeys.points(manuscriptId), listPoints(db, actor, manuscriptId))
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <VerdictScreen
        manuscript={manuscript}
        verdict={verdict}
        draftHtml={verdict && renderLetter(verdict.body).html}
        letter={verdict?.status === 'released' ? getLetter(db, actor, manuscriptId, round) : null}
        earlier={round > 1 ? listPoints(db, actor, manuscriptId, round - 1) : []}
        actions={{
          draft: draftVerdictAction,
          compose: composeLetterAction,
          preview: previewLetterAction,
          sendBack: sendVerdictBackAction,
          release: releaseVerdictAction,
        }}
      />
    </HydrationBoundary>
  )
}
