import type { ReactNode } from 'react'

type EmptyStateProps = {
  /** One sentence. */
  children: ReactNode
  /** One thing to do. */
  action?: ReactNode
}

/** What stands where nothing is: one sentence and one thing to do. */
export function EmptyState({ children, action }: EmptyStateProps) {
  return (
    <div className="margin-rule my-6 ml-2 flex flex-col items-start gap-4 py-6 pl-6">
      <p className="max-w-[52ch] font-serif text-base">{children}</p>
      {action}
    </div>
  )
}
