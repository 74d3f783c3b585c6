'use client'

import { useCallback, useMemo, useRef, useState } from 'react'
import type { CommentRow } from '@/db/queries/comments'
import type { KeptAudit } from '@/db/queries/audit'
import type { ManuscriptView } from '@/db/queries/manuscript'
import { wholeManuscript, type CommentSubject } from '../comments/use-comments'
import { useDecidePoint, usePoints } from '../findings/use-points'
import { toast } from '../ui/toast'
import { AuditPane, type AuditTab } from './audit-pane'
import { indexAudit, type Target } from './audit-index'
import { BenchContext, type BenchState } from './bench-state'
import { BenchBar } from './bench-bar'
import { PagePane } from './page-pane'
import { showInList } from './show-in-list'
import { SplitPanes } from './split-panes'
import { subjectOf, targetOfComment } from './subject-of'
import { useBenchKeys } from './use-bench-keys'

/** Where the pages are; a copy was made of a Word document. */
export type BenchFile = { url: string; isCopy: boolean }

type BenchProps = { manuscript: ManuscriptView; kept: KeptAudit; file: BenchFile | null }

/** Where a reviewer works: the pages beside the audit, every number leading to its place and back. */
export function Bench({ manuscript, kept, file }: BenchProps) {
  const index = useMemo(() => indexAudit(kept.audit), [kept.audit])
  const may = (action: ManuscriptView['actions'][number]) => manuscript.actions.includes(action)
  const mayDecide = may('decidePoint')
  const mayComment = may('writeComment')
  const seesPoints = may('readVerdict')
  const [chosen, setChosen] = useState<Target | null>(null)
  const [asked, setAsked] = useState(0)
  const [tab, setTab] = useState<AuditTab>(index.audit.families.length > 0 ? 'families' : 'findings')
  const [pane, setPane] = useState<'left' | 'right'>('right')
  const [subject, setSubject] = useState<CommentSubject | null>(null)
  const auditPane = useRef<HTMLDivElement>(null)
  const decide = useDecidePoint(manuscript.id)
  const points = usePoints(manuscript.id, seesPoints)

  const show = useCallback((target: Target) => {
    setChosen(target)
    setAsked((count) => count + 1)
    setPane('left')
  }, [])
  const comment = useCallback(
    (target: Target | null) => {
      setSubject(target ? subjectOf(index, target) : wholeManuscript)
      setTab('comments')
      setPane('right')
    },
    [index],
  )
  const state = useMemo<BenchState>(
    () => ({
      manuscriptId: manuscript.id,
      round: kept.round,
      index,
      chosen,
      mayDecide,
      seesPoints,
      show,
      comment: mayComment ? comment : null,
    }),
    [manuscript.id, kept.round, index, chosen, mayDecide, seesPoints, show, comment, mayComment],
  )

  const chooseInList = (target: Target) => {
    const next = tabOf(index.decisions.has(target.id), target, tab)
    setChosen(target)
    setTab(next)
    setPane('right')
    showInList(auditPane, target, next)
  }
  const walk = (step: 1 | -1) => {
    const { findings } = index.audit
    const at = findings.findIndex((finding) => chosen?.kind === 'finding' && finding.id === chosen.id)
    const next = findings[at < 0 ? (step === 1 ? 0 : findings.length - 1) : at + step]
    if (next) chooseInList({ kind: 'finding', id: next.id })
  }
  const set = (status: 'kept' | 'dropped') => {
    const point = points.data?.find((one) => chosen?.kind === 'finding' && one.findingKey === chosen.id)
    if (!point || !mayDecide) return
    decide.mutate(
      { pointId: point.id, status: point.status === status ? 'open' : status },
      { onError: (error) => toast.error(error.message) },
    )
  }
  useBenchKeys({
    j: () => walk(1),
    k: () => walk(-1),
    Enter: () => chosen && show(chosen),
    a: () => set('kept'),
    x: () => set('dropped'),
    c: () => mayComment && comment(chosen),
  })

  return (
    <BenchContext value={state}>
      <div className="flex h-[calc(100dvh-4rem)] flex-col lg:h-dvh print:block print:h-auto">
        <BenchBar manuscript={manuscript} kept={kept} />
        <SplitPanes
          leftName="Pages"
          rightName="Audit"
          shown={pane}
          onShown={setPane}
          left={
            file ? (
              <PagePane {...file} index={index} chosen={chosen} asked={asked} onChoose={chooseInList} />
            ) : (
              <p className="p-6 text-ink-soft">The manuscript’s file is not yours to open.</p>
            )
          }
          right={
            <div ref={auditPane} className="h-full min-h-0 print:h-auto">
              <AuditPane
                tab={tab}
                onTab={setTab}
                mayComment={mayComment}
                seesComments={may('readComments')}
                subject={subject}
                onSubject={setSubject}
                onShowComment={(row: CommentRow) => {
                  const target = targetOfComment(row)
                  if (target) show(target)
                }}
              />
            </div>
          }
        />
      </div>
    </BenchContext>
  )
}

/** The list in which a target has its row: a member of a family there, unless the reader looks at all numbers. */
function tabOf(inFamily: boolean, target: Target, now: AuditTab): AuditTab {
  if (target.kind === 'finding') return 'findings'
  if (target.kind === 'claim') return 'claims'
  if (target.kind === 'statistic') return 'numbers'
  if (target.kind === 'family') return 'families'
  return inFamily && now !== 'numbers' ? 'families' : 'numbers'
}
