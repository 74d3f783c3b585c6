import type { ReactNode } from 'react'

type PageHeadProps = {
  title: ReactNode
  /** A line above the title: where one is. */
  above?: ReactNode
  /** One or two sentences under it. */
  lead?: ReactNode
  /** Buttons at the right, the main one last. */
  actions?: ReactNode
}

/** The head of a screen: its one h1, and what one can do there. */
export function PageHead({ title, above, lead, actions }: PageHeadProps) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        {above ? <p className="mb-0.5 text-xs text-ink-soft">{above}</p> : null}
        <h1 className="text-xl font-semibold">{title}</h1>
        {lead ? <p className="mt-1.5 max-w-prose text-ink-soft">{lead}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap items-center gap-2">{actions}</div> : null}
    </header>
  )
}
