import type { Tx } from '@/db/client'
import { record } from '@/db/schema'
import type { Event } from '@/lib/rules/events'
import type { Actor } from '@/lib/rules/roles'

type Entry = {
  manuscriptId?: string | null
  /** Id of what it is about, when that is not the manuscript. */
  subject?: string | null
  /** Facts needed later; never a manuscript's text. */
  detail?: Record<string, string | number | boolean | null>
}

/** Writes one line of the record, in the transaction of the deed itself. */
export function recordEvent(tx: Tx, actor: Actor, event: Event, now: number, entry: Entry = {}): void {
  tx.insert(record)
    .values({
      at: now,
      event,
      actorId: actor.id,
      actorName: actor.name,
      manuscriptId: entry.manuscriptId ?? null,
      subject: entry.subject ?? null,
      detail: entry.detail ?? {},
    })
    .run()
}
