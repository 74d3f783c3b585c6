'use client'

import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { NuqsAdapter } from 'nuqs/adapters/next/app'
import { useState, type ReactNode } from 'react'
import { Toaster } from '../ui/toast'
import { isProblem } from './fetch-json'

/** What every screen needs: the cache of queries, the state in the address, the place for confirmations. */
export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: {
            staleTime: 15_000,
            // What was refused stays refused; only what may be a passing fault is tried again.
            retry: (count, error) => count < 2 && !(isProblem(error) && error.status < 500),
          },
        },
      }),
  )
  return (
    <QueryClientProvider client={client}>
      <NuqsAdapter>{children}</NuqsAdapter>
      <Toaster />
    </QueryClientProvider>
  )
}
