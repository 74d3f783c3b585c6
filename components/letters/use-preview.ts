import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import type { Answer } from '../shell/use-action'

export type Preview = (input: { body: string }) => Promise<Answer<{ html: string }>>

const PAUSE = 350

/** The letter as it would be mailed, made by the server with the code that mails it, after a pause in typing. */
export function usePreview(body: string, preview: Preview) {
  const [settled, setSettled] = useState(body)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(body), PAUSE)
    return () => clearTimeout(timer)
  }, [body])
  return useQuery({
    enabled: settled.trim() !== '',
    queryKey: ['letter-preview', settled],
    queryFn: async () => {
      const answer = await preview({ body: settled })
      if (!answer.ok) throw new Error(answer.message)
      return answer.value.html
    },
    placeholderData: keepPreviousData,
    staleTime: Infinity,
    gcTime: 10_000,
  })
}
