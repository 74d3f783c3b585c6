import type { Audit, HouseRules, NamedColumn, ReadDocument } from '@/lib/checks/types'
import type { RecognitionLimits } from '../recognise/recognise-pages'
import type { RefusalKind } from '@/lib/rules/refusal'

type Reading = { path: string; maxPages: number; recognition: RecognitionLimits }

/** `roles`: columns that a person named. */
export type TableFile = { path: string; name: string; roles?: readonly NamedColumn[] }

export type ReadTask = Reading & { kind: 'read' }
export type AuditTask = Reading & {
  kind: 'audit'
  table: TableFile | null
  rules: HouseRules
}
export type ThreadTask = ReadTask | AuditTask

/** `opening` and `reading` are the reader's stages; the engine tells the others. */
export type ThreadMessage =
  | { kind: 'page'; page: number; of: number }
  /** A page is a picture; from the first one on the reading may take longer. */
  | { kind: 'recognising' }
  | { kind: 'stage'; stage: string }
  /** `readingCopy`: the PDF that a Word document was turned into. */
  | { kind: 'read'; document: ReadDocument; readingCopy: Uint8Array | null }
  | { kind: 'audited'; audit: Audit; readingCopy: Uint8Array | null }
  | { kind: 'refused'; refusal: RefusalKind; message: string }
  /** Where it broke: while reading the PDF it is the file's trouble, else it is ours. */
  | { kind: 'trouble'; phase: Phase; name: string; message: string; stack: string; code: string | null }

export type Phase = 'opening' | 'reading' | 'reading the table' | 'judging'
