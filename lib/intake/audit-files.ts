import type { Audit, HouseRules } from '@/lib/checks/types'
import { defaultLimits, runThread, type ReadingLimits } from './thread/run-thread'

export type AuditFiles = {
  manuscript: string
  table: { path: string; name: string } | null
  rules: HouseRules
}

type Watch = {
  limits?: ReadingLimits
  signal?: AbortSignal
  /** The stage and how far within it, in [0, 1]. */
  onProgress?: (stage: string, progress: number) => void
}

/** Reads and judges a manuscript and its table in one worker thread, so that one limit covers both. */
export function auditFiles(files: AuditFiles, watch: Watch = {}): Promise<Audit> {
  const { limits = defaultLimits, signal, onProgress = () => undefined } = watch
  return runThread({
    task: {
      kind: 'audit',
      path: files.manuscript,
      maxPages: limits.pages,
      table: files.table,
      rules: files.rules,
    },
    limits,
    ...(signal ? { signal } : {}),
    onMessage: (message) => {
      if (message.kind === 'page') onProgress('reading', message.page / message.of)
      if (message.kind === 'stage') onProgress(message.stage, 0)
      return message.kind === 'audited' ? message.audit : undefined
    },
  })
}
