import type { ReadDocument } from '@/lib/checks/types'
import { defaultLimits, runThread, type ReadingLimits } from '../thread/run-thread'

/** Reads a PDF's positioned text in a worker thread; rejects as `runThread` does. */
export function readPdf(
  path: string,
  limits: ReadingLimits = defaultLimits,
  onPage: (page: number, of: number) => void = () => undefined,
): Promise<ReadDocument> {
  return runThread({
    task: { kind: 'read', path, maxPages: limits.pages },
    limits,
    onMessage: (message) => {
      if (message.kind === 'page') onPage(message.page, message.of)
      return message.kind === 'read' ? message.document : undefined
    },
  })
}
