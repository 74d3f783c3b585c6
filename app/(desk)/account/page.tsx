import type { ReactNode } from 'react'
import { notFound } from 'next/navigation'
import { PasswordForm } from '@/components/account/password-form'
import { SessionList } from '@/components/account/session-list'
import { ThemeChoice } from '@/components/account/theme-choice'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { listSessions } from '@/db/queries/sessions'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { getTheme } from '@/lib/web/theme'
import { getNow } from '@/lib/web/now'
import {
  changePasswordAction,
  chooseThemeAction,
  revokeAllSessionsAction,
  revokeSessionAction,
} from './actions'

export const metadata = { title: 'Account' }

export default async function AccountPage() {
  const actor = await requireActor()
  if (!may(actor, 'account.change')) notFound()
  return (
    <Page narrow>
      <PageHead title={actor.name} above={`${actor.email} · ${actor.roles.join(', ')}`} />
      <Part title="Theme">
        <ThemeChoice theme={(await getTheme()) ?? 'system'} choose={chooseThemeAction} />
      </Part>
      <Part title="Password">
        <PasswordForm save={changePasswordAction} />
      </Part>
      <Part title="Sessions">
        <SessionList
          sessions={listSessions(getDb(), actor, getNow())}
          end={revokeSessionAction}
          endAll={revokeAllSessionsAction}
        />
      </Part>
    </Page>
  )
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="grid gap-x-8 gap-y-3 border-t border-rule py-6 md:grid-cols-[8rem_minmax(0,1fr)]">
      <h2 className="text-lg font-semibold">{title}</h2>
      <div className="min-w-0">{children}</div>
    </section>
  )
}
