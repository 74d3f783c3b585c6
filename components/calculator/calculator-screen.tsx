'use client'

import { LoadingSteps } from '../ui/mark'
import { Tabs } from '../ui/tabs'
import { Calculator } from './calculator'
import { GroupsCalculator } from './groups-calculator'
import { useArrivedFragment, useLinkedInput } from './use-address'

/** The calculator as a page: its input is kept in the address. */
export function CalculatorScreen() {
  const arrived = useArrivedFragment()
  if (arrived === null) return <LoadingSteps label="Opening the calculator" />
  return <LinkedCalculator key={arrived} arrived={arrived} />
}

function LinkedCalculator({ arrived }: { arrived: string }) {
  const [input, change] = useLinkedInput(arrived)
  return (
    <Tabs
      label="What is given"
      value={input.mode}
      onValueChange={(mode) => change({ mode: mode === 'groups' ? 'groups' : 'values' })}
      items={[
        {
          value: 'values',
          label: 'From p-values',
          content: <Calculator input={input} onChange={change} id="calculator" />,
        },
        {
          value: 'groups',
          label: 'From group summaries',
          content: <GroupsCalculator input={input} onChange={change} />,
        },
      ]}
    />
  )
}
