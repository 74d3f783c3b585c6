'use client'

import { useMemo } from 'react'
import { sampleSizeOfTTest } from '@/lib/checks/sensitivity/power'
import { Field, Input, Select } from '../ui/field'
import { formatComputed } from '../ui/format-value'
import { POWER_CHOICES, type CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'
import { getPower } from './shown-beside'

type PowerCostProps = {
  m: number
  alpha: number
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** What a Bonferroni correction costs a single test, and the sample that would regain it. */
export function PowerCost({ m, alpha, input, onChange }: PowerCostProps) {
  const n = readWhole(input.size, 2)
  const effect = readBetween(input.effect, 0.01, 20)
  const { design, size } = input
  const power = useMemo(
    () => getPower(m, alpha, design, size, input.effect),
    [m, alpha, design, size, input.effect],
  )
  const needed = useMemo(() => {
    if (!power) return NaN
    return power.without < 1 ? sampleSizeOfTTest(design, power.without, power.effect, alpha / m) : power.n
  }, [power, design, alpha, m])
  return (
    <div className="flex flex-col gap-2">
      <div className="grid grid-cols-3 gap-3">
        <Field label="Design">
          <Select
            value={input.design}
            onChange={(event) => {
              const design = POWER_CHOICES.find((one) => one === event.target.value)
              if (design) onChange({ design })
            }}
            options={[
              { value: 'two-sample', label: 'two groups' },
              { value: 'paired', label: 'paired' },
            ]}
          />
        </Field>
        <Field label={input.design === 'paired' ? 'Pairs' : 'n per group'} error={n.fault ?? undefined}>
          <Input
            inputMode="numeric"
            value={input.size}
            onChange={(event) => onChange({ size: event.target.value })}
          />
        </Field>
        <Field label="Effect d" error={effect.fault ?? undefined}>
          <Input
            inputMode="decimal"
            value={input.effect}
            onChange={(event) => onChange({ effect: event.target.value })}
          />
        </Field>
      </div>
      {power && (
        <dl className="tabular grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-1">
          <dt>Power of one test at α = {alpha}</dt>
          <dd className="text-right">{formatComputed(power.without, 3)}</dd>
          <dt>at α / {m.toLocaleString('en')}, Bonferroni</dt>
          <dd className="text-right">{formatComputed(power.with, 3)}</dd>
          <dt>{input.design === 'paired' ? 'Pairs' : 'n per group'} to regain it</dt>
          <dd className="text-right">
            {Number.isFinite(needed) ? needed.toLocaleString('en') : 'more than 10 million'}
          </dd>
        </dl>
      )}
    </div>
  )
}
