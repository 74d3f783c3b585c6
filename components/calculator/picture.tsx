'use client'

import { useMemo } from 'react'
import type { Adjusted, Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { StaircaseLegend } from '../charts/staircase-legend'
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
        <StaircaseLegend words={marks} />
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

const marks = {
  dot: 'at or below α alone',
  open: 'above α alone',
  cross: 'open alone',
  fails: 'not after the correction',
  undecidable: 'left open by the rounding',
}
