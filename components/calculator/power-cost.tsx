'use client'

import { useMemo } from 'react'
import { powerCost, sampleSizeOfTTest } from '@/lib/checks/sensitivity/power'
import { Field, Input, Select } from '../ui/field'
import { formatComputed } from '../ui/format-value'
import { POWER_CHOICES, type CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'

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
  const cost = useMemo(() => {
    if (n.value === null || effect.value === null || n.value > 1e6) return null
    const { design } = input
    const { without, with: left } = powerCost(design, n.value, effect.value, alpha, m)
    const needed = without < 1 ? sampleSizeOfTTest(design, without, effect.value, alpha / m) : n.value
    return { without, left, needed }
  }, [n.value, effect.value, input, alpha, m])
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
      {cost && (
        <dl className="tabular grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-1">
          <dt>Power of one test at α = {alpha}</dt>
          <dd className="text-right">{formatComputed(cost.without, 3)}</dd>
          <dt>at α / {m.toLocaleString('en')}, Bonferroni</dt>
          <dd className="text-right">{formatComputed(cost.left, 3)}</dd>
          <dt>{input.design === 'paired' ? 'Pairs' : 'n per group'} to regain it</dt>
          <dd className="text-right">
            {Number.isFinite(cost.needed) ? cost.needed.toLocaleString('en') : 'more than 10 million'}
          </dd>
        </dl>
      )}
    </div>
  )
}
