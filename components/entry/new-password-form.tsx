'use client'

import { useRouter } from 'next/navigation'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Field, Input } from '../ui/field'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'

type NewPasswordFormProps = {
  token: string
  email: string
  /** Asks for name and affiliation too: an invitation. */
  invited?: { name: string }
  save: (form: FormData) => Promise<Answer<unknown>>
}

/** Chooses a password by a mailed link, and where it is an invitation says who one is. */
export function NewPasswordForm({ token, email, invited, save }: NewPasswordFormProps) {
  const router = useRouter()
  const { run, pending, message, fields } = useAction(save, () => {
    toast.success('Your password is set. Please sign in with it.')
    router.replace('/sign-in')
  })
  return (
    <form action={run} className="flex flex-col gap-4">
      {message ? <Notice tone="trouble">{message}</Notice> : null}
      <input type="hidden" name="token" value={token} />
      <Field label="E-mail address">
        <Input type="email" autoComplete="username" readOnly value={email} className="bg-sunken" />
      </Field>
      {invited ? (
        <>
          <Field label="Your name" error={fields.name}>
            <Input name="name" autoComplete="name" required defaultValue={invited.name} />
          </Field>
          <Field label="Affiliation" optional error={fields.affiliation}>
            <Input name="affiliation" autoComplete="organization" />
          </Field>
        </>
      ) : null}
      <Field label="New password" hint="At least 12 characters." error={fields.password}>
        <Input name="password" type="password" autoComplete="new-password" required minLength={12} />
      </Field>
      <Button type="submit" variant="primary" className="self-start" busy={pending && 'Saving…'}>
        {invited ? 'Open my account' : 'Set the password'}
      </Button>
    </form>
  )
}
