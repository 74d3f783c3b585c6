import { notFound } from 'next/navigation'
import type { Metadata } from 'next'
import { Overview } from '@/components/manuscripts/overview'
import { getSettings } from '@/lib/settings'
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
  const manuscript = await findManuscript((await params).manuscriptId)
  if (!manuscript) notFound()
  return (
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
  )
}
