'use client'

import type { ManuscriptView } from '@/db/queries/manuscript'
import { hasReadingCopy, pagesUrlOf } from '../files/pages-url'
import { useAudit } from '../manuscripts/resources'
import { Failed } from '../shell/failed'
import { ButtonLink } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { LoadingSteps } from '../ui/mark'
import { Bench, type BenchFile } from './bench'

/** The bench, or what stands in its place while there is no audit to work on. */
export function BenchScreen({ manuscript }: { manuscript: ManuscriptView }) {
  const audit = useAudit(manuscript.id)
  if (audit.isPending) return <LoadingSteps label="Loading the audit" />
  if (audit.error) {
    return (
      <div className="p-6">
        <Failed error={audit.error} onRetry={() => void audit.refetch()} />
      </div>
    )
  }
  if (!audit.data) {
    return (
      <div className="p-6">
        <EmptyState action={<ButtonLink href={`/manuscripts/${manuscript.id}`}>Follow the audit</ButtonLink>}>
          The audit of this manuscript is not finished.
        </EmptyState>
      </div>
    )
  }
  return (
    <Bench
      key={audit.data.auditId}
      manuscript={manuscript}
      kept={audit.data}
      file={findFile(manuscript, audit.data.round)}
    />
  )
}

function findFile(manuscript: ManuscriptView, round: number): BenchFile | null {
  if (!manuscript.actions.includes('readFiles')) return null
  const files = manuscript.rounds.find((one) => one.number === round)?.files ?? []
  const file = files.find((one) => one.kind === 'manuscript' && one.replacedAt === null)
  return file ? { url: pagesUrlOf(file), isCopy: hasReadingCopy(file) } : null
}
