'use client'

import { useEffect, useRef, useState } from 'react'
import type { DocketFacets } from '@/db/queries/docket'
import { OUTCOMES } from '@/lib/checks/vocabulary'
import { STATES } from '@/lib/rules/states'
import { outcomeWords } from '../shell/outcome-mark'
import { Checkbox } from '../ui/choice'
import { classes } from '../ui/classes'
import { Input, Select } from '../ui/field'
import { isTyping } from '../ui/key-help'
import type { DocketParams, DocketPart } from './docket-params'

type DocketFiltersProps = {
  params: DocketParams
  parts: readonly DocketPart[]
  /** Null until they are known. */
  facets: DocketFacets | null
  onChange: (next: Partial<DocketParams>) => void
}

const partWords: Record<DocketPart, string> = {
  submitter: 'What I handed in',
  reviewer: 'My reviews',
  editor: 'The whole docket',
}

/** What narrows the docket. Every control answers at once; the search waits until one stops typing. */
export function DocketFilters({ params, parts, facets, onChange }: DocketFiltersProps) {
  const shown = STATES.filter((state) => (facets?.states[state] ?? 0) > 0 || params.states.includes(state))
  const toggle = (state: (typeof STATES)[number]) =>
    onChange({
      states: params.states.includes(state)
        ? params.states.filter((other) => other !== state)
        : [...params.states, state],
      page: 1,
    })
  return (
    <search className="mb-3 flex flex-col gap-3">
      <div className="flex flex-wrap items-center gap-2">
        <SearchBox value={params.search} onChange={(search) => onChange({ search, page: 1 })} />
        {parts.length > 1 ? (
          <Select
            aria-label="In which part"
            className="sm:max-w-44"
            value={params.as ?? ''}
            empty="All my parts"
            options={parts.map((value) => ({ value, label: partWords[value] }))}
            onChange={(event) =>
              onChange({ as: parts.find((p) => p === event.target.value) ?? null, page: 1 })
            }
          />
        ) : null}
        {parts.includes('editor') || parts.includes('reviewer') ? (
          <Select
            aria-label="Worst outcome"
            className="max-sm:basis-[calc(50%-0.25rem)] max-sm:shrink sm:max-w-44"
            value={params.outcome ?? ''}
            empty="Any outcome"
            options={OUTCOMES.map((value) => ({
              value,
              label: countLabel(outcomeWords[value], facets?.outcomes[value]),
            }))}
            onChange={(event) =>
              onChange({ outcome: OUTCOMES.find((o) => o === event.target.value) ?? null, page: 1 })
            }
          />
        ) : null}
        <Select
          aria-label="Due"
          className="max-sm:basis-[calc(50%-0.25rem)] max-sm:shrink sm:max-w-44"
          value={params.due ?? ''}
          empty="Any due date"
          options={[
            { value: 'overdue', label: countLabel('Overdue', facets?.due.overdue) },
            { value: 'this week', label: countLabel('Due this week', facets?.due['this week']) },
          ]}
          onChange={(event) => {
            const { value } = event.target
            onChange({ due: value === 'overdue' || value === 'this week' ? value : null, page: 1 })
          }}
        />
        {parts.includes('editor') ? (
          <Checkbox
            label="Mine only"
            checked={params.mine}
            onChange={(event) => onChange({ mine: event.target.checked, page: 1 })}
            className="ml-1"
          />
        ) : null}
      </div>
      {shown.length > 1 ? (
        <div role="group" aria-label="States" className="flex flex-wrap gap-1.5">
          {shown.map((state) => (
            <button
              key={state}
              type="button"
              aria-pressed={params.states.includes(state)}
              onClick={() => toggle(state)}
              className={classes(
                'tabular inline-flex h-7 items-center gap-1.5 rounded-sm border px-2 transition-colors',
                params.states.includes(state)
                  ? 'border-tide bg-tide text-on-tide'
                  : 'border-rule bg-sheet hover:border-tide',
              )}
            >
              {state}
              <span className={params.states.includes(state) ? '' : 'text-ink-soft'}>
                {facets?.states[state]}
              </span>
            </button>
          ))}
        </div>
      ) : null}
    </search>
  )
}

function countLabel(label: string, n: number | undefined): string {
  return n === undefined ? label : `${label} (${n})`
}

const settles = 250

function SearchBox({ value, onChange }: { value: string; onChange: (value: string) => void }) {
  const [text, setText] = useState(value)
  const [given, setGiven] = useState(value)
  const box = useRef<HTMLInputElement>(null)
  // The address changed by itself (back, "show everything"): the box follows.
  if (value !== given) {
    setGiven(value)
    if (value !== text.trim()) setText(value)
  }
  useEffect(() => {
    if (text.trim() === value) return
    const timer = setTimeout(() => onChange(text.trim()), settles)
    return () => clearTimeout(timer)
  }, [text, value, onChange])
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== '/' || isTyping(event.target)) return
      event.preventDefault()
      box.current?.focus()
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return (
    <Input
      ref={box}
      type="search"
      aria-label="Search title, reference or author"
      aria-keyshortcuts="/"
      placeholder="Search title, reference or author"
      className="sm:max-w-72"
      maxLength={200}
      value={text}
      onChange={(event) => setText(event.target.value)}
    />
  )
}
