import { Check, CircleDashed, X } from 'lucide-react'
import type { PointStatus } from '@/lib/rules/words'

const looks = {
  open: { icon: CircleDashed, word: 'undecided', tone: 'text-ink-soft' },
  kept: { icon: Check, word: 'kept for the letter', tone: 'text-tide' },
  dropped: { icon: X, word: 'dropped', tone: 'text-ink-soft' },
} as const

/** What the reviewer decided about a point. */
export function PointStatusMark({ status }: { status: PointStatus }) {
  const { icon: Icon, word, tone } = looks[status]
  return (
    <span className={`inline-flex items-center gap-1 text-xs whitespace-nowrap ${tone}`}>
      <Icon className="size-3.5" aria-hidden="true" />
      {word}
    </span>
  )
}
