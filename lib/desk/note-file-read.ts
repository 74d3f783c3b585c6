import { transact, type Db } from '@/db/client'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'

/** Records that a person opened a file; whether they may was asked before. */
export function noteFileRead(
  db: Db,
  actor: Actor,
  file: { id: string; manuscriptId: string; kind: string },
  now: number,
): void {
  transact(db, (tx) =>
    recordEvent(tx, actor, 'file read', now, {
      manuscriptId: file.manuscriptId,
      subject: file.id,
      detail: { kind: file.kind },
    }),
  )
}
