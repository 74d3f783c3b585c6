'use client'

import { useState } from 'react'
import { useAction, type Answer } from '../shell/use-action'
import { Button, ButtonLink } from '../ui/button'
import { Field, Input } from '../ui/field'
import { Notice } from '../ui/notice'

export function ForgotForm({ ask }: { ask: (form: FormData) => Promise<Answer<unknown>> }) {
  const [sent, setSent] = useState(false)
  const { run, pending, message, fields } = useAction(ask, () => setSent(true))
  if (sent) {
    return (
      <>
        <Notice tone="done" title="Look into your mail">
          If there is an account for this address, a link to choose a new password is on its way. It works
          once, for an hour.
        </Notice>
        <ButtonLink href="/sign-in" className="mt-4">
          Back to sign-in
        </ButtonLink>
      </>
    )
  }
  return (
    <form action={run} className="flex flex-col gap-4">
      {message && !fields.email ? <Notice tone="trouble">{message}</Notice> : null}
      <Field label="E-mail address" error={fields.email}>
        <Input name="email" type="email" autoComplete="username" required />
      </Field>
      <Button type="submit" variant="primary" className="self-start" busy={pending && 'Sending…'}>
        Send the link
      </Button>
    </form>
  )
}
