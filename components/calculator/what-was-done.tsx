'use client'

import { useMemo } from 'react'
import type { Entry } from '@/lib/checks/calculate/entry'
import { procedureTable } from '@/lib/checks/procedures/table'
import { Field, Textarea } from '../ui/field'
import type { CalculatorInput } from './calculator-input'
import { capitalise } from './short-names'
import { getFits, MOST_COMPARED } from './shown-beside'
import { count, type WorkedOut } from './work-out'

type WhatWasDoneProps = {
  entries: readonly Entry[]
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
  faults: WorkedOut['faults']
}

/** Which procedure and family size give the printed adjusted values. */
export function WhatWasDone({ entries, input, onChange, faults }: WhatWasDoneProps) {
  const shown = useMemo(() => getFits(entries, input.reading), [entries, input.reading])
  return (
    <div className="flex flex-col gap-2">
      <Field
        label={
          <>
            Printed adjusted <i>p</i>
          </>
        }
        optional
        error={faults.printed}
        hint="In the order of the list; a column of a pasted table is taken by itself."
      >
        <Textarea
          rows={3}
          className="font-mono text-sm"
          spellCheck={false}
          value={input.printed}
          onChange={(event) => onChange({ printed: event.target.value })}
        />
      </Field>
      <div aria-live="polite">
        {shown === null && <p>More than {MOST_COMPARED} pairs of values are not compared here.</p>}
        {shown && shown.compared > 0 && (
          <>
            <p>
              {shown.found.length === 0
                ? `No procedure known here, with m up to ${shown.upTo}, gives the ${count(shown.compared, 'printed value')} from the raw ones.`
                : shown.found.length === 1
                  ? 'One procedure gives all printed values from the raw ones:'
                  : 'The printed values do not tell these apart; each gives all of them from the raw ones:'}
            </p>
            <ul className="mt-1">
              {shown.found.slice(0, 12).map(({ procedure, m }) => (
                <li key={`${procedure} ${m}`} className="tabular">
                  {procedure === 'raw' ? (
                    'no adjustment at all'
                  ) : (
                    <>
                      {capitalise(procedureTable[procedure].label)}, <i>m</i> = {m}
                    </>
                  )}
                </li>
              ))}
              {shown.found.length > 12 && <li>and {count(shown.found.length - 12, 'other')}</li>}
            </ul>
          </>
        )}
      </div>
    </div>
  )
}
