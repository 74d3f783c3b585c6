import type { Outcome } from '@/lib/checks/vocabulary'

/** The ring that marks a call which the recomputation does not bear out; its form tells the outcome too. */
export function OutcomeRing({ outcome, radius }: { outcome: Outcome; radius: number }) {
  if (outcome === 'holds') return null
  if (outcome === 'fails') {
    const half = radius * 1.35
    return (
      <path
        d={`M0 ${-half}L${half} 0L0 ${half}L${-half} 0Z`}
        fill="none"
        strokeWidth={2}
        className="stroke-fails"
      />
    )
  }
  return (
    <circle
      r={radius}
      fill="none"
      strokeWidth={2}
      strokeDasharray={outcome === 'undecidable' ? '3 2' : undefined}
      className={outcome === 'undecidable' ? 'stroke-undecidable' : 'stroke-uncorrected'}
    />
  )
}
