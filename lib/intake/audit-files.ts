import type { Audit, HouseRules } from '@/lib/checks/types'
import type { TableFile } from './thread/messages'
import { defaultLimits, runThread, type ReadingLimits } from './thread/run-thread'

export type AuditFiles = {
  manuscript: string
  table: TableFile | null
  rules: HouseRules
}

export type Audited = {
  audit: Audit
  /** The PDF that a Word document was turned into, which the audit's pages are those of. */
  readingCopy: Uint8Array | null
}

type Watch = {
  limits?: ReadingLimits
  signal?: AbortSignal
  /** The stage and how far within it, in [0, 1]. */
  onProgress?: (stage: string, progress: number) => void
}

/** Reads and judges a manuscript and its table in one worker thread, so that one limit covers both. */
export function auditFiles(files: AuditFiles, watch: Watch = {}): Promise<Audited> {
  const { limits = defaultLimits, signal, onProgress = () => undefined } = watch
  return runThread({
    task: {
      kind: 'audit',
      path: files.manuscript,
      maxPages: limits.pages,
      recognition: limits.recognition,
      table: files.table,
      rules: files.rules,
    },
    limits,
    ...(signal ? { signal } : {}),
    onMessage: (message) => {
      if (message.kind === 'page') onProgress('reading', message.page / message.of)
      if (message.kind === 'stage') onProgress(message.stage, 0)
      if (message.kind !== 'audited') return undefined
      return { audit: message.audit, readingCopy: message.readingCopy }
    },
  })
}
