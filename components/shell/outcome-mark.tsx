import type { Outcome } from '@/lib/checks/vocabulary'
import { classes } from '../ui/classes'

const colours: Record<Outcome, string> = {
  holds: 'text-holds',
  fails: 'text-fails',
  undecidable: 'text-undecidable',
  uncorrected: 'text-uncorrected',
}

export const outcomeWords: Record<Outcome, string> = {
  holds: 'holds',
  fails: 'fails',
  undecidable: 'cannot be decided',
  uncorrected: 'uncorrected',
}

/** The outcome's shape alone: filled disc, filled lozenge, hatched half disc, open ring. Stands beside its word. */
export function OutcomeShape({ outcome, className }: { outcome: Outcome; className?: string }) {
  return (
    <svg
      viewBox="0 0 14 14"
      aria-hidden="true"
      className={classes('size-3.5 shrink-0', colours[outcome], className)}
    >
      {outcome === 'holds' ? <circle cx="7" cy="7" r="5" fill="currentColor" /> : null}
      {outcome === 'fails' ? <path d="M7 0.6 13.4 7 7 13.4 0.6 7Z" fill="currentColor" /> : null}
      {outcome === 'undecidable' ? (
        <g fill="none" stroke="currentColor" strokeWidth="1.3">
          <path d="M7 1.6a5.4 5.4 0 0 0 0 10.8Z" />
          <path d="M7 3.6 3.2 10.6M7 7.4 5.1 11.8M5.6 2 1.8 8.6" strokeWidth="1.1" />
          <path d="M7 1.6a5.4 5.4 0 0 1 0 10.8" strokeDasharray="1.2 1.8" strokeWidth="1" />
        </g>
      ) : null}
      {outcome === 'uncorrected' ? (
        <circle cx="7" cy="7" r="4.6" fill="none" stroke="currentColor" strokeWidth="1.7" />
      ) : null}
    </svg>
  )
}

/** Shape and word. `children` replaces the word where a sentence says more. */
export function OutcomeMark({ outcome, children }: { outcome: Outcome; children?: React.ReactNode }) {
  return (
    <span className={classes('inline-flex items-center gap-1.5 whitespace-nowrap', colours[outcome])}>
      <OutcomeShape outcome={outcome} />
      {children ?? outcomeWords[outcome]}
    </span>
  )
}
