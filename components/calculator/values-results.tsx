'use client'

import { useMemo, useState, type ReactNode } from 'react'
import type { ReadValues } from '@/lib/checks/calculate/read-values'
import { writeCalculationCsv } from '@/lib/checks/calculate/write-calculation-csv'
import { classes } from '../ui/classes'
import { Notice } from '../ui/notice'
import type { CalculatorInput } from './calculator-input'
import { EntryDetail } from './entry-detail'
import { ErrorRate } from './error-rate'
import { Headline } from './headline'
import { HowFar } from './how-far'
import { CalculatorPicture } from './picture'
import { PowerCost } from './power-cost'
import { Toolbar } from './toolbar'
import { ValuesTable } from './values-table'
import { WhatWasDone } from './what-was-done'
import type { WorkedOut } from './work-out'
import { writeValuesScript } from './write-values-script'

type ValuesResultsProps = {
  /** What the results follow from; it may lag behind the typing in a long list. */
  input: CalculatorInput
  read: ReadValues
  worked: WorkedOut
  onChange: (part: Partial<CalculatorInput>) => void
  id: string
}

/** All that follows from the list. */
export function ValuesResults({ input, read, worked, onChange, id }: ValuesResultsProps) {
  const { entries, alpha, faults, work } = worked
  const [picked, setPicked] = useState<number | null>(null)
  const firstOpen = useMemo(() => work?.main.significant.indexOf(null) ?? -1, [work])
  if (!work) {
    return <Notice tone="care">The results wait until the settings that are marked make sense.</Notice>
  }
  const { calculation, main, beside, family } = work
  const chosen = picked !== null && picked < entries.length ? picked : firstOpen >= 0 ? firstOpen : null
  const refused = [main, ...beside].filter((one) => one.refused !== null)
  const shared = { entries, calculation, main, alpha }
  return (
    <div className="flex min-w-0 flex-col gap-6">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        {main.refused === null && <Headline calculation={calculation} main={main} alpha={alpha} />}
        <Toolbar
          input={input}
          writeCsv={() => writeCalculationCsv(entries, calculation)}
          writeR={() => writeValuesScript(input, worked)}
        />
      </div>
      {read.scale === 'adjusted' && read.columns && (
        <Notice tone="care">
          By its head the column “{read.header?.[read.columns.value]}” holds adjusted values: correcting them
          again would correct twice.
        </Notice>
      )}
      {refused.length > 0 && (
        <Notice tone="care">
          {refused.map(({ procedure, refused: reason }) => (
            <p key={procedure}>Not computed: {reason}.</p>
          ))}
        </Notice>
      )}
      {main.refused === null && (
        <>
          <CalculatorPicture {...shared} id={id} chosen={chosen} onChoose={setPicked} />
          {chosen !== null && (
            <EntryDetail {...shared} index={chosen} reading={input.reading} family={family} />
          )}
        </>
      )}
      <ValuesTable
        entries={entries}
        calculation={calculation}
        results={[main, ...beside]}
        alpha={alpha}
        chosen={chosen}
        onChoose={setPicked}
      />
      <div className="grid gap-x-10 gap-y-8 @2xl:grid-cols-2">
        <Part title="How far it holds" wide>
          <HowFar entries={entries} calculation={calculation} />
        </Part>
        <Part title="What was really done" note="Which procedure gives the adjusted values that are printed.">
          <WhatWasDone entries={entries} input={input} onChange={onChange} faults={faults} />
        </Part>
        <Part
          title="Without correction"
          note="The chance of at least one false rejection if no effect exists."
        >
          <ErrorRate m={calculation.m} alpha={alpha} input={input} onChange={onChange} />
        </Part>
        <Part title="What a correction costs" note="The power of one comparison that has the effect." wide>
          <PowerCost m={calculation.m} alpha={alpha} input={input} onChange={onChange} />
        </Part>
      </div>
    </div>
  )
}

type PartProps = { title: string; note?: string; wide?: boolean; children: ReactNode }

function Part({ title, note, wide, children }: PartProps) {
  return (
    <section className={classes('min-w-0 border-t border-rule pt-3', wide && '@2xl:col-span-2')}>
      <h2 className="text-lg font-semibold">{title}</h2>
      {note ? <p className="mb-2 text-ink-soft">{note}</p> : <div className="mb-2" />}
      {children}
    </section>
  )
}
