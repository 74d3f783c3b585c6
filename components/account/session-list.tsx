'use client'

import { signOut } from 'next-auth/react'
import { useRouter } from 'next/navigation'
import type { SessionRow } from '@/db/queries/sessions'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Time } from '../ui/time'
import { nameAgent } from './name-agent'

type SessionListProps = {
  sessions: readonly SessionRow[]
  end: (input: { sessionId: string }) => Promise<Answer<unknown>>
  endAll: (input: Record<string, never>) => Promise<Answer<unknown>>
}

/** Where one is signed in. */
export function SessionList({ sessions, end, endAll }: SessionListProps) {
  const router = useRouter()
  const ending = useAction(end, () => router.refresh())
  const endingAll = useAction(endAll, () => void signOut({ callbackUrl: '/sign-in' }))
  return (
    <>
      {ending.message ? <Notice tone="trouble">{ending.message}</Notice> : null}
      <Table caption="Sessions" stacks>
        <Thead>
          <Tr>
            <Th>Browser</Th>
            <Th>Signed in</Th>
            <Th>Last seen</Th>
            <Th>
              <span className="sr-only">What one can do</span>
            </Th>
          </Tr>
        </Thead>
        <Tbody>
          {sessions.map((session) => (
            <Tr key={session.id}>
              <RowTh title={session.agent}>{nameAgent(session.agent)}</RowTh>
              <Td label="Signed in">
                <Time at={session.createdAt} show="moment" />
              </Td>
              <Td label="Last seen">
                <Time at={session.seenAt} show="moment" />
              </Td>
              <Td className="md:text-right">
                {session.own ? (
                  <span className="text-ink-soft">this one</span>
                ) : (
                  <Button size="small" variant="quiet" onClick={() => ending.run({ sessionId: session.id })}>
                    Sign out<span className="sr-only"> {nameAgent(session.agent)}</span>
                  </Button>
                )}
              </Td>
            </Tr>
          ))}
        </Tbody>
      </Table>
      <Button className="mt-4" busy={endingAll.pending && 'Signing out…'} onClick={() => endingAll.run({})}>
        Sign out everywhere
      </Button>
    </>
  )
}
