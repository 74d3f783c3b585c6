import type { ReactNode } from 'react'
import { listScreens } from '@/components/shell/menu'
import { Rail } from '@/components/shell/rail'
import { getSettings } from '@/lib/settings'
import { requireActor } from '@/lib/web/actor'

export default async function DeskLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor()
  return (
    <div className="lg:flex">
      <a
        href="#main"
        className="sr-only z-50 bg-sheet p-3 focus-visible:not-sr-only focus-visible:absolute focus-visible:top-2 focus-visible:left-2"
      >
        Skip to the page
      </a>
      <Rail house={getSettings().house} person={actor.name} roles={actor.roles} links={listScreens(actor)} />
      <main id="main" tabIndex={-1} className="min-w-0 flex-1 outline-none">
        {children}
      </main>
    </div>
  )
}
