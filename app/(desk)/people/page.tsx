import { notFound } from 'next/navigation'
import { createLoader, parseAsString, parseAsStringLiteral } from 'nuqs/server'
import { PeopleFilter } from '@/components/people/people-filter'
import { PeopleScreen } from '@/components/people/people-screen'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { listPeople } from '@/db/queries/people'
import { may } from '@/lib/rules/permissions'
import { PERSON_STATUSES, ROLES } from '@/lib/rules/roles'
import { requireActor } from '@/lib/web/actor'
import { changePersonAction, invitePersonAction } from './actions'

export const metadata = { title: 'People' }

const loadFilter = createLoader({
  search: parseAsString,
  role: parseAsStringLiteral(ROLES),
  status: parseAsStringLiteral(PERSON_STATUSES),
})

export default async function PeoplePage({ searchParams }: PageProps<'/people'>) {
  const actor = await requireActor()
  if (!may(actor, 'people.list')) notFound()
  const { search, role, status } = await loadFilter(searchParams)
  const people = listPeople(getDb(), actor, {
    ...(search ? { search } : {}),
    ...(role ? { role } : {}),
    ...(status ? { status } : {}),
  })
  return (
    <Page>
      <PageHead title="People" lead="Who has an account here, and in which part." />
      <PeopleScreen
        people={people}
        ownId={actor.id}
        mayInvite={may(actor, 'people.invite')}
        mayChange={may(actor, 'people.change')}
        invite={invitePersonAction}
        change={changePersonAction}
      >
        <PeopleFilter />
      </PeopleScreen>
      {people.length === 0 ? <EmptyState>Nobody fits what you asked for.</EmptyState> : null}
    </Page>
  )
}
