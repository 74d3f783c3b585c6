'use client'

import { useMemo } from 'react'
import { familyWiseError } from '@/lib/checks/sensitivity/family-wise-error'
import { Field, Input } from '../ui/field'
import { formatComputed } from '../ui/format-value'
import type { CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'
import { getCorrelated, getPairs } from './shown-beside'

type ErrorRateProps = {
  m: number
  alpha: number
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** How likely a false rejection is when nothing is corrected. */
export function ErrorRate({ m, alpha, input, onChange }: ErrorRateProps) {
  const rho = readBetween(input.rho, 0, 1)
  const groups = readWhole(input.groupCount, 2)
  const correlated = useMemo(() => getCorrelated(m, alpha, input.rho), [m, alpha, input.rho])
  const pairs = useMemo(() => getPairs(m, alpha, input.groupCount), [m, alpha, input.groupCount])
  return (
    <div className="flex flex-col gap-2">
      <dl className="tabular grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-1">
        <dt>
          {m.toLocaleString('en')} independent tests at α = {alpha} each
        </dt>
        <dd className="text-right">{formatComputed(familyWiseError(alpha, m), 4)}</dd>
        <dt>correlated equally, ρ = {rho.value ?? '–'}</dt>
        <dd className="text-right">{correlated ? formatComputed(correlated.error, 4) : '–'}</dd>
        <dt>at worst, under any dependence</dt>
        <dd className="text-right">{formatComputed(Math.min(1, m * alpha), 4)}</dd>
        {pairs && (
          <>
            <dt>
              all {(pairs.groups * (pairs.groups - 1)) / 2} pairs of {pairs.groups} equal groups, large
              samples
            </dt>
            <dd className="text-right">{formatComputed(pairs.error, 4)}</dd>
          </>
        )}
      </dl>
      <div className="grid grid-cols-2 gap-3">
        <Field label="Correlation ρ" error={rho.fault ?? undefined}>
          <Input
            inputMode="decimal"
            value={input.rho}
            onChange={(event) => onChange({ rho: event.target.value })}
          />
        </Field>
        <Field label="Groups, if all pairs" error={groups.fault ?? undefined}>
          <Input
            inputMode="numeric"
            placeholder={pairs ? String(pairs.groups) : undefined}
            value={input.groupCount}
            onChange={(event) => onChange({ groupCount: event.target.value })}
          />
        </Field>
      </div>
    </div>
  )
}
