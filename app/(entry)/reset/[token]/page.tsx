import { NewPasswordForm } from '@/components/entry/new-password-form'
import { SpentLink } from '@/components/entry/spent-link'
import { getDb } from '@/db/current'
import { findMailedLink } from '@/lib/desk/mailed-link'
import { getNow } from '@/lib/web/now'
import { setPasswordAction } from '../../actions'

export const metadata = { title: 'New password' }

export default async function ResetPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const link = findMailedLink(getDb(), token, 'password', getNow())
  if (!link) return <SpentLink />
  return (
    <>
      <h1 className="mb-5 text-xl font-semibold">Choose a new password</h1>
      <NewPasswordForm token={token} email={link.email} save={setPasswordAction} />
    </>
  )
}
