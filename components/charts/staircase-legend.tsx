import type { ReactNode } from 'react'
import { OutcomeRing } from './outcome-ring'

/** What the filled and the open dot, the cross and the two rings stand for, in the words of the screen. */
export type StaircaseWords = { dot: string; open: string; cross: string; fails: string; undecidable: string }

/** What the marks of a staircase mean. */
export function StaircaseLegend({ words }: { words: StaircaseWords }) {
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-0.5" aria-label="Marks of the picture">
      <Entry word={words.dot}>
        <circle r={4} className="fill-ink" />
      </Entry>
      <Entry word={words.open}>
        <circle r={3.6} strokeWidth={1.4} className="fill-sheet stroke-ink" />
      </Entry>
      <Entry word={words.cross}>
        <path d="M-4 0H4M0 -4V4" strokeWidth={1.6} className="stroke-ink" />
      </Entry>
      <Entry word={words.fails}>
        <OutcomeRing outcome="fails" radius={5} />
      </Entry>
      <Entry word={words.undecidable}>
        <OutcomeRing outcome="undecidable" radius={5.5} />
      </Entry>
      <Entry word="rounding interval">
        <path d="M0 -6V6" strokeWidth={1.4} className="stroke-ink" />
      </Entry>
    </ul>
  )
}

function Entry({ word, children }: { word: string; children: ReactNode }) {
  return (
    <li className="inline-flex items-center gap-1.5">
      <svg viewBox="-8 -8 16 16" className="size-4" aria-hidden="true">
        {children}
      </svg>
      {word}
    </li>
  )
}
