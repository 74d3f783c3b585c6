'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useState } from 'react'
import type { VerdictView } from '@/db/queries/verdict'
import { VERDICTS, type Verdict } from '@/lib/rules/words'
import { useArePointsChanging } from '../findings/use-points'
import { useAction } from '../shell/use-action'
import { Button } from '../ui/button'
import { RadioGroup } from '../ui/choice'
import { Field, Input, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'
import { LetterEditor } from './letter-editor'
import { verdictSentences } from './verdict-words'
import type { VerdictActions } from './verdict-actions'

type VerdictFormProps = {
  manuscriptId: string
  verdict: VerdictView | null
  actions: Pick<VerdictActions, 'draft' | 'compose' | 'preview'>
}

/** The reviewer's verdict: which one, a word to the editor, the letter. */
export function VerdictForm({ manuscriptId, verdict, actions }: VerdictFormProps) {
  const router = useRouter()
  const [choice, setChoice] = useState<Verdict | null>(verdict?.verdict ?? null)
  const [remark, setRemark] = useState(verdict?.remark ?? '')
  const [effort, setEffort] = useState(verdict?.effortMinutes?.toString() ?? '')
  const [body, setBody] = useState(verdict?.body ?? '')
  const [composed, setComposed] = useState('')
  const [saved, setSaved] = useState(() => stamp(choice, remark, effort, body))
  const now = stamp(choice, remark, effort, body)
  const unsaved = now !== saved
  const waiting = useArePointsChanging(manuscriptId)
  useWarnOnLeaving(unsaved || waiting)
  const compose = useAction(actions.compose, (letter) => {
    setBody(letter.body)
    setComposed(letter.body)
  })
  const draft = useAction(actions.draft, () => {
    setSaved(now)
    toast.success('The draft is saved.')
    router.refresh()
  })
  const minutes = effort.trim() === '' ? null : Number(effort)
  const badEffort = minutes !== null && !(Number.isInteger(minutes) && minutes >= 0)
  return (
    <form
      className="flex flex-col gap-6"
      onSubmit={(event) => {
        event.preventDefault()
        if (choice && !badEffort)
          draft.run({ manuscriptId, verdict: choice, remark, effortMinutes: minutes, body })
      }}
    >
      <RadioGroup
        legend="Verdict"
        name="verdict"
        value={choice}
        onChange={setChoice}
        error={draft.fields.verdict}
        options={VERDICTS.map((value) => ({ value, label: value, hint: verdictSentences[value] }))}
      />
      <LetterEditor
        body={body}
        onBody={setBody}
        edited={body !== composed}
        composing={compose.pending}
        waiting={waiting}
        mayCompose={choice !== null}
        onCompose={() => choice && compose.run({ manuscriptId, verdict: choice })}
        preview={actions.preview}
        error={draft.fields.body}
      />
      {compose.message && <Notice tone="trouble">{compose.message}</Notice>}
      <div className="grid gap-5 sm:grid-cols-[minmax(0,1fr)_11rem]">
        <Field
          label="Remark to the editor"
          optional
          hint="The authors never read it."
          error={draft.fields.remark}
        >
          <Textarea rows={3} value={remark} onChange={(event) => setRemark(event.target.value)} />
        </Field>
        <Field
          label="Effort in minutes"
          optional
          error={draft.fields.effortMinutes ?? (badEffort ? 'Please give whole minutes.' : undefined)}
        >
          <Input inputMode="numeric" value={effort} onChange={(event) => setEffort(event.target.value)} />
        </Field>
      </div>
      {draft.message && <Notice tone="trouble">{draft.message}</Notice>}
      <div className="flex flex-wrap items-center gap-3">
        <Button
          type="submit"
          variant="primary"
          disabled={!choice || body.trim() === ''}
          busy={draft.pending && 'Saving…'}
        >
          Save the draft
        </Button>
        <span className="text-ink-soft" aria-live="polite">
          {unsaved ? 'There are changes that are not saved.' : verdict ? 'Everything is saved.' : ''}
        </span>
      </div>
    </form>
  )
}

function stamp(...parts: unknown[]): string {
  return JSON.stringify(parts)
}

function useWarnOnLeaving(unsaved: boolean): void {
  useEffect(() => {
    if (!unsaved) return
    const warn = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', warn)
    return () => window.removeEventListener('beforeunload', warn)
  }, [unsaved])
}
