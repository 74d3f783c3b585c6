import type { Audit, HouseRules, ReadDocument } from '@/lib/checks/types'
import type { RefusalKind } from '@/lib/rules/refusal'

export type ReadTask = { kind: 'read'; path: string; maxPages: number }
export type AuditTask = {
  kind: 'audit'
  path: string
  maxPages: number
  table: { path: string; name: string } | null
  rules: HouseRules
}
export type ThreadTask = ReadTask | AuditTask

/** `opening` and `reading` are the reader's stages; the engine tells the others. */
export type ThreadMessage =
  | { kind: 'page'; page: number; of: number }
  | { kind: 'stage'; stage: string }
  /** `readingCopy`: the PDF that a Word document was turned into. */
  | { kind: 'read'; document: ReadDocument; readingCopy: Uint8Array | null }
  | { kind: 'audited'; audit: Audit; readingCopy: Uint8Array | null }
  | { kind: 'refused'; refusal: RefusalKind; message: string }
  /** Where it broke: while reading the PDF it is the file's trouble, else it is ours. */
  | { kind: 'trouble'; phase: Phase; name: string; message: string; stack: string; code: string | null }

export type Phase = 'opening' | 'reading' | 'reading the table' | 'judging'
