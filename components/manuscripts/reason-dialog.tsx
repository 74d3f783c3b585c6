'use client'

import { useState, type ReactNode } from 'react'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Field, Textarea } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'

type ReasonDialogProps = {
  title: string
  /** What will follow from it, in one or two sentences. */
  children: ReactNode
  /** Null where no reason is asked. */
  reasonLabel: string | null
  reasonHint?: string
  reasonNeeded: boolean
  submit: string
  busy: string
  danger?: boolean
  done: string
  act: (reason: string) => Promise<Answer<unknown>>
  onClose: () => void
  onDone: () => void
}

/** Asks once more, and for a reason, before something that others will notice. */
export function ReasonDialog(props: ReasonDialogProps) {
  const [reason, setReason] = useState('')
  const { run, pending, message, fields } = useAction(props.act, () => {
    toast.success(props.done)
    props.onClose()
    props.onDone()
  })
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && props.onClose()}
      title={props.title}
      footer={
        <>
          <Button onClick={props.onClose}>Cancel</Button>
          <Button
            variant={props.danger ? 'danger' : 'primary'}
            disabled={props.reasonNeeded && reason.trim() === ''}
            busy={pending && props.busy}
            onClick={() => run(reason.trim())}
          >
            {props.submit}
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-4">
        {message && !fields.reason ? <Notice tone="trouble">{message}</Notice> : null}
        <p>{props.children}</p>
        {props.reasonLabel === null ? null : (
          <Field
            label={props.reasonLabel}
            hint={props.reasonHint}
            optional={!props.reasonNeeded}
            error={fields.reason}
          >
            <Textarea rows={3} value={reason} onChange={(event) => setReason(event.target.value)} />
          </Field>
        )}
      </div>
    </Dialog>
  )
}
