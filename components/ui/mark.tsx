import { classes } from './classes'

const steps = 'M2 28v-5h9.5v-7h9.5v-7h9'

/** The mark: three rising steps and a dot that stands on one of them. */
export function Mark({ className }: { className?: string }) {
  return (
    <svg viewBox="0 0 32 32" fill="none" aria-hidden="true" className={classes('size-7', className)}>
      <path d={steps} strokeWidth="2" strokeLinecap="square" className="stroke-ink" />
      <circle cx="15.8" cy="11.2" r="3.3" className="fill-tide" />
    </svg>
  )
}

/** The mark while something loads: the dot climbs the steps. */
export function LoadingSteps({ label = 'Loading' }: { label?: string }) {
  return (
    <div role="status" className="flex flex-col items-center gap-3 py-16 text-ink-soft">
      <svg viewBox="0 0 32 32" fill="none" aria-hidden="true" className="size-10 overflow-visible">
        <path d={steps} strokeWidth="1.5" strokeLinecap="square" className="stroke-edge" />
        <circle cx="16.2" cy="11.4" r="3" className="climbing fill-tide" />
      </svg>
      <span>{label}…</span>
    </div>
  )
}
