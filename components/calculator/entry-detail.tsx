'use client'

import { useMemo } from 'react'
import { procedureTable } from '@/lib/checks/procedures/table'
import type { AdjustOptions } from '@/lib/checks/procedures/adjust'
import type { Adjusted, Calculation, Reading } from '@/lib/checks/calculate/calculate'
import { findDecidingDigit, type NextDigit } from '@/lib/checks/calculate/deciding-digit'
import type { Entry } from '@/lib/checks/calculate/entry'
import { OutcomeMark, OutcomeShape } from '../shell/outcome-mark'
import { outcomeOf, standOf, wordsOf } from './judge-entry'
import { capitalise } from './short-names'
import { nameOf, showAdjusted, showInterval, showSurvives } from './show-value'

type EntryDetailProps = {
  entries: readonly Entry[]
  index: number
  calculation: Calculation
  main: Adjusted
  alpha: number
  reading: Reading
  family: AdjustOptions
}

/** One test: what its print stands for, how it stands, which digit would decide, and how far its significance holds. */
export function EntryDetail(props: EntryDetailProps) {
  const { entries, index, calculation, main, alpha, reading, family } = props
  const entry = entries[index]
  const raw = calculation.raw[index]
  const adjusted = main.adjusted[index]
  const open = main.significant[index] === null
  const digits = useMemo(
    () => (open ? findDecidingDigit(entries, index, main.procedure, { alpha, reading, family }) : []),
    [open, entries, index, main.procedure, alpha, reading, family],
  )
  if (!entry || !raw || !adjusted) return null
  const standing = standOf(raw, main.significant[index] ?? null, alpha)
  const outcome = outcomeOf(standing)
  const { bonferroni, holm, bh } = calculation.survives
  return (
    <section aria-label={`About ${nameOf(entry, index)}`} className="border border-rule bg-sheet px-4 py-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <h2 className="text-base font-semibold">{nameOf(entry, index)}</h2>
        {outcome ? (
          <OutcomeMark outcome={outcome}>{wordsOf(standing)}</OutcomeMark>
        ) : (
          <span>{wordsOf(standing)}</span>
        )}
      </div>
      <p className="tabular mt-1">
        <span className="font-mono text-xs">{entry.printed}</span> stands for{' '}
        {showInterval(raw, entry.decimals)}
        {'; '}
        {capitalise(procedureTable[main.procedure].label)} makes it {showAdjusted(adjusted, entry)}.
      </p>
      {open && <Digits digits={digits} entry={entry} />}
      <dl className="tabular mt-2 flex flex-wrap gap-x-6 gap-y-1 text-xs">
        <dt className="text-ink-soft">
          Significant up to <i>m</i>
        </dt>
        {[
          { name: 'Bonferroni', list: bonferroni },
          { name: 'Holm', list: holm },
          { name: 'Benjamini–Hochberg', list: bh },
        ].map(({ name, list }) => {
          const survives = list[index]
          return survives ? (
            <dd key={name}>
              {name} <strong className="font-semibold">{showSurvives(survives)}</strong>
            </dd>
          ) : null
        })}
      </dl>
    </section>
  )
}

/** The values that one more digit could show, each with what it would decide: a ruler of the rounding interval. */
function Digits({ digits, entry }: { digits: readonly NextDigit[]; entry: Entry }) {
  if (digits.length === 0) {
    return <p className="mt-1">Only the value itself would decide: it is printed as a bound.</p>
  }
  const show = ({ value, decimals }: NextDigit) => {
    const text = value.toFixed(Math.min(decimals, 20))
    return entry.printed.trim().startsWith('.') ? text.replace(/^0/, '') : text
  }
  const range = (list: readonly NextDigit[]) => {
    const [first, last] = [list[0], list[list.length - 1]]
    if (!first || !last) return ''
    return first === last ? show(first) : `${show(first)} to ${show(last)}`
  }
  const kept = digits.filter((one) => one.significant === true)
  const lost = digits.filter((one) => one.significant === false)
  const open = digits.filter((one) => one.significant === null)
  return (
    <div className="mt-2">
      <p>
        {kept.length === 0 && lost.length === 0
          ? 'No further digit of this value alone decides it: the rounding of the others counts too.'
          : [
              'One more digit would decide: ',
              kept.length > 0 && `${range(kept)} is significant`,
              kept.length > 0 && lost.length > 0 && ', ',
              lost.length > 0 && `${range(lost)} is not`,
              open.length > 0 && `; ${range(open)} would leave it open`,
              '.',
            ].filter(Boolean)}
      </p>
      <ol className="tabular mt-2 flex flex-wrap gap-y-1 text-xs" aria-hidden="true">
        {digits.map((one) => (
          <li key={one.value} className="flex flex-col items-center gap-0.5 border-t border-edge px-1.5 pt-1">
            <OutcomeShape
              outcome={one.significant === null ? 'undecidable' : one.significant ? 'holds' : 'fails'}
            />
            {show(one)}
          </li>
        ))}
      </ol>
    </div>
  )
}
