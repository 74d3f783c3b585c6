import { ForgotForm } from '@/components/entry/forgot-form'
import { askPasswordResetAction } from '../actions'

export const metadata = { title: 'Forgotten password' }

export default function ForgotPage() {
  return (
    <>
      <h1 className="mb-2 text-xl font-semibold">Forgotten password</h1>
      <p className="mb-5 text-ink-soft">We send a link with which you choose a new one.</p>
      <ForgotForm ask={askPasswordResetAction} />
    </>
  )
}
