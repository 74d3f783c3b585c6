'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useIsMutating } from '@tanstack/react-query'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import type { FileView } from '@/db/queries/manuscript'
import type { FileKind } from '@/lib/rules/words'
import { TableReading } from '../columns/table-reading'
import { namingKey } from '../columns/use-table-columns'
import { FileSlot } from '../files/file-slot'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { DraftFields } from './draft-fields'
import { draftFieldLabels, draftForm, type DraftField, type DraftForm } from './draft-form'
import { SaveLine } from './save-line'
import { Section } from './section'
import { useAutosave } from './use-autosave'

type HandInFormProps = {
  manuscriptId: string
  round: number
  drafted: DraftForm
  files: Partial<Record<FileKind, FileView>>
  limitBytes: number
  handIn: (input: { manuscriptId: string }) => Promise<Answer<unknown>>
  removeFile: (input: { fileId: string }) => Promise<Answer<unknown>>
}

/** A draft being filled in: files checked at once, words saved as they are typed, handed in by one button. */
export function HandInForm(props: HandInFormProps) {
  const { manuscriptId, round, files } = props
  const router = useRouter()
  const form = useForm<DraftForm>({ resolver: zodResolver(draftForm), defaultValues: props.drafted })
  const saving = useAutosave(manuscriptId, form)
  const naming = useIsMutating({ mutationKey: namingKey }) > 0
  const [tried, setTried] = useState(false)
  const handingIn = useAction(props.handIn, () => router.push(`/manuscripts/${manuscriptId}`))
  const removing = useAction(props.removeFile, () => router.refresh())

  const { errors, isSubmitting } = form.formState
  const missing = tried && !files.manuscript ? 'Please add the manuscript as PDF.' : undefined
  const submit = form.handleSubmit(async () => {
    if (!files.manuscript || !(await saving.flush())) return
    handingIn.run({ manuscriptId })
  })
  const slot = { url: `/api/manuscripts/${manuscriptId}/files`, limitBytes: props.limitBytes }
  const kept = () => router.refresh()
  const remove = (fileId: string) => removing.run({ fileId })

  return (
    <form
      noValidate
      onSubmit={(event) => {
        setTried(true)
        void submit(event)
      }}
    >
      {handingIn.message ? (
        <Notice tone="trouble" className="mb-5">
          {handingIn.message}
        </Notice>
      ) : null}
      <ErrorSummary
        fields={Object.keys(draftFieldLabels).filter((name): name is DraftField => name in errors)}
        fileMissing={missing !== undefined}
        onGo={(field) => form.setFocus(field)}
      />
      <Section number={1} title="Files">
        <FileSlot
          kind="manuscript"
          file={files.manuscript ?? null}
          error={missing}
          onKept={kept}
          onRemove={remove}
          {...slot}
        />
        <FileSlot
          kind="table"
          optional
          file={files.table ?? null}
          onKept={kept}
          onRemove={remove}
          {...slot}
        />
        {files.table ? (
          <TableReading key={files.table.id} fileId={files.table.id} manuscriptId={manuscriptId} />
        ) : null}
        {removing.message ? <Notice tone="trouble">{removing.message}</Notice> : null}
        <Notice tone="care">
          Results only: no data of single participants or patients in the table, please. Nothing leaves this
          installation; the editor and the reviewer alone read what you hand in.
        </Notice>
      </Section>
      <DraftFields form={form} />
      <Section number={4} title="Hand in">
        <p className="max-w-prose text-ink-soft">
          The numbers are read and recomputed first, then a statistician judges. You can follow it, and
          withdraw the manuscript until the verdict is released.
        </p>
        <div className="flex flex-wrap items-center gap-4">
          <Button
            type="submit"
            variant="primary"
            busy={isSubmitting || handingIn.pending ? 'Handing in…' : naming && 'Saving…'}
          >
            {round > 1 ? `Hand in round ${round}` : 'Hand in'}
          </Button>
          <SaveLine state={saving.state} onRetry={() => void saving.flush()} />
        </div>
      </Section>
    </form>
  )
}

type ErrorSummaryProps = {
  fields: readonly DraftField[]
  fileMissing: boolean
  onGo: (field: DraftField) => void
}

function ErrorSummary({ fields, fileMissing, onGo }: ErrorSummaryProps) {
  if (fields.length === 0 && !fileMissing) return null
  const goToFile = () => document.querySelector<HTMLElement>('[data-slot=manuscript]')?.focus()
  return (
    <Notice tone="trouble" className="mb-5" title="Before it can be handed in:">
      <ul className="list-disc pl-5">
        {fileMissing ? (
          <li>
            <SummaryLink onClick={goToFile}>Manuscript</SummaryLink>
          </li>
        ) : null}
        {fields.map((field) => (
          <li key={field}>
            <SummaryLink onClick={() => onGo(field)}>{draftFieldLabels[field]}</SummaryLink>
          </li>
        ))}
      </ul>
    </Notice>
  )
}

function SummaryLink({ onClick, children }: { onClick: () => void; children: string }) {
  return (
    <button
      type="button"
      onClick={onClick}
      className="min-h-6 min-w-6 text-left text-tide underline underline-offset-2"
    >
      {children}
    </button>
  )
}
