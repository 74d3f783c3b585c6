'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import type { PointRow } from '@/db/queries/points'
import { ruleWords } from '../findings/rule-words'
import { SeverityMark } from '../shell/severity-mark'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Field, Textarea } from '../ui/field'
import { Time } from '../ui/time'
import { toast } from '../ui/toast'

export type WriteAnswer = (input: { pointId: string; body: string }) => Promise<Answer<unknown>>

type AnswerFormProps = { point: PointRow; number: number; write: WriteAnswer | null }

/** One point of the letter and the authors' answer to it. */
export function AnswerForm({ point, number, write }: AnswerFormProps) {
  return (
    <li className="grid grid-cols-[2rem_minmax(0,1fr)]">
      <span className="tabular pt-1 text-right text-xs text-ink-soft">
        {number}
        {point.page !== null && <span className="block">p. {point.page}</span>}
      </span>
      <div className="margin-rule ml-2 pb-6 pl-4">
        <div className="flex flex-wrap items-baseline justify-between gap-x-3">
          <h3 className="font-sans text-sm font-semibold">{ruleWords(point.rule)}</h3>
          <SeverityMark severity={point.severity} className="text-xs" />
        </div>
        <p className="reading mt-1">{point.asks}</p>
        {point.quote && <q className="mt-1 block font-mono text-xs text-ink-soft">{point.quote}</q>}
        {write ? <Writing point={point} number={number} write={write} /> : <Given point={point} />}
      </div>
    </li>
  )
}

function Given({ point }: { point: PointRow }) {
  if (!point.answer) return <p className="mt-3 text-ink-soft">The authors have not answered this point.</p>
  return (
    <div className="mt-3 border-l-2 border-tide pl-3">
      <p className="text-xs text-ink-soft">
        Answered <Time at={point.answer.changedAt ?? point.answer.createdAt} />
      </p>
      <p className="max-w-prose whitespace-pre-wrap">{point.answer.body}</p>
    </div>
  )
}

function Writing({ point, number, write }: { point: PointRow; number: number; write: WriteAnswer }) {
  const router = useRouter()
  const saved = point.answer?.body ?? ''
  const [body, setBody] = useState(saved)
  const { run, pending, message, fields } = useAction(write, () => {
    toast.success(`The answer to point ${number} is saved.`)
    router.refresh()
  })
  return (
    <form
      className="mt-3 flex flex-col items-start gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        if (body.trim()) run({ pointId: point.id, body: body.trim() })
      }}
    >
      <Field
        label={`Your answer to point ${number}`}
        error={fields.body ?? message ?? undefined}
        className="w-full max-w-prose"
      >
        <Textarea rows={3} value={body} onChange={(event) => setBody(event.target.value)} />
      </Field>
      <Button
        type="submit"
        size="small"
        disabled={!body.trim() || body.trim() === saved}
        busy={pending && 'Saving…'}
      >
        {saved ? 'Save the change' : 'Save the answer'}
      </Button>
    </form>
  )
}
