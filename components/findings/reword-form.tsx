'use client'

import { useState } from 'react'
import { SEVERITIES, type Severity } from '@/lib/checks/vocabulary'
import { Button } from '../ui/button'
import { Field, Select, Textarea } from '../ui/field'

type RewordFormProps = {
  asks: string
  severity: Severity
  busy: boolean
  error: string | undefined
  onSave: (change: { asks: string; severity: Severity }) => void
  onCancel: () => void
}

/** The words of a point as the authors will read them, and its severity. */
export function RewordForm({ asks, severity, busy, error, onSave, onCancel }: RewordFormProps) {
  const [text, setText] = useState(asks)
  const [weight, setWeight] = useState<Severity>(severity)
  return (
    <form
      className="mt-2 flex flex-col gap-3"
      onSubmit={(event) => {
        event.preventDefault()
        if (text.trim()) onSave({ asks: text.trim(), severity: weight })
      }}
      onKeyDown={(event) => {
        if (event.key === 'Escape') onCancel()
      }}
    >
      <Field
        label="To the authors"
        error={error ?? (text.trim() ? undefined : 'Please write what they are asked.')}
      >
        <Textarea value={text} rows={4} autoFocus onChange={(event) => setText(event.target.value)} />
      </Field>
      <Field label="Severity" className="max-w-52">
        <Select
          value={weight}
          options={SEVERITIES.map((value) => ({ value, label: value }))}
          onChange={(event) => setWeight(SEVERITIES.find((one) => one === event.target.value) ?? severity)}
        />
      </Field>
      <div className="flex gap-2">
        <Button type="submit" variant="primary" size="small" busy={busy && 'Saving…'}>
          Keep in these words
        </Button>
        <Button size="small" variant="quiet" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  )
}
