'use client'

import { useMemo, type ReactNode } from 'react'
import type { Adjusted, Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { OutcomeRing } from '../charts/outcome-ring'
import { Staircase } from '../charts/staircase'
import { standOf, wordsOf } from './judge-entry'
import { MOST_DOTS, pictureOf } from './picture-of'
import { nameOf, showAdjusted } from './show-value'

type PictureProps = {
  id: string
  entries: readonly Entry[]
  calculation: Calculation
  main: Adjusted
  alpha: number
  chosen: number | null
  onChoose: (index: number) => void
}

/** The staircase of the list. */
export function CalculatorPicture(props: PictureProps) {
  const { entries, calculation, main, alpha, chosen, onChoose } = props
  const picture = useMemo(
    () => pictureOf(entries, calculation, main, alpha),
    [entries, calculation, main, alpha],
  )
  return (
    <figure className="break-inside-avoid">
      <Staircase
        id={`${props.id}-staircase`}
        family={picture.family}
        reports={picture.reports}
        claim={picture.claim}
        alpha={picture.alpha}
        chosen={chosen === null ? null : String(chosen)}
        onPick={(id) => onChoose(Number(id))}
        describe={(report, decision) => {
          const index = Number(report.id)
          const entry = entries[index]
          const raw = calculation.raw[index]
          const adjusted = main.adjusted[index]
          if (!entry || !raw || !adjusted || !decision) return { name: report.place.quote, words: '' }
          return {
            name: nameOf(entry, index),
            words: `${entry.printed}, adjusted ${showAdjusted(adjusted, entry)}; ${wordsOf(standOf(raw, decision.significant, alpha))}`,
          }
        }}
      />
      <figcaption className="mt-1 text-xs text-ink-soft">
        <Legend />
        {picture.left > 0 && (
          <p className="mt-1">
            The {MOST_DOTS} smallest values are drawn; {picture.left.toLocaleString('en')} larger ones are
            not.
          </p>
        )}
      </figcaption>
    </figure>
  )
}

function Legend() {
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-0.5" aria-label="Marks of the picture">
      <Entry word="at or below α alone">
        <circle r={4} className="fill-ink" />
      </Entry>
      <Entry word="above α alone">
        <circle r={3.6} strokeWidth={1.4} className="fill-sheet stroke-ink" />
      </Entry>
      <Entry word="open alone">
        <path d="M-4 0H4M0 -4V4" strokeWidth={1.6} className="stroke-ink" />
      </Entry>
      <Entry word="not after the correction">
        <OutcomeRing outcome="fails" radius={5} />
      </Entry>
      <Entry word="left open by the rounding">
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
