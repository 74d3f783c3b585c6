'use client'

import type { Unread } from '@/lib/checks/calculate/entry'
import { MOST_VALUES, type ReadValues } from '@/lib/checks/calculate/read-values'
import { Field, Select } from '../ui/field'
import type { CalculatorInput } from './calculator-input'
import { count } from './work-out'

/** How many stretches of text are listed one by one. */
const LISTED = 100

/** What was made of the pasted text: how many values, what was not read and why. */
export function ReadReport({ read, noun }: { read: { count: number; unread: Unread[] }; noun: string }) {
  const { unread } = read
  return (
    <div className="text-sm" aria-live="polite">
      <p>
        {count(read.count, noun)} read
        {unread.length > 0 && <>; {count(unread.length, 'piece')} not read</>}.
      </p>
      {unread.length > 0 && (
        <ul
          className="mt-1 flex max-h-40 flex-col gap-0.5 overflow-y-auto border-l-3 border-undecidable pl-2.5 text-xs"
          tabIndex={0}
          aria-label="What was not read"
        >
          {unread.slice(0, LISTED).map((one, i) => (
            <li key={i}>
              Line {one.line}: <q className="font-mono break-words">{one.text}</q>, {one.why}
            </li>
          ))}
          {unread.length > LISTED && <li>and {count(unread.length - LISTED, 'further piece')}</li>}
        </ul>
      )}
    </div>
  )
}

type ColumnChoiceProps = {
  read: ReadValues
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** Which columns of a pasted table are taken, as found or as chosen. */
export function ColumnChoice({ read, input, onChange }: ColumnChoiceProps) {
  const { header, columns } = read
  if (!header || !columns) return null
  const titles = header.map((title, i) => ({ value: String(i), label: title || `column ${i + 1}` }))
  const fields = [
    { key: 'nameColumn', label: 'Names', found: columns.name, none: true },
    { key: 'valueColumn', label: 'p-values', found: columns.value, none: false },
    { key: 'adjustedColumn', label: 'Printed adjusted', found: columns.adjusted, none: true },
    { key: 'weightColumn', label: 'Weights', found: columns.weight, none: true },
  ] as const
  return (
    <fieldset className="grid grid-cols-2 gap-x-3 gap-y-2 border-l-3 border-rule pl-3">
      <legend className="mb-1 text-xs text-ink-soft">Columns of the table</legend>
      {fields.map(({ key, label, found, none }) => (
        <Field key={key} label={label}>
          <Select
            value={input[key] || (found === null ? '-' : String(found))}
            onChange={(event) => onChange({ [key]: event.target.value })}
            options={[...(none ? [{ value: '-', label: 'none' }] : []), ...titles]}
          />
        </Field>
      ))}
      {read.cut > 0 && (
        <p className="col-span-2">
          Only the first {MOST_VALUES.toLocaleString('en')} values are taken; {read.cut.toLocaleString('en')}{' '}
          are left out.
        </p>
      )}
    </fieldset>
  )
}
