import type { ReadDocument } from '@/lib/checks/types'
import { defaultLimits, runThread, type ReadingLimits } from './thread/run-thread'

export type ReadManuscript = {
  document: ReadDocument
  /** The PDF that a Word document was turned into; its pages are those that the document has. */
  readingCopy: Uint8Array | null
}

/** Reads a manuscript, PDF or Word, in a worker thread; rejects as `runThread` does. */
export function readManuscript(
  path: string,
  limits: ReadingLimits = defaultLimits,
  onPage: (page: number, of: number) => void = () => undefined,
): Promise<ReadManuscript> {
  return runThread({
    task: { kind: 'read', path, maxPages: limits.pages, recognition: limits.recognition },
    limits,
    onMessage: (message) => {
      if (message.kind === 'page') onPage(message.page, message.of)
      if (message.kind !== 'read') return undefined
      return { document: message.document, readingCopy: message.readingCopy }
    },
  })
}
