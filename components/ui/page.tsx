import type { ReactNode } from 'react'
import { classes } from './classes'

/** The sheet of a screen beside the rail: at most 1,440 px with the rail; `narrow` for forms and reading. */
export function Page({ narrow, children }: { narrow?: boolean; children: ReactNode }) {
  return (
    <div className={classes('px-4 py-6 lg:px-10 lg:py-8', narrow ? 'max-w-3xl' : 'max-w-[79rem]')}>
      {children}
    </div>
  )
}
