'use client'

import { useState, useTransition } from 'react'

/** What a server action answers: done, or one sentence and what is wrong with which field. */
export type Answer<T> =
  { ok: true; value: T } | { ok: false; message: string; fields: Record<string, string> }

const lost = 'The server cannot be reached; please check the connection and try again.'

/** Calls a server action, keeps its refusal for the form, and does not start it twice. */
export function useAction<I, T>(act: (input: I) => Promise<Answer<T>>, onDone?: (value: T) => void) {
  const [refusal, setRefusal] = useState<{ message: string; fields: Record<string, string> } | null>(null)
  const [pending, startTransition] = useTransition()
  const run = (input: I) => {
    if (pending) return
    startTransition(async () => {
      const answer = await act(input).catch(() => ({ ok: false as const, message: lost, fields: {} }))
      setRefusal(answer.ok ? null : answer)
      if (answer.ok) onDone?.(answer.value)
    })
  }
  return {
    run,
    pending,
    message: refusal?.message ?? null,
    fields: refusal?.fields ?? {},
    clear: () => setRefusal(null),
  }
}
