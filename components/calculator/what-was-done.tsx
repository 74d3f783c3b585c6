'use client'

import { useMemo } from 'react'
import { fitPrinted } from '@/lib/checks/calculate/fit-printed'
import type { Entry } from '@/lib/checks/calculate/entry'
import { procedureTable } from '@/lib/checks/procedures/table'
import { Field, Textarea } from '../ui/field'
import type { CalculatorInput } from './calculator-input'
import { capitalise } from './procedure-choice'
import { count, type WorkedOut } from './work-out'

/** Beyond this the search takes longer than a reader waits. */
const MOST_COMPARED = 2000
const FURTHEST = 400

type WhatWasDoneProps = {
  entries: readonly Entry[]
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
  faults: WorkedOut['faults']
}

/** Which procedure and family size give the printed adjusted values. */
export function WhatWasDone({ entries, input, onChange, faults }: WhatWasDoneProps) {
  const compared = entries.filter((entry) => entry.adjusted !== null).length
  const many = compared > MOST_COMPARED
  const found = useMemo(
    () =>
      many
        ? null
        : fitPrinted(entries, input.reading, {
            mMax: Math.min(FURTHEST, Math.max(60, entries.length)),
          }),
    [entries, input.reading, many],
  )
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
        {many && <p>More than {MOST_COMPARED} pairs of values are not compared here.</p>}
        {found && found.compared > 0 && (
          <>
            <p>
              {found.fits.length === 0
                ? `No procedure known here, with m up to ${Math.min(FURTHEST, Math.max(60, entries.length))}, gives the ${count(found.compared, 'printed value')} from the raw ones.`
                : found.fits.length === 1
                  ? 'One procedure gives all printed values from the raw ones:'
                  : 'The printed values do not tell these apart; each gives all of them from the raw ones:'}
            </p>
            <ul className="mt-1">
              {found.fits.slice(0, 12).map(({ procedure, m }) => (
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
              {found.fits.length > 12 && <li>and {count(found.fits.length - 12, 'other')}</li>}
            </ul>
          </>
        )}
      </div>
    </div>
  )
}
