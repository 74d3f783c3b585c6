'use client'

import { useRouter } from 'next/navigation'
import { useAction, type Answer } from '../shell/use-action'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'

type BeginDraftProps = {
  begin: (input: Record<string, never>) => Promise<Answer<{ manuscriptId: string }>>
}

export function BeginDraft({ begin }: BeginDraftProps) {
  const router = useRouter()
  const { run, pending, message } = useAction(begin, ({ manuscriptId }) =>
    router.push(`/hand-in/${manuscriptId}`),
  )
  return (
    <div className="flex flex-col items-start gap-2">
      <Button variant="primary" busy={pending && 'Beginning…'} onClick={() => run({})}>
        Begin a manuscript
      </Button>
      {message ? <Notice tone="trouble">{message}</Notice> : null}
    </div>
  )
}
