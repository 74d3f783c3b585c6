'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useRef, type ReactNode } from 'react'
import type { AuditProgress } from '@/db/queries/audit-progress'
import { Failed } from '../shell/failed'
import { classes } from '../ui/classes'
import { Notice } from '../ui/notice'
import { ProgressBar } from '../ui/progress-bar'
import { isUnderWay, useAuditProgress } from './resources'

const stages = [
  ['opening', 'Opening the files'],
  ['reading', 'Reading the pages'],
  ['laying out', 'Finding text and tables'],
  ['extracting', 'Collecting the numbers and claims'],
  ['judging', 'Recomputing the families'],
  ['keeping', 'Keeping the audit'],
] as const

/** The audit while it waits and runs, stage by stage; what is wrong when it is stuck. */
export function AuditProgressView(props: {
  manuscriptId: string
  first: AuditProgress
  /** What can be done when it is stuck. */
  remedy: ReactNode
}) {
  const router = useRouter()
  const { data: progress, error, refetch } = useAuditProgress(props.manuscriptId, props.first)
  const underWay = isUnderWay(progress)
  const was = useRef(underWay)
  useEffect(() => {
    // The state of the manuscript changed with it: the page is asked again.
    if (was.current && !underWay) router.refresh()
    was.current = underWay
  }, [underWay, router])
  if (error) return <Failed error={error} onRetry={() => void refetch()} />
  if (!progress || progress.status === 'done') return null
  if (progress.status === 'stuck') {
    return (
      <Notice tone="trouble" title="The audit is stuck" action={props.remedy}>
        {progress.trouble ?? 'It could not be finished; please run it again.'} Nothing is lost.
      </Notice>
    )
  }
  return <Stages progress={progress} />
}

function Stages({ progress }: { progress: AuditProgress }) {
  const at = progress.status === 'queued' ? -1 : stages.findIndex(([stage]) => stage === progress.stage)
  const now = stages[at]
  return (
    <div className="border border-rule bg-sheet p-4">
      <p aria-live="polite" className="font-medium">
        {now ? `${now[1]}…` : 'The audit waits for its turn…'}
      </p>
      <div className="my-2.5">
        <ProgressBar
          label="The audit"
          value={at < 0 ? null : (at + Math.min(1, progress.progress)) / stages.length}
        />
      </div>
      <ol className="grid gap-x-4 gap-y-0.5 text-xs sm:grid-cols-3">
        {stages.map(([stage, words], index) => (
          <li key={stage} className={classes(index > at && 'text-ink-soft', index === at && 'font-semibold')}>
            {index < at ? '✓ ' : ''}
            {words}
            {index < at && <span className="sr-only">, done</span>}
            {index === at && stage === 'reading' && readWords(progress)}
          </li>
        ))}
      </ol>
    </div>
  )
}

function readWords(progress: AuditProgress): string {
  return `, ${Math.round(progress.progress * 100)} %`
}
