import type { ReactNode } from 'react'
import { classes } from './classes'

/** `note`: good to know. `done`: it worked. `care`: look before you go on. `trouble`: it did not work. */
export type NoticeTone = 'note' | 'done' | 'care' | 'trouble'

const tones: Record<NoticeTone, string> = {
  note: 'border-l-tide',
  done: 'border-l-holds',
  care: 'border-l-undecidable',
  trouble: 'border-l-fails',
}

type NoticeProps = {
  tone?: NoticeTone
  title?: ReactNode
  children?: ReactNode
  /** One button or link. */
  action?: ReactNode
  className?: string
}

/** A remark in the margin's manner: a rule at its left in the colour of its tone. Trouble is announced at once. */
export function Notice({ tone = 'note', title, children, action, className }: NoticeProps) {
  return (
    <div
      role={tone === 'trouble' ? 'alert' : undefined}
      className={classes(
        'flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border border-l-3 border-rule bg-sheet px-3.5 py-2.5',
        tones[tone],
        className,
      )}
    >
      <div className="max-w-prose">
        {title ? <p className="font-semibold">{title}</p> : null}
        {children}
      </div>
      {action}
    </div>
  )
}
