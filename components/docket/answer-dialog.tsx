'use client'

import { useState } from 'react'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Checkbox } from '../ui/choice'
import { Dialog } from '../ui/dialog'
import { Field, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'

export type AnswerInput = { manuscriptId: string; accept: boolean; reason: string; conflict: boolean }

type AnswerDialogProps = {
  manuscript: { id: string; reference: string | null; title: string }
  accept: boolean
  answer: (input: AnswerInput) => Promise<Answer<unknown>>
  onClose: () => void
  onDone: () => void
}

/** Accepts or declines a review that is offered. */
export function AnswerDialog({ manuscript, accept, answer, onClose, onDone }: AnswerDialogProps) {
  const [reason, setReason] = useState('')
  const [conflict, setConflict] = useState(false)
  const { run, pending, message, fields } = useAction(answer, () => {
    toast.success(accept ? 'You have accepted the review.' : 'You have declined; the editor is told.')
    onDone()
    onClose()
  })
  const missing = !accept && reason.trim() === ''
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={accept ? 'Accept the review' : 'Decline the review'}
      description={`${manuscript.reference ?? ''} ${manuscript.title}`.trim()}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button
            variant="primary"
            disabled={missing}
            busy={pending && 'Saving…'}
            onClick={() => run({ manuscriptId: manuscript.id, accept, reason, conflict })}
          >
            {accept ? 'Accept' : 'Decline'}
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-4">
        {message && !fields.reason ? <Notice tone="trouble">{message}</Notice> : null}
        {accept ? (
          <p>
            The manuscript is confidential: please keep it to yourself, and tell the editor if anyone is to
            help you. Accept only if you have no competing interest and it lies within what you know.
          </p>
        ) : (
          <>
            <Field
              label="Why you decline"
              hint="The editor reads this, the authors do not."
              error={fields.reason}
            >
              <Textarea rows={3} value={reason} onChange={(event) => setReason(event.target.value)} />
            </Field>
            <Checkbox
              label="I have a conflict of interest"
              hint="It is noted, and the manuscript will not be offered to you again."
              checked={conflict}
              onChange={(event) => setConflict(event.target.checked)}
            />
          </>
        )}
      </div>
    </Dialog>
  )
}
