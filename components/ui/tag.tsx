import type { ReactNode } from 'react'
import { classes } from './classes'

export type Tone = 'plain' | 'tide' | 'holds' | 'fails' | 'undecidable' | 'uncorrected'

const tones: Record<Tone, string> = {
  plain: 'border-rule text-ink-soft',
  tide: 'border-tide/50 text-tide',
  holds: 'border-holds/50 text-holds',
  fails: 'border-fails/50 text-fails',
  undecidable: 'border-undecidable/60 text-undecidable',
  uncorrected: 'border-uncorrected/60 text-uncorrected',
}

/** A word in a hairline box. The word carries the meaning, the colour only helps. */
export function Tag({ tone = 'plain', children }: { tone?: Tone; children: ReactNode }) {
  return (
    <span
      className={classes(
        'inline-flex h-5 items-center rounded-sm border bg-sheet px-1.5 text-xs whitespace-nowrap',
        tones[tone],
      )}
    >
      {children}
    </span>
  )
}
