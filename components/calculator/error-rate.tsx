'use client'

import { useMemo } from 'react'
import { familyWiseError } from '@/lib/checks/sensitivity/family-wise-error'
import { Field, Input } from '../ui/field'
import { formatComputed } from '../ui/format-value'
import type { CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'

type ErrorRateProps = {
  m: number
  alpha: number
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** The picture is the same beyond, and the integral gets long. */
const MOST_CORRELATED = 5000
const MOST_GROUPS = 100

/** How likely a false rejection is when nothing is corrected. */
export function ErrorRate({ m, alpha, input, onChange }: ErrorRateProps) {
  const rho = readBetween(input.rho, 0, 1)
  const groups = readWhole(input.groupCount, 2)
  const k = groups.value ?? groupsOfPairs(m)
  const correlated = useMemo(
    () => (rho.value === null || m > MOST_CORRELATED ? null : familyWiseError(alpha, m, { rho: rho.value })),
    [rho.value, m, alpha],
  )
  const pairs = useMemo(
    () => (k !== null && k <= MOST_GROUPS ? familyWiseError(alpha, m, { allPairsOf: k }) : null),
    [k, m, alpha],
  )
  return (
    <div className="flex flex-col gap-2">
      <dl className="tabular grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-1">
        <dt>
          {m.toLocaleString('en')} independent tests at α = {alpha} each
        </dt>
        <dd className="text-right">{formatComputed(familyWiseError(alpha, m), 4)}</dd>
        <dt>correlated equally, ρ = {rho.value ?? '–'}</dt>
        <dd className="text-right">{correlated === null ? '–' : formatComputed(correlated, 4)}</dd>
        <dt>at worst, under any dependence</dt>
        <dd className="text-right">{formatComputed(Math.min(1, m * alpha), 4)}</dd>
        {k !== null && (
          <>
            <dt>
              all {(k * (k - 1)) / 2} pairs of {k} equal groups, large samples
            </dt>
            <dd className="text-right">{pairs === null ? '–' : formatComputed(pairs, 4)}</dd>
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
            placeholder={k === null ? undefined : String(k)}
            value={input.groupCount}
            onChange={(event) => onChange({ groupCount: event.target.value })}
          />
        </Field>
      </div>
    </div>
  )
}

/** k where m is the number of pairs of k groups, else null. */
function groupsOfPairs(m: number): number | null {
  const k = Math.round((1 + Math.sqrt(1 + 8 * m)) / 2)
  return k >= 3 && (k * (k - 1)) / 2 === m ? k : null
}
