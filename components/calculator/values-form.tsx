'use client'

import { procedureTable } from '@/lib/checks/procedures/table'
import type { ReadValues } from '@/lib/checks/calculate/read-values'
import { RadioGroup } from '../ui/choice'
import { Field, Input, Select, Textarea } from '../ui/field'
import type { CalculatorInput } from './calculator-input'
import { LevelField } from './level-field'
import { ProcedureChoice } from './procedure-choice'
import { ColumnChoice, ReadReport } from './read-report'
import type { WorkedOut } from './work-out'

type ValuesFormProps = {
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
  read: ReadValues
  faults: WorkedOut['faults']
  /** Tells apart the controls of the page and of a panel above it. */
  id: string
}

/** The list and how it is to be read and corrected. */
export function ValuesForm({ input, onChange, read, faults, id }: ValuesFormProps) {
  const chosen = [input.procedure, ...input.beside]
  const takes = (option: 'weights' | 'transitions' | 'groups') =>
    chosen.some((procedure) => procedureTable[procedure].takes.includes(option))
  const inOrder = chosen.some((procedure) => procedureTable[procedure].adjustInOrder !== null)
  return (
    <div className="flex flex-col gap-4">
      <Field
        label={
          <>
            <i>p</i>-values
          </>
        }
        hint={
          <>
            One a line or several, with or without names; a table with a header; statistics such as t(28) =
            2.05; &lt; .001, ns and decimal commas.
          </>
        }
      >
        <Textarea
          rows={9}
          className="font-mono text-sm"
          spellCheck={false}
          autoComplete="off"
          value={input.values}
          onChange={(event) =>
            onChange({
              values: event.target.value,
              // Another table has other columns.
              nameColumn: '',
              valueColumn: '',
              adjustedColumn: '',
              weightColumn: '',
            })
          }
        />
      </Field>
      {input.values.trim() !== '' && (
        <ReadReport read={{ count: read.entries.length, unread: read.unread }} noun="value" />
      )}
      <ColumnChoice read={read} input={input} onChange={onChange} />
      <div className="grid grid-cols-2 gap-3">
        <LevelField input={input} error={faults.alpha} onChange={onChange} />
        <Field
          label={
            <>
              Family size <i>m</i>
            </>
          }
          error={faults.m}
          hint={input.m === '' ? 'as many as read' : undefined}
        >
          <Input
            inputMode="numeric"
            placeholder={read.entries.length > 0 ? String(read.entries.length) : undefined}
            value={input.m}
            onChange={(event) => onChange({ m: event.target.value })}
          />
        </Field>
      </div>
      <ProcedureChoice input={input} onChange={onChange} />
      {inOrder && (
        <p className="border-l-3 border-rule pl-3 text-xs text-ink-soft">
          Where the order counts, it is that of the list.
        </p>
      )}
      {takes('weights') && (
        <Field
          label="Weights"
          optional
          error={faults.weights}
          hint="One a value, in the order of the list; together at most 1. Left out, all are equal."
        >
          <Input value={input.weights} onChange={(event) => onChange({ weights: event.target.value })} />
        </Field>
      )}
      {takes('transitions') && (
        <Field
          label="Graph"
          error={faults.transitions}
          hint="One row a value: the shares of its level that go to each of the others once it is rejected."
        >
          <Textarea
            rows={4}
            className="font-mono text-sm"
            value={input.transitions}
            onChange={(event) => onChange({ transitions: event.target.value })}
          />
        </Field>
      )}
      {takes('groups') && (
        <Field
          label="Number of groups"
          error={faults.groupCount}
          hint="All pairs of so many groups are the family."
        >
          <Input
            inputMode="numeric"
            value={input.groupCount}
            onChange={(event) => onChange({ groupCount: event.target.value })}
          />
        </Field>
      )}
      <RadioGroup
        legend="Values count"
        name={`${id}-reading`}
        value={input.reading}
        onChange={(reading) => onChange({ reading })}
        options={[
          { value: 'printed', label: 'as printed', hint: '.008 is anything from .0075 to .0085' },
          { value: 'exact', label: 'as exact numbers', hint: '.008 is .008; “< .001” stays a range' },
        ]}
      />
      <Field label="Statistics t, z and r" hint="F and χ² have one tail.">
        <Select
          value={input.sides}
          onChange={(event) => {
            const sides = (['two-sided', 'greater', 'less'] as const).find(
              (one) => one === event.target.value,
            )
            if (sides) onChange({ sides })
          }}
          options={[
            { value: 'two-sided', label: 'two-sided' },
            { value: 'greater', label: 'one-sided, upper tail' },
            { value: 'less', label: 'one-sided, lower tail' },
          ]}
        />
      </Field>
    </div>
  )
}
