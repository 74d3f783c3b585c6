'use client'

import { useState } from 'react'
import type { ConflictView, ManuscriptView } from '@/db/queries/manuscript'
import { findTable } from '../columns/find-table'
import { CommentsSection } from '../comments/comments-section'
import type { CommentSubject } from '../comments/use-comments'
import { StateTag } from '../shell/state-tag'
import { Page } from '../ui/page'
import { PageHead } from '../ui/page-head'
import { AuditProgressView } from './audit-progress'
import { LiftConflict } from './lift-conflict'
import type { ManuscriptActions } from './manuscript-actions'
import { NextSteps } from './next-steps'
import { PeopleList } from './people-list'
import { ReleasedVerdict } from './released-verdict'
import { RoundsList } from './rounds-list'
import { StateLine } from './state-line'
import { makeSteps } from './state-steps'
import { StuckRemedy } from './stuck-remedy'

type OverviewProps = { manuscript: ManuscriptView; actions: ManuscriptActions; limitBytes: number }

/** Where a manuscript stands, who has it, and what can be done with it now. */
export function Overview({ manuscript, actions, limitBytes }: OverviewProps) {
  const [subject, setSubject] = useState<CommentSubject | null>(null)
  const may = (action: ManuscriptView['actions'][number]) => manuscript.actions.includes(action)
  const { progress } = manuscript
  const table = findTable(manuscript)
  return (
    <Page>
      <PageHead
        above={
          <span className="flex flex-wrap items-center gap-2">
            {manuscript.reference ?? 'Draft'} <StateTag state={manuscript.state} />
            {manuscript.round > 1 && `round ${manuscript.round}`}
          </span>
        }
        title={manuscript.title || 'Untitled manuscript'}
      />
      <div className="flex flex-col gap-7">
        <StateLine steps={makeSteps(manuscript)} />
        <ReleasedVerdict manuscript={manuscript} />
        {progress && may('followAudit') && (
          <AuditProgressView
            key={progress.auditId}
            manuscriptId={manuscript.id}
            first={progress}
            remedy={null}
          />
        )}
        {may('handInAgain') && (
          <StuckRemedy manuscript={manuscript} limitBytes={limitBytes} handInAgain={actions.handInAgain} />
        )}
        <NextSteps manuscript={manuscript} actions={actions} />
        <div className="grid gap-x-12 gap-y-8 lg:grid-cols-2">
          <section aria-labelledby="people-title">
            <h2 id="people-title" className="mb-2 text-lg font-semibold">
              Who has it
            </h2>
            <PeopleList
              manuscript={manuscript}
              {...(may('liftConflict')
                ? {
                    conflictAction: (conflict: ConflictView) => (
                      <LiftConflict conflict={conflict} lift={actions.liftConflict} />
                    ),
                  }
                : {})}
            />
          </section>
          <section aria-labelledby="files-title">
            <h2 id="files-title" className="mb-2 text-lg font-semibold">
              Rounds and files
            </h2>
            {manuscript.rounds.length > 0 ? (
              <RoundsList
                rounds={manuscript.rounds}
                readable={may('readFiles')}
                {...(table
                  ? { table: { fileId: table.id, href: `/manuscripts/${manuscript.id}/table` } }
                  : {})}
              />
            ) : (
              <p className="text-ink-soft">The files can be opened once the review is accepted.</p>
            )}
          </section>
        </div>
        {may('readComments') && (
          <section aria-labelledby="comments-title">
            <h2 id="comments-title" className="mb-2 text-lg font-semibold">
              Comments
            </h2>
            <CommentsSection
              manuscriptId={manuscript.id}
              mayWrite={may('writeComment')}
              subject={subject}
              onSubject={setSubject}
            />
          </section>
        )}
      </div>
    </Page>
  )
}
