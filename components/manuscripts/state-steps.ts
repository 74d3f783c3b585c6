import type { ManuscriptView } from '@/db/queries/manuscript'
import type { State } from '@/lib/rules/states'

export type Step = {
  label: string
  /** When it was reached; null where that is not known or has not come. */
  at: number | null
  status: 'done' | 'now' | 'to come'
}

type Dated = Pick<
  ManuscriptView,
  'state' | 'stateSince' | 'receivedAt' | 'assignment' | 'verdict' | 'round'
> & {
  progress: { finishedAt: number | null } | null
}

const way: readonly { state: State; label: string }[] = [
  { state: 'received', label: 'received' },
  { state: 'ready', label: 'audited' },
  { state: 'assigned', label: 'assigned' },
  { state: 'in review', label: 'in review' },
  { state: 'verdict drafted', label: 'verdict drafted' },
  { state: 'returned', label: 'returned' },
  { state: 'closed', label: 'closed' },
]

/** The way of a manuscript as a line of steps, with the dates that are known; a draft has none. */
export function makeSteps(manuscript: Dated): Step[] {
  const { state, stateSince } = manuscript
  if (state === 'draft') return []
  if (state === 'withdrawn') {
    return [
      { label: 'received', at: manuscript.receivedAt, status: 'done' },
      { label: 'withdrawn', at: stateSince, status: 'now' },
    ]
  }
  const at = way.findIndex((step) => step.state === (state === 'stuck' ? 'ready' : state))
  return way.map((step, index) => {
    const status = index < at ? 'done' : index === at ? 'now' : 'to come'
    return {
      label: index === at && state === 'stuck' ? 'stuck' : step.label,
      at: status === 'now' ? stateSince : status === 'done' ? dateOf(manuscript, step.state) : null,
      status,
    }
  })
}

function dateOf(manuscript: Dated, state: State): number | null {
  if (state === 'received') return manuscript.receivedAt
  if (state === 'ready') return manuscript.progress?.finishedAt ?? null
  if (state === 'assigned') return manuscript.assignment?.offeredAt ?? null
  if (state === 'in review') return manuscript.assignment?.answeredAt ?? null
  if (state === 'returned') return manuscript.verdict?.releasedAt ?? null
  return null
}
