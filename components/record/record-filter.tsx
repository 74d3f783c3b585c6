'use client'

import { useQueryStates } from 'nuqs'
import { EVENTS } from '@/lib/rules/events'
import { Button } from '../ui/button'
import { Field, Input, Select } from '../ui/field'
import { recordParsers } from './record-params'

type RecordFilterProps = { people: readonly { id: string; name: string }[] }

export function RecordFilter({ people }: RecordFilterProps) {
  const [given, setGiven] = useQueryStates(recordParsers, { shallow: false, history: 'push' })
  const change = (next: Partial<typeof given>) => void setGiven({ ...next, page: null })
  const day = (value: Date | null) => value?.toISOString().slice(0, 10) ?? ''
  // A date field that is half filled in is empty.
  const toDay = (value: string) => (value === '' ? null : new Date(`${value}T00:00:00Z`))
  const narrowed = given.event ?? given.actor ?? given.manuscript ?? given.from ?? given.to
  return (
    <search className="mb-4 flex flex-wrap items-end gap-3">
      <Field label="Event" className="w-full sm:w-52">
        <Select
          value={given.event ?? ''}
          empty="Any event"
          options={EVENTS.map((event) => ({ value: event, label: event }))}
          onChange={(event) => change({ event: EVENTS.find((e) => e === event.target.value) ?? null })}
        />
      </Field>
      {people.length > 0 ? (
        <Field label="Who" className="w-full sm:w-52">
          <Select
            value={given.actor ?? ''}
            empty="Anyone"
            options={people.map(({ id, name }) => ({ value: id, label: name }))}
            onChange={(event) => change({ actor: event.target.value || null })}
          />
        </Field>
      ) : null}
      <Field label="From">
        <Input
          type="date"
          className="w-40"
          value={day(given.from)}
          onChange={(event) => change({ from: toDay(event.target.value) })}
        />
      </Field>
      <Field label="To">
        <Input
          type="date"
          className="w-40"
          value={day(given.to)}
          onChange={(event) => change({ to: toDay(event.target.value) })}
        />
      </Field>
      {narrowed ? <Button onClick={() => void setGiven(null)}>Show everything</Button> : null}
    </search>
  )
}
