'use client'

import { Button } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/empty-state'

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string }
  reset: () => void
}) {
  return (
    <main className="mx-auto max-w-xl px-6 py-24">
      <h1 className="text-xl font-semibold">This page could not be shown</h1>
      <EmptyState
        action={
          <Button variant="primary" onClick={reset}>
            Try again
          </Button>
        }
      >
        Something failed on the server; nothing that you saved is lost.
        {error.digest ? ` Whoever looks after the installation can find it under ${error.digest}.` : ''}
      </EmptyState>
    </main>
  )
}
