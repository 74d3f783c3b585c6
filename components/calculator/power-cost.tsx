'use client'

import { useMemo } from 'react'
import { Field, Input, Select } from '../ui/field'
import { formatComputed } from '../ui/format-value'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { POWER_CHOICES, type CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'
import { capitalise, shortNameOf } from './short-names'
import { getPower, type PowerRow } from './shown-power'
import { useSettled } from './use-settled'

const designs: Record<CalculatorInput['design'], string> = {
  independent: 'each test on two groups of its own',
  pairs: 'all pairs of groups',
  'many-to-one': 'each group against one control',
  paired: 'paired, or one sample',
}

type PowerCostProps = {
  m: number
  alpha: number
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** What each procedure leaves of a test's power, and the sample that regains it. */
export function PowerCost({ m, alpha, input, onChange }: PowerCostProps) {
  const n = readWhole(input.size, 2)
  const effect = readBetween(input.effect, 0.01, 20)
  const { design, size, groupCount } = input
  const asked = useMemo(
    () => ({ m, alpha, design, size, effect: input.effect, groupCount }),
    [m, alpha, design, size, input.effect, groupCount],
  )
  const settled = useSettled(asked, 300)
  const power = useMemo(() => getPower(settled), [settled])
  return (
    <div className="flex flex-col gap-3">
      <div className="grid grid-cols-2 gap-3 @xl:grid-cols-[minmax(0,2fr)_minmax(0,1fr)_minmax(0,1fr)]">
        <Field label="Design" className="max-@xl:col-span-2">
          <Select
            value={design}
            onChange={(event) => {
              const chosen = POWER_CHOICES.find((one) => one === event.target.value)
              if (chosen) onChange({ design: chosen })
            }}
            options={POWER_CHOICES.map((value) => ({ value, label: designs[value] }))}
          />
        </Field>
        <Field label={design === 'paired' ? 'Pairs' : 'n per group'} error={n.fault ?? undefined}>
          <Input
            inputMode="numeric"
            value={size}
            onChange={(event) => onChange({ size: event.target.value })}
          />
        </Field>
        <Field label="Effect, in SD" error={effect.fault ?? undefined}>
          <Input
            inputMode="decimal"
            value={input.effect}
            onChange={(event) => onChange({ effect: event.target.value })}
          />
        </Field>
      </div>
      {power?.rows && <PowerTable rows={power.rows} />}
      {power && power.rows === null && <p>{power.why}</p>}
    </div>
  )
}

function PowerTable({ rows }: { rows: readonly PowerRow[] }) {
  return (
    <Table caption="Power of one comparison by procedure">
      <Thead>
        <tr role="row">
          <Th>Procedure</Th>
          <Th number>Level of one test</Th>
          <Th number>Power</Th>
          <Th number>n for 0.80</Th>
        </tr>
      </Thead>
      <Tbody>
        {rows.map(({ procedure, perTestLevel, power, bounds, nFor80 }) => (
          <Tr key={procedure}>
            <RowTh className="font-normal">
              {procedure === 'none' ? capitalise('no correction') : shortNameOf(procedure)}
            </RowTh>
            <Td number>{perTestLevel === null ? 'by steps' : formatComputed(perTestLevel, 4)}</Td>
            <Td number>
              {power === null
                ? `${formatComputed(bounds.low, 3)} – ${formatComputed(bounds.high, 3)}`
                : formatComputed(power, 3)}
            </Td>
            <Td number>
              {nFor80 === null ? '–' : Number.isFinite(nFor80) ? nFor80.toLocaleString('en') : '∞'}
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}
