import { transact, type Db } from '@/db/client'
import { recordEvent } from '@/lib/record/record-event'
import type { RefusalKind } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import type { FileKind } from '@/lib/rules/words'

/** Records that a file was not taken, and of what kind the refusal was; never its name. */
export function noteFileRefused(
  db: Db,
  actor: Actor,
  about: { manuscriptId: string; kind: FileKind; refusal: RefusalKind },
  now: number,
): void {
  const { manuscriptId, kind, refusal } = about
  transact(db, (tx) =>
    recordEvent(tx, actor, 'file refused', now, { manuscriptId, detail: { kind, refusal } }),
  )
}
