import { redirect } from 'next/navigation'
import { SignInForm } from '@/components/entry/sign-in-form'
import { getActor } from '@/lib/web/actor'

export const metadata = { title: 'Sign in' }

export default async function SignInPage() {
  if (await getActor()) redirect('/')
  return (
    <>
      <h1 className="mb-5 text-xl font-semibold">Sign in</h1>
      <SignInForm />
    </>
  )
}
