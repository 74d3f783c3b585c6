'use client'

import { listComputable } from '@/lib/checks/calculate/calculate'
import { procedureTable } from '@/lib/checks/procedures/table'
import type { CatalogueProcedure } from '@/lib/checks/vocabulary'
import { Checkbox } from '../ui/choice'
import { Field, Select } from '../ui/field'
import type { CalculatorInput } from './calculator-input'
import { capitalise, shortNameOf } from './short-names'

const computable = listComputable()
const controlWords = {
  fwer: 'family-wise error rate',
  fdr: 'false discovery rate',
  none: 'neither error rate',
} as const

type ProcedureChoiceProps = {
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** The procedure that decides, with what it controls and assumes, and those shown beside it. */
export function ProcedureChoice({ input, onChange }: ProcedureChoiceProps) {
  const { controls, assumption, source } = procedureTable[input.procedure]
  const others = computable.filter((procedure) => procedure !== input.procedure)
  const chosen = others.filter((procedure) => input.beside.includes(procedure))
  const toggle = (procedure: CatalogueProcedure, shown: boolean) =>
    onChange({
      beside: computable.filter((one) => (one === procedure ? shown : input.beside.includes(one))),
    })
  return (
    <div className="flex flex-col gap-2">
      <Field
        label="Procedure"
        hint={
          <>
            Controls the {controlWords[controls]}. Assumes: {assumption}. <cite>{source}</cite>
          </>
        }
      >
        <Select
          value={input.procedure}
          onChange={(event) => {
            const procedure = computable.find((one) => one === event.target.value)
            if (procedure) onChange({ procedure })
          }}
          options={computable.map((procedure) => ({
            value: procedure,
            label: capitalise(procedureTable[procedure].label),
          }))}
        />
      </Field>
      <details className="group">
        <summary className="text-tide">
          Beside {shortNameOf(input.procedure)}:{' '}
          {chosen.length === 0 ? 'no other' : chosen.map(shortNameOf).join(', ')}
        </summary>
        <fieldset className="mt-2 flex flex-col gap-3">
          <legend className="sr-only">Procedures shown beside it</legend>
          {(['fwer', 'fdr'] as const).map((rate) => (
            <div key={rate} role="group" aria-label={`Procedures for the ${controlWords[rate]}`}>
              <p className="mb-1 text-xs text-ink-soft" aria-hidden="true">
                {capitalise(controlWords[rate])}
              </p>
              <div className="flex flex-col gap-1">
                {others
                  .filter((procedure) => procedureTable[procedure].controls === rate)
                  .map((procedure) => (
                    <Checkbox
                      key={procedure}
                      label={capitalise(procedureTable[procedure].label)}
                      checked={input.beside.includes(procedure)}
                      onChange={(event) => toggle(procedure, event.target.checked)}
                    />
                  ))}
              </div>
            </div>
          ))}
        </fieldset>
      </details>
    </div>
  )
}
