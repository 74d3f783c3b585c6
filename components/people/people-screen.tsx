'use client'

import { useRouter } from 'next/navigation'
import { useState, type ReactNode } from 'react'
import type { PersonRow } from '@/db/queries/people'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'
import { PeopleTable } from './people-table'
import { PersonDialog, type PersonForm } from './person-dialog'

type Change = { personId: string } & Partial<Omit<PersonForm, 'email'>> & { status?: 'active' | 'disabled' }

type PeopleScreenProps = {
  people: readonly PersonRow[]
  /** What narrows the list. */
  children: ReactNode
  ownId: string
  mayInvite: boolean
  mayChange: boolean
  invite: (input: PersonForm) => Promise<Answer<unknown>>
  change: (input: Change) => Promise<Answer<unknown>>
}

export function PeopleScreen({
  people,
  children,
  ownId,
  mayInvite,
  mayChange,
  invite,
  change,
}: PeopleScreenProps) {
  const router = useRouter()
  const [inviting, setInviting] = useState(false)
  const [changing, setChanging] = useState<PersonRow | null>(null)
  const quick = useAction(
    (work: () => Promise<Answer<unknown>>) => work(),
    () => router.refresh(),
  )
  const done = (words: string) => () => {
    toast.success(words)
    router.refresh()
  }
  const inviteAgain = (person: PersonRow) =>
    quick.run(async () => {
      const answer = await invite(toForm(person))
      if (answer.ok) toast.success(`Another invitation is on its way to ${person.email}.`)
      return answer
    })
  const setStatus = (person: PersonRow, status: 'active' | 'disabled') =>
    quick.run(() => change({ personId: person.id, status }))

  return (
    <>
      <div className="mb-4 flex flex-wrap items-start justify-between gap-3">
        {children}
        {mayInvite ? (
          <Button variant="primary" onClick={() => setInviting(true)}>
            Invite someone
          </Button>
        ) : null}
      </div>
      {quick.message ? (
        <Notice tone="trouble" className="mb-4">
          {quick.message}
        </Notice>
      ) : null}
      <PeopleTable
        people={people}
        ownId={ownId}
        mayChange={mayChange}
        onChange={setChanging}
        onInviteAgain={inviteAgain}
        onStatus={setStatus}
      />
      {inviting ? (
        <PersonDialog
          title="Invite someone"
          verb="Send the invitation"
          save={invite}
          onClose={() => setInviting(false)}
          onDone={done('The invitation is on its way.')}
        />
      ) : null}
      {changing ? (
        <PersonDialog
          title={`Change ${changing.name}`}
          verb="Save"
          person={toForm(changing)}
          save={({ email: _, ...input }) => change({ personId: changing.id, ...input })}
          onClose={() => setChanging(null)}
          onDone={done('Saved.')}
        />
      ) : null}
    </>
  )
}

function toForm({ email, name, affiliation, expertise, roles }: PersonRow): PersonForm {
  return { email, name, affiliation, expertise, roles }
}
