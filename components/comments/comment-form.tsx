'use client'

import { useState, type FormEvent } from 'react'
import { AUDIENCES, type Audience } from '@/lib/rules/words'
import { Button } from '../ui/button'
import { RadioGroup } from '../ui/choice'
import { Field, Textarea } from '../ui/field'
import { audienceWords } from './audience-mark'

type CommentFormProps = {
  /** What it is about, such as "on “kelp attachment, all pairs”". */
  label: string
  initial?: { body: string; audience: Audience }
  /** A reply is read by whoever reads what it replies to. */
  fixedAudience?: Audience
  submit: string
  busy: boolean
  error: string | undefined
  onSubmit: (comment: { body: string; audience: Audience }) => void
  onCancel?: () => void
}

const readers: Record<Audience, string> = {
  authors: 'The authors read it once the verdict is released; it goes into the letter.',
  editor: 'You and the editors read it.',
  private: 'You alone read it.',
}

export function CommentForm(props: CommentFormProps) {
  const [body, setBody] = useState(props.initial?.body ?? '')
  const [audience, setAudience] = useState<Audience>(
    props.fixedAudience ?? props.initial?.audience ?? 'editor',
  )
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (body.trim() && !props.busy) props.onSubmit({ body: body.trim(), audience })
  }
  return (
    <form
      onSubmit={submit}
      className="flex flex-col gap-3"
      onKeyDown={(event) => {
        if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) submit(event)
        if (event.key === 'Escape' && props.onCancel) props.onCancel()
      }}
    >
      <Field label={props.label} error={props.error}>
        <Textarea
          value={body}
          rows={3}
          autoFocus={props.onCancel !== undefined}
          onChange={(event) => setBody(event.target.value)}
        />
      </Field>
      {props.fixedAudience === undefined && (
        <div>
          <RadioGroup
            legend="Who reads it"
            name="audience"
            inline
            value={audience}
            onChange={setAudience}
            options={AUDIENCES.map((value) => ({ value, label: audienceWords[value] }))}
          />
          <p className="mt-1 text-xs text-ink-soft" aria-live="polite">
            {readers[audience]}
          </p>
        </div>
      )}
      <div className="flex gap-2">
        <Button
          type="submit"
          size="small"
          variant="primary"
          disabled={!body.trim()}
          busy={props.busy && 'Saving…'}
        >
          {props.submit}
        </Button>
        {props.onCancel && (
          <Button size="small" variant="quiet" onClick={props.onCancel}>
            Cancel
          </Button>
        )}
      </div>
    </form>
  )
}
