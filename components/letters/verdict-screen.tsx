'use client'

import Link from 'next/link'
import type { LetterView } from '@/db/queries/letter'
import type { ManuscriptView } from '@/db/queries/manuscript'
import type { PointRow } from '@/db/queries/points'
import type { VerdictView } from '@/db/queries/verdict'
import { StateTag } from '../shell/state-tag'
import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { Page } from '../ui/page'
import { PageHead } from '../ui/page-head'
import { Time } from '../ui/time'
import { EarlierPoints } from './earlier-points'
import { LetterSheet } from './letter-sheet'
import { PointsList } from './points-list'
import { ReleasePanel } from './release-panel'
import { VerdictForm } from './verdict-form'
import { VerdictSummary } from './verdict-summary'
import type { VerdictActions } from './verdict-actions'

type VerdictScreenProps = {
  manuscript: ManuscriptView
  verdict: VerdictView | null
  /** The draft's letter set as mail, for those who read it only. */
  draftHtml: string | null
  /** The letter of this round as it was sent. */
  letter: LetterView | null
  earlier: readonly PointRow[]
  actions: VerdictActions
}

/** Points at the left, the verdict and its letter at the right; what each may change is the actions' business. */
export function VerdictScreen({
  manuscript,
  verdict,
  draftHtml,
  letter,
  earlier,
  actions,
}: VerdictScreenProps) {
  const may = (action: ManuscriptView['actions'][number]) => manuscript.actions.includes(action)
  const home = `/manuscripts/${manuscript.id}`
  return (
    <Page>
      <PageHead
        above={
          <span className="flex items-center gap-2">
            <Link href={home} className="text-tide hover:underline">
              {manuscript.reference ?? 'Manuscript'}
            </Link>
            <StateTag state={manuscript.state} />
            {manuscript.round > 1 && `round ${manuscript.round}`}
          </span>
        }
        title="Verdict"
        lead={manuscript.title}
        actions={may('readAudit') && <ButtonLink href={`${home}/bench`}>Open the bench</ButtonLink>}
      />
      {verdict && (
        <div className="mb-6">
          <ReleasePanel manuscript={manuscript} verdict={verdict} actions={actions} />
        </div>
      )}
      <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(18rem,2fr)_minmax(0,3fr)]">
        <div>
          <PointsList manuscriptId={manuscript.id} mayDecide={may('decidePoint')} mayAdd={may('addPoint')} />
          <EarlierPoints points={earlier} round={manuscript.round - 1} />
        </div>
        <div className="flex min-w-0 flex-col gap-6">
          {letter ? (
            <>
              {verdict && <VerdictSummary verdict={verdict} />}
              <section aria-label="Letter as sent">
                <p className="mb-2 text-ink-soft">
                  Sent <Time at={letter.sentAt} show="moment" />
                  {letter.version > 1 && `, version ${letter.version}`}
                </p>
                <LetterSheet subject={letter.subject} html={letter.html} />
              </section>
            </>
          ) : may('draftVerdict') ? (
            <VerdictForm manuscriptId={manuscript.id} verdict={verdict} actions={actions} />
          ) : verdict && draftHtml !== null ? (
            <>
              <VerdictSummary verdict={verdict} />
              <section aria-label="Letter as it would be sent">
                <LetterSheet html={draftHtml} />
              </section>
            </>
          ) : (
            <Notice>No verdict has been drafted in this round yet.</Notice>
          )}
        </div>
      </div>
    </Page>
  )
}
