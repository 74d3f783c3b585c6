import type { Outcome } from '@/lib/checks/vocabulary'

/** The outcome's shape alone, to be drawn inside an SVG around (0, 0); radius in the SVG's own units. */
export function OutcomeShape({ outcome, radius }: { outcome: Outcome; radius: number }) {
  if (outcome === 'holds') return <circle r={radius} className="fill-holds" />
  if (outcome === 'fails') return <path d={lozenge(radius * 1.2)} className="fill-fails" />
  if (outcome === 'uncorrected') {
    return <circle r={radius * 0.84} fill="none" strokeWidth={radius * 0.34} className="stroke-uncorrected" />
  }
  return (
    <g className="stroke-undecidable" fill="none" strokeWidth={radius * 0.22}>
      <circle r={radius * 0.9} />
      <path
        d={`M0 ${-radius * 0.9}A${radius * 0.9} ${radius * 0.9} 0 0 0 0 ${radius * 0.9}Z`}
        className="fill-undecidable"
      />
    </g>
  )
}

/** The ring that marks a call which the recomputation does not bear out; its form tells the outcome too. */
export function OutcomeRing({ outcome, radius }: { outcome: Outcome; radius: number }) {
  if (outcome === 'holds') return null
  if (outcome === 'fails') {
    return <path d={lozenge(radius * 1.35)} fill="none" strokeWidth={2} className="stroke-fails" />
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

function lozenge(half: number): string {
  return `M0 ${-half}L${half} 0L0 ${half}L${-half} 0Z`
}
