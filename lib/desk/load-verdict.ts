import { eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { verdicts } from '@/db/schema'

/** The verdict of a round, in whatever state. */
export function findVerdict(tx: Reader, roundId: string) {
  return tx
    .select({
      id: verdicts.id,
      reviewerId: verdicts.reviewerId,
      verdict: verdicts.verdict,
      body: verdicts.body,
      status: verdicts.status,
    })
    .from(verdicts)
    .where(eq(verdicts.roundId, roundId))
    .get()
}
