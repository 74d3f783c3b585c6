import { and, gte, lt, max, sql } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { manuscripts } from '@/db/schema'

/** The next free reference of the year in which `now` lies (UTC), such as THC-2026-0012. */
export function getNextReference(tx: Reader, prefix: string, now: number): string {
  const start = `${prefix}-${new Date(now).getUTCFullYear()}-`
  // '.' is the character after '-': the range holds this year's references, and the unique index serves it.
  const end = `${start.slice(0, -1)}.`
  const number = sql<number>`cast(substr(${manuscripts.reference}, ${start.length + 1}) as integer)`
  const row = tx
    .select({ last: max(number) })
    .from(manuscripts)
    .where(and(gte(manuscripts.reference, start), lt(manuscripts.reference, end)))
    .get()
  return `${start}${String(Number(row?.last ?? 0) + 1).padStart(4, '0')}`
}
