import type { Severity } from '@/lib/checks/vocabulary'
import { classes } from '../ui/classes'

const steps: Record<Severity, number> = { major: 3, minor: 2, note: 1, question: 0 }

/** The severity of a point: one to three rising steps, or a question mark; always with its word. */
export function SeverityMark({ severity, className }: { severity: Severity; className?: string }) {
  return (
    <span className={classes('inline-flex items-center gap-1.5 whitespace-nowrap', className)}>
      <svg viewBox="0 0 14 14" aria-hidden="true" className="size-3.5 shrink-0 text-ink">
        {severity === 'question' ? (
          <path
            d="M4 4.6a3 3 0 1 1 4.4 2.6C7.3 7.8 7 8.3 7 9.4M7 11.2v1.6"
            fill="none"
            stroke="currentColor"
            strokeWidth="1.7"
          />
        ) : (
          [0, 1, 2].map((step) => (
            <rect
              key={step}
              x={1 + step * 4.2}
              y={9 - step * 3.6}
              width="3.4"
              height={4 + step * 3.6}
              fill={step < steps[severity] ? 'currentColor' : 'none'}
              stroke="currentColor"
              strokeWidth={step < steps[severity] ? 0 : 0.8}
            />
          ))
        )}
      </svg>
      {severity}
    </span>
  )
}
