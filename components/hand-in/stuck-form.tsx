'use client'

import { useRouter } from 'next/navigation'
import type { FileView } from '@/db/queries/manuscript'
import type { FileKind } from '@/lib/rules/words'
import { TableReading } from '../columns/table-reading'
import { FileSlot } from '../files/file-slot'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'

type StuckFormProps = {
  manuscriptId: string
  trouble: string | null
  files: Partial<Record<FileKind, FileView>>
  limitBytes: number
  handInAgain: (input: { manuscriptId: string }) => Promise<Answer<unknown>>
}

/** A manuscript whose file could not be read: what was wrong, the slots, and the way back into the queue. */
export function StuckForm({ manuscriptId, trouble, files, limitBytes, handInAgain }: StuckFormProps) {
  const router = useRouter()
  const { run, pending, message } = useAction(handInAgain, () => router.push(`/manuscripts/${manuscriptId}`))
  const slot = {
    url: `/api/manuscripts/${manuscriptId}/files`,
    limitBytes,
    onKept: () => router.refresh(),
  }
  return (
    <div className="flex flex-col gap-4">
      <Notice tone="trouble" title="The files could not be read">
        {trouble ?? 'Please replace the file and hand it in again.'}
      </Notice>
      <FileSlot kind="manuscript" file={files.manuscript ?? null} {...slot} />
      <FileSlot kind="table" optional file={files.table ?? null} {...slot} />
      {files.table ? (
        <TableReading key={files.table.id} fileId={files.table.id} manuscriptId={manuscriptId} />
      ) : null}
      {message ? <Notice tone="trouble">{message}</Notice> : null}
      <Button
        variant="primary"
        className="self-start"
        busy={pending && 'Handing in…'}
        onClick={() => run({ manuscriptId })}
      >
        Hand in again
      </Button>
    </div>
  )
}
