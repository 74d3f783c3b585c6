'use client'

import { useRouter } from 'next/navigation'
import type { FileView, ManuscriptView } from '@/db/queries/manuscript'
import { FileSlot } from '../files/file-slot'
import { useAction } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { toast } from '../ui/toast'
import type { ManuscriptActions } from './manuscript-actions'
import { manuscriptUrl } from './resources'

type StuckRemedyProps = {
  manuscript: ManuscriptView
  limitBytes: number
  handInAgain: ManuscriptActions['handInAgain']
}

/** Replaces what the audit could not read, and asks for the audit again. */
export function StuckRemedy({ manuscript, limitBytes, handInAgain }: StuckRemedyProps) {
  const router = useRouter()
  const { run, pending, message } = useAction(handInAgain, () => {
    toast.success('The audit runs again with the files as they are now.')
    router.refresh()
  })
  const round = manuscript.rounds.find((one) => one.number === manuscript.round)
  const current = (kind: FileView['kind']) =>
    round?.files.find((file) => file.kind === kind && file.replacedAt === null) ?? null
  const url = manuscriptUrl(manuscript.id, '/files')
  return (
    <section aria-labelledby="replace-title" className="flex flex-col gap-3">
      <h2 id="replace-title" className="text-lg font-semibold">
        Replace the file
      </h2>
      <FileSlot
        kind="manuscript"
        url={url}
        file={current('manuscript')}
        limitBytes={limitBytes}
        onKept={() => router.refresh()}
      />
      <FileSlot
        kind="table"
        optional
        url={url}
        file={current('table')}
        limitBytes={limitBytes}
        onKept={() => router.refresh()}
      />
      {message ? <Notice tone="trouble">{message}</Notice> : null}
      <div>
        <Button
          variant="primary"
          busy={pending && 'Handing in…'}
          onClick={() => run({ manuscriptId: manuscript.id })}
        >
          Hand in again
        </Button>
      </div>
    </section>
  )
}
