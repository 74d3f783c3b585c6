'use client'

import './globals.css'

export default function GlobalError({
  error,
  reset,
}: {
  error: Error & { digest?: string }
  reset: () => void
}) {
  return (
    <html lang="en">
      <head>
        <title>Assize cannot be shown</title>
      </head>
      <body>
        <main className="mx-auto max-w-xl px-6 py-24">
          <h1 className="text-xl font-semibold">Assize cannot be shown</h1>
          <p className="mt-4 font-serif text-base">
            Something failed before the page was drawn; nothing that you saved is lost.
            {error.digest ? ` It is in the log under ${error.digest}.` : ''}
          </p>
          <button type="button" onClick={reset} className="mt-6 rounded-sm bg-tide px-4 py-2 text-on-tide">
            Try again
          </button>
        </main>
      </body>
    </html>
  )
}
