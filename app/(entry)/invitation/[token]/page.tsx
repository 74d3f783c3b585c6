import { NewPasswordForm } from '@/components/entry/new-password-form'
import { SpentLink } from '@/components/entry/spent-link'
import { getDb } from '@/db/current'
import { findMailedLink } from '@/lib/desk/mailed-link'
import { getNow } from '@/lib/web/now'
import { acceptInvitationAction } from '../../actions'

export const metadata = { title: 'Invitation' }

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const link = findMailedLink(getDb(), token, 'invitation', getNow())
  if (!link) return <SpentLink invitation />
  return (
    <>
      <h1 className="mb-2 text-xl font-semibold">Welcome to the desk</h1>
      <p className="mb-5 text-ink-soft">
        You were invited to Assize. Choose a password to open your account.
      </p>
      <NewPasswordForm
        token={token}
        email={link.email}
        invited={{ name: link.name }}
        save={acceptInvitationAction}
      />
    </>
  )
}
