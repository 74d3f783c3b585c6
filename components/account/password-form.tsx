'use client'

import { useRef } from 'react'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Field, Input } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'

export function PasswordForm({ save }: { save: (form: FormData) => Promise<Answer<unknown>> }) {
  const form = useRef<HTMLFormElement>(null)
  const { run, pending, message, fields } = useAction(save, () => {
    form.current?.reset()
    toast.success('Your password is changed; other sessions are signed out.')
  })
  return (
    <form ref={form} action={run} className="flex max-w-sm flex-col gap-4">
      {message && Object.keys(fields).length === 0 ? <Notice tone="trouble">{message}</Notice> : null}
      <Field label="Present password" error={fields.current}>
        <Input name="current" type="password" autoComplete="current-password" required />
      </Field>
      <Field
        label="New password"
        hint="At least 12 characters. Other sessions are signed out."
        error={fields.password}
      >
        <Input name="password" type="password" autoComplete="new-password" required minLength={12} />
      </Field>
      <Button type="submit" className="self-start" busy={pending && 'Saving…'}>
        Change the password
      </Button>
    </form>
  )
}
