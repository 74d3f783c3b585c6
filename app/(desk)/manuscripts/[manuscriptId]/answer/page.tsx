import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { AnswerScreen } from '@/components/letters/answer-screen'
import { getDb } from '@/db/current'
import { getLetter } from '@/db/queries/letter'
import { listPoints } from '@/db/queries/points'
import { requireActor } from '@/lib/web/actor'
import { openRoundAction, writeAnswerAction } from '../actions'
import { findManuscript, manuscriptTitle } from '../find-manuscript'

type Props = { params: Promise<{ manuscriptId: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return manuscriptTitle((await params).manuscriptId, 'Letter')
}

export default async function AnswerPage({ params }: Props) {
  const { manuscriptId } = await params
  const manuscript = await findManuscript(manuscriptId)
  if (!manuscript?.actions.includes('readLetter')) notFound()
  const actor = await requireActor()
  const db = getDb()
  const letter = getLetter(db, actor, manuscriptId)
  if (!letter) notFound()
  const points = listPoints(db, actor, manuscriptId, letter.round).filter((point) => point.status === 'kept')
  return (
    <AnswerScreen
      manuscript={manuscript}
      letter={letter}
      points={points}
      write={writeAnswerAction}
      openRound={openRoundAction}
    />
  )
}
