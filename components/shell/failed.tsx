'use client'

import { Button } from '../ui/button'
import { Notice } from '../ui/notice'

/** What stands where something could not be loaded: the reason, and a way to try again. */
export function Failed({ error, onRetry }: { error: Error; onRetry: () => void }) {
  return (
    <Notice tone="trouble" className="my-4" action={<Button onClick={onRetry}>Try again</Button>}>
      {error.message}
    </Notice>
  )
}
