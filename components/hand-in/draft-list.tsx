'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import type { DocketRow } from '@/db/queries/docket'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { RowLink } from '../ui/row-link'
import { Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { Time } from '../ui/time'

type DraftListProps = {
  drafts: readonly Pick<DocketRow, 'id' | 'title' | 'stateSince'>[]
  discard: (input: { manuscriptId: string }) => Promise<Answer<unknown>>
}

export function DraftList({ drafts, discard }: DraftListProps) {
  const router = useRouter()
  const [asked, setAsked] = useState<DraftListProps['drafts'][number] | null>(null)
  const { run, pending, message } = useAction(discard, () => {
    setAsked(null)
    router.refresh()
  })
  return (
    <>
      <Table caption="Drafts" stacks>
        <Thead>
          <Tr>
            <Th>Draft</Th>
            <Th>Begun</Th>
            <Th>
              <span className="sr-only">What one can do</span>
            </Th>
          </Tr>
        </Thead>
        <Tbody>
          {drafts.map((draft) => (
            <Tr key={draft.id} opens>
              <Td className="w-full">
                <RowLink href={`/hand-in/${draft.id}`} className="font-medium">
                  {draft.title || 'Without a title yet'}
                </RowLink>
              </Td>
              <Td label="Begun" className="whitespace-nowrap text-ink-soft">
                <Time at={draft.stateSince} />
              </Td>
              <Td>
                <Button size="small" variant="quiet" className="relative z-1" onClick={() => setAsked(draft)}>
                  Discard<span className="sr-only"> {draft.title || 'the draft without a title'}</span>
                </Button>
              </Td>
            </Tr>
          ))}
        </Tbody>
      </Table>
      <Dialog
        open={asked !== null}
        onOpenChange={(open) => !open && setAsked(null)}
        title="Discard this draft?"
        description={asked?.title || 'The draft without a title, with its files.'}
        footer={
          <>
            <Button onClick={() => setAsked(null)}>Keep it</Button>
            <Button
              variant="danger"
              busy={pending && 'Discarding…'}
              onClick={() => asked && run({ manuscriptId: asked.id })}
            >
              Discard
            </Button>
          </>
        }
      >
        {message ? <Notice tone="trouble">{message}</Notice> : <p>Its files are discarded with it.</p>}
      </Dialog>
    </>
  )
}
