'use client'

import { useState } from 'react'
import { Failed } from '../shell/failed'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Field, Textarea } from '../ui/field'
import { Skeleton } from '../ui/skeleton'
import { LetterSheet } from './letter-sheet'
import { usePreview, type Preview } from './use-preview'

type LetterEditorProps = {
  body: string
  onBody: (body: string) => void
  /** Whether the words in the field were written by hand since they were composed. */
  edited: boolean
  composing: boolean
  /** Changes of points are on their way; the letter must not be made before they have arrived. */
  waiting: boolean
  mayCompose: boolean
  onCompose: () => void
  preview: Preview
  error: string | undefined
}

/** The letter in Markdown, and beside it the mail that becomes of it. */
export function LetterEditor(props: LetterEditorProps) {
  const { body, edited, onCompose } = props
  const [asking, setAsking] = useState(false)
  const preview = usePreview(body, props.preview)
  return (
    <section aria-labelledby="letter-title">
      <div className="mb-2 flex flex-wrap items-center justify-between gap-2">
        <h2 id="letter-title" className="text-lg font-semibold">
          Letter
        </h2>
        <Button
          size="small"
          disabled={!props.mayCompose}
          busy={props.composing ? 'Composing…' : props.waiting && 'Saving the points…'}
          onClick={() => (edited && body.trim() ? setAsking(true) : onCompose())}
        >
          Compose from kept points
        </Button>
      </div>
      {!props.mayCompose && <p className="mb-2 text-ink-soft">Choose a verdict first; the letter says it.</p>}
      <div className="grid gap-5 2xl:grid-cols-2">
        <Field
          label="Text"
          hint="Markdown: a blank line begins a paragraph, 1. a numbered point, **words** for emphasis."
          error={props.error}
        >
          <Textarea
            value={body}
            rows={24}
            className="font-mono text-xs"
            onChange={(event) => props.onBody(event.target.value)}
          />
        </Field>
        <div>
          <h3 className="mb-1 font-sans text-sm font-medium">As mail</h3>
          {body.trim() === '' ? (
            <p className="margin-rule py-6 pl-5 font-serif text-base">
              The letter is empty. Compose it from the points that are kept, then edit it freely.
            </p>
          ) : preview.error ? (
            <Failed error={preview.error} onRetry={() => void preview.refetch()} />
          ) : !preview.data ? (
            <Skeleton rows={8} label="Setting the letter" />
          ) : (
            <LetterSheet html={preview.data} />
          )}
        </div>
      </div>
      <Dialog
        open={asking}
        onOpenChange={setAsking}
        title="Replace what you wrote?"
        description="The letter was edited by hand. Composing it anew replaces all of it."
        footer={
          <>
            <Button onClick={() => setAsking(false)}>Keep my words</Button>
            <Button
              variant="danger"
              onClick={() => {
                setAsking(false)
                onCompose()
              }}
            >
              Replace
            </Button>
          </>
        }
      />
    </section>
  )
}
