'use client'

import { useBench } from '../bench/bench-state'
import { Failed } from '../shell/failed'
import { EmptyState } from '../ui/empty-state'
import { FindingCard } from './finding-card'
import { usePoints } from './use-points'

/** The findings in the audit's order, with what was decided about each. */
export function FindingsSection() {
  const { index, manuscriptId, mayDecide, seesPoints } = useBench()
  const points = usePoints(manuscriptId, seesPoints)
  const { findings } = index.audit
  if (findings.length === 0) {
    return (
      <EmptyState>
        Nothing was found that needs a word. That the numbers hold does not say that nothing was missed: the
        families beside this show what was read.
      </EmptyState>
    )
  }
  const byFinding = new Map(
    points.data?.flatMap((point) => (point.findingKey ? [[point.findingKey, point]] : [])),
  )
  const undecided = points.data?.filter((point) => point.status === 'open').length ?? 0
  return (
    <div>
      {points.error && <Failed error={points.error} onRetry={() => void points.refetch()} />}
      {points.data && mayDecide && (
        <p className="pb-2 text-ink-soft" aria-live="polite">
          {undecided === 0 ? 'Every point is decided.' : `${undecided} of ${points.data.length} undecided.`}
        </p>
      )}
      {findings.map((finding) => (
        <FindingCard key={finding.id} finding={finding} point={byFinding.get(finding.id)} />
      ))}
    </div>
  )
}
