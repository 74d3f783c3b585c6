'use client'

import dynamic from 'next/dynamic'
import { useState } from 'react'
import type { Claim, Family, Report, Statistic } from '@/lib/checks/types'
import { Button, ButtonLink } from '../ui/button'
import { LoadingSteps } from '../ui/mark'
import { SidePanel } from '../ui/side-panel'
import { encodeInput, LONGEST_LINK, type CalculatorInput } from './calculator-input'
import { inputOfFamily } from './input-of-family'
import { count } from './work-out'

// The bench does without the calculator until someone asks for it.
const Calculator = dynamic(() => import('./calculator').then((module) => module.Calculator), {
  loading: () => <LoadingSteps label="Opening the calculator" />,
})

type OpenInCalculatorProps = {
  family: Family
  claim: Claim | null
  alpha: number
  reports: ReadonlyMap<string, Report>
  statistics: ReadonlyMap<string, Statistic>
}

/** A family in the calculator, beside the bench: what would be if. Nothing of it is kept. */
export function OpenInCalculator(props: OpenInCalculatorProps) {
  const [opened, setOpened] = useState<{ input: CalculatorInput; left: string[] } | null>(null)
  const change = (part: Partial<CalculatorInput>) =>
    setOpened((before) => before && { ...before, input: { ...before.input, ...part } })
  const fragment = opened ? encodeInput(opened.input) : ''
  return (
    <>
      <Button size="small" variant="quiet" onClick={() => setOpened(inputOfFamily(props))}>
        Open in the calculator
      </Button>
      <SidePanel
        open={opened !== null}
        onOpenChange={(open) => {
          if (!open) setOpened(null)
        }}
        title={`What if: ${props.family.label}`}
        description="A copy of the family to try things on. It changes nothing in the audit or the record."
        actions={
          fragment.length <= LONGEST_LINK && (
            <ButtonLink size="small" href={`/calculator#${fragment}`} target="_blank">
              Open as a page
            </ButtonLink>
          )
        }
      >
        {opened && (
          <>
            {opened.left.length > 0 && (
              <p className="mb-4 border-l-3 border-undecidable pl-3">
                {count(opened.left.length, 'comparison')} with only an adjusted value printed{' '}
                {opened.left.length === 1 ? 'is' : 'are'} left out: {opened.left.join(', ')}.
              </p>
            )}
            <Calculator input={opened.input} onChange={change} id={`family-${props.family.id}`} />
          </>
        )}
      </SidePanel>
    </>
  )
}
