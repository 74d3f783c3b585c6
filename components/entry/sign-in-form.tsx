'use client'

import Link from 'next/link'
import { signIn } from 'next-auth/react'
import { useRouter } from 'next/navigation'
import { useState, type FormEvent } from 'react'
import { Button } from '../ui/button'
import { Field, Input } from '../ui/field'
import { Notice } from '../ui/notice'

const lost = 'The server cannot be reached; please check the connection and try again.'

export function SignInForm({ email = '' }: { email?: string }) {
  const router = useRouter()
  const [trouble, setTrouble] = useState<string | null>(null)
  const [busy, setBusy] = useState(false)

  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = new FormData(event.currentTarget)
    setBusy(true)
    const answer = await signIn('credentials', {
      email: String(form.get('email')),
      password: String(form.get('password')),
      redirect: false,
    }).catch(() => null)
    if (answer?.ok) {
      router.replace('/')
      router.refresh()
      return
    }
    setBusy(false)
    setTrouble(answer?.error ?? lost)
  }

  return (
    <form method="post" onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
      {trouble ? <Notice tone="trouble">{trouble}</Notice> : null}
      <Field label="E-mail address">
        <Input name="email" type="email" autoComplete="username" required defaultValue={email} />
      </Field>
      <Field label="Password">
        <Input name="password" type="password" autoComplete="current-password" required />
      </Field>
      <div className="flex items-center justify-between gap-4 pt-1">
        <Button type="submit" variant="primary" busy={busy && 'Signing in…'}>
          Sign in
        </Button>
        <Link href="/forgot" className="text-tide underline-offset-2 hover:underline">
          Forgot the password?
        </Link>
      </div>
    </form>
  )
}
