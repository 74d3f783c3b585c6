import { createHash } from 'node:crypto'
import { and, asc, eq, gt, inArray, lte } from 'drizzle-orm'
import type { Reader, Tx } from '@/db/client'
import { signInTries } from '@/db/schema'
import { refuse } from '@/lib/rules/refusal'

export const tryWindow = 15 * 60_000

/** Tries of one key that fail within the window before the next is refused. */
const limits = { email: 10, address: 60, change: 10 } as const

/**
 * Counts a try before it is made, so that many at once cannot slip past the limit; a try that succeeds is
 * forgiven. Refuses with how long to wait. A refused try does not lengthen the wait.
 */
export function takeTry(tx: Tx, kind: keyof typeof limits, of: string, now: number): number {
  const key = createHash('sha256').update(`${kind}:${of}`).digest('hex')
  tx.delete(signInTries)
    .where(and(eq(signInTries.key, key), lte(signInTries.at, now - tryWindow)))
    .run()
  const recent = tx
    .select({ at: signInTries.at })
    .from(signInTries)
    .where(and(eq(signInTries.key, key), gt(signInTries.at, now - tryWindow)))
    .orderBy(asc(signInTries.at))
    .all()
  const oldest = recent[recent.length - limits[kind]]
  if (oldest) throw refuse('too-many', waitMessage(oldest.at + tryWindow - now))
  return tx.insert(signInTries).values({ key, at: now }).returning({ id: signInTries.id }).get().id
}

export function forgiveTries(tx: Tx, ids: number[]): void {
  tx.delete(signInTries).where(inArray(signInTries.id, ids)).run()
}

/** Forgets the tries of addresses that are not tried any more. */
export function forgetOldTries(db: Reader, now: number): void {
  db.delete(signInTries)
    .where(lte(signInTries.at, now - tryWindow))
    .run()
}

function waitMessage(milliseconds: number): string {
  const minutes = Math.max(1, Math.ceil(milliseconds / 60_000))
  return `That was tried too often; please wait ${minutes} ${minutes === 1 ? 'minute' : 'minutes'} and try again.`
}
