import Link from 'next/link'
import { Mark } from '../ui/mark'
import { RailLinks, type RailLink } from './rail-links'
import { SignOut } from './sign-out'

type RailProps = { house: string; person: string; roles: readonly string[]; links: readonly RailLink[] }

/** The slim rail: the mark, the screens that the roles open, the person. A bar at the top where it is narrow. */
export function Rail({ house, person, roles, links }: RailProps) {
  return (
    <header className="z-30 border-rule bg-paper max-lg:border-b lg:sticky lg:top-0 lg:h-dvh lg:w-44 lg:shrink-0 lg:border-r print:hidden">
      <div className="flex items-center justify-between gap-3 px-4 py-2.5 lg:block lg:px-5 lg:pt-6 lg:pb-5">
        <Link href="/docket" className="flex items-center gap-2.5 lg:flex-col lg:items-start">
          <Mark className="size-7 lg:size-9" />
          <span>
            <span className="block font-serif text-lg leading-none font-semibold">Assize</span>
            <span className="mt-1 block text-xs text-ink-soft max-lg:hidden">{house}</span>
          </span>
        </Link>
        <div className="lg:hidden">
          <details className="group relative">
            <summary className="list-none rounded-sm border border-edge bg-sheet px-3 py-1.5 font-medium">
              Menu
            </summary>
            <div className="absolute right-0 mt-1 w-56 rounded-md border border-rule bg-sheet p-3 shadow-sheet">
              <RailLinks links={links} />
              <RailPerson person={person} roles={roles} />
            </div>
          </details>
        </div>
      </div>
      <div className="flex flex-col justify-between max-lg:hidden lg:h-[calc(100dvh-8.5rem)] lg:px-5">
        <RailLinks links={links} />
        <RailPerson person={person} roles={roles} />
      </div>
    </header>
  )
}

function RailPerson({ person, roles }: { person: string; roles: readonly string[] }) {
  return (
    <div className="mt-4 border-t border-rule pt-3 pb-4 max-lg:pb-0">
      <p className="font-medium">{person}</p>
      <p className="text-xs text-ink-soft">{roles.join(', ')}</p>
      <div className="mt-2 flex gap-3">
        <Link href="/account" className="text-tide hover:underline">
          Account
        </Link>
        <SignOut />
      </div>
    </div>
  )
}
