'use client'

import { useMemo } from 'react'
import { Button } from '../ui/button'
import { RadioGroup } from '../ui/choice'
import { EmptyState } from '../ui/empty-state'
import { Field, Select, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'
import type { CalculatorInput } from './calculator-input'
import { LevelField } from './level-field'
import { kelpGroups } from './examples'
import { GroupsResults } from './groups-results'
import { ReadReport } from './read-report'
import { summarizeInput } from './summarize-input'
import { useSettled } from './use-settled'

type GroupsCalculatorProps = {
  input: CalculatorInput
  onChange: (part: Partial<CalculatorInput>) => void
}

/** Sizes, means and spreads of groups at the left, the comparisons that follow from them at the right. */
export function GroupsCalculator({ input, onChange }: GroupsCalculatorProps) {
  const late = useSettled(input, 300)
  const { read, groups, summary, refused, faults } = useMemo(() => summarizeInput(late), [late])
  const names = [...new Set(read.groups.map((group) => group.group))]
  return (
    <div className="@container">
      <div className="grid gap-x-10 gap-y-8 @4xl:grid-cols-[19rem_minmax(0,1fr)] @6xl:grid-cols-[21rem_minmax(0,1fr)]">
        <section
          aria-label="The groups and their settings"
          className="flex flex-col gap-4 @4xl:self-start print:hidden"
        >
          <Field
            label="Groups"
            hint="One a line: name, n, mean and SD or SE, with tabs, semicolons, commas or spaces; a header may name the columns."
          >
            <Textarea
              rows={8}
              className="font-mono text-sm"
              spellCheck={false}
              autoComplete="off"
              value={input.groups}
              onChange={(event) => onChange({ groups: event.target.value })}
            />
          </Field>
          {input.groups.trim() !== '' && (
            <ReadReport read={{ count: read.groups.length, unread: read.unread }} noun="group" />
          )}
          {read.spread === null ? (
            <RadioGroup
              legend="The last column holds"
              name="calculator-spread"
              inline
              value={input.spread}
              onChange={(spread) => onChange({ spread })}
              options={[
                { value: 'sd', label: 'standard deviations' },
                { value: 'se', label: 'standard errors' },
              ]}
            />
          ) : (
            <p className="border-l-3 border-rule pl-3 text-xs text-ink-soft">
              By its header the last column holds standard {read.spread === 'sd' ? 'deviations' : 'errors'}.
            </p>
          )}
          <div className="grid grid-cols-2 gap-3">
            <LevelField input={input} error={faults.alpha} onChange={onChange} />
            <Field label="Control">
              <Select
                empty="none: all pairs"
                value={names.includes(input.control) ? input.control : ''}
                onChange={(event) => onChange({ control: event.target.value })}
                options={names.map((name) => ({ value: name, label: name }))}
              />
            </Field>
          </div>
          <RadioGroup
            legend="Means and spreads count"
            name="calculator-groups-reading"
            value={input.reading}
            onChange={(reading) => onChange({ reading })}
            options={[
              { value: 'printed', label: 'as printed', hint: '41.2 is anything from 41.15 to 41.25' },
              { value: 'exact', label: 'as exact numbers' },
            ]}
          />
        </section>
        <section
          aria-label="Results"
          aria-busy={late !== input}
          className="min-w-0 @4xl:border-l @4xl:border-rule @4xl:pl-10"
        >
          {summary ? (
            <GroupsResults groups={groups} summary={summary} input={late} />
          ) : refused && read.groups.length > 0 ? (
            <Notice tone="care">{refused}</Notice>
          ) : (
            <EmptyState
              action={
                <Button variant="primary" onClick={() => onChange(kelpGroups)}>
                  Show an example
                </Button>
              }
            >
              Type the size, mean and spread of each group, and the comparisons between them stand here.
            </EmptyState>
          )}
        </section>
      </div>
    </div>
  )
}
