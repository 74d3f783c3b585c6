'use client'

import { useMemo } from 'react'
import { Button } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import type { CalculatorInput } from './calculator-input'
import { kelpValues } from './examples'
import { useSettled } from './use-settled'
import { ValuesForm } from './values-form'
import { ValuesResults } from './values-results'
import { readInput, workOut } from './work-out'

/** Characters beyond which reading and correcting takes a noticeable time. */
const LONG = 20_000

type CalculatorProps = {
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
  id: string
}

/** A list of p-values at the left, what follows from it at the right; one below the other where it is narrow. */
export function Calculator({ input, onChange, id }: CalculatorProps) {
  // Typing stays swift: the results follow when there is time, those of a long list when the typing rests.
  const late = useSettled(input, input.values.length > LONG ? 400 : 0)
  const read = useMemo(() => readInput(late), [late])
  const worked = useMemo(() => workOut(read, late), [read, late])
  return (
    <div className="@container">
      <div className="grid gap-x-10 gap-y-8 @4xl:grid-cols-[19rem_minmax(0,1fr)] @6xl:grid-cols-[21rem_minmax(0,1fr)]">
        <section
          aria-label="The list and its settings"
          className="@4xl:sticky @4xl:top-4 @4xl:max-h-[calc(100dvh-2rem)] @4xl:self-start @4xl:overflow-y-auto @4xl:pr-1 @4xl:pb-2 print:hidden"
        >
          <ValuesForm input={input} onChange={onChange} read={read} faults={worked.faults} id={id} />
        </section>
        <section
          aria-label="Results"
          aria-busy={late !== input}
          className="@container min-w-0 @4xl:border-l @4xl:border-rule @4xl:pl-10"
        >
          {read.entries.length === 0 ? (
            <EmptyState
              action={
                <Button variant="primary" onClick={() => onChange(kelpValues)}>
                  Show an example
                </Button>
              }
            >
              {input.values.trim() === ''
                ? 'Paste or type p-values, and what each correction makes of them stands here as you type.'
                : 'Nothing in this text was read as a p-value; the list at the left says why.'}
            </EmptyState>
          ) : (
            <ValuesResults input={late} read={read} worked={worked} onChange={onChange} id={id} />
          )}
        </section>
      </div>
    </div>
  )
}
