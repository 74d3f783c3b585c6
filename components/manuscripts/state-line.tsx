import { Time } from '../ui/time'
import type { Step } from './state-steps'

/** Where a manuscript stands on its way: filled steps behind, the present one marked, open ones before it. */
export function StateLine({ steps }: { steps: readonly Step[] }) {
  if (steps.length === 0) return null
  return (
    <ol aria-label="The way of this manuscript" className="flex flex-col sm:flex-row sm:flex-wrap">
      {steps.map((step) => (
        <li
          key={step.label}
          aria-current={step.status === 'now' ? 'step' : undefined}
          className="relative flex min-w-24 flex-1 gap-2.5 pb-2 pl-1 max-sm:border-l-0 sm:flex-col sm:gap-1 sm:border-t-2 sm:border-rule sm:pt-2.5 sm:pl-0 data-[status=done]:sm:border-ink"
          data-status={step.status}
        >
          <span
            aria-hidden="true"
            className={`size-2.5 shrink-0 rounded-full border-2 max-sm:mt-1.5 sm:absolute sm:-top-1.5 ${dots[step.status]}`}
          />
          <span>
            <span
              className={
                step.status === 'now' ? 'font-semibold' : step.status === 'to come' ? 'text-ink-soft' : ''
              }
            >
              {step.label}
            </span>
            {step.at !== null && (
              <span className="block text-xs text-ink-soft">
                <Time at={step.at} show="short" />
              </span>
            )}
          </span>
        </li>
      ))}
    </ol>
  )
}

const dots: Record<Step['status'], string> = {
  done: 'border-ink bg-ink',
  now: 'border-tide bg-tide outline-2 outline-offset-2 outline-tide',
  'to come': 'border-edge bg-paper',
}
