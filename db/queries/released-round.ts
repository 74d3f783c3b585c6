import { and, desc, eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { rounds, verdicts } from '@/db/schema'

/** A round whose verdict is released, the newest one unless told which; null where there is none. */
export function findReleasedRound(db: Reader, manuscriptId: string, number?: number) {
  return (
    db
      .select({ id: rounds.id, number: rounds.number, houseRulesVersion: rounds.houseRulesVersion })
      .from(rounds)
      .innerJoin(verdicts, and(eq(verdicts.roundId, rounds.id), eq(verdicts.status, 'released')))
      .where(
        and(
          eq(rounds.manuscriptId, manuscriptId),
          number === undefined ? undefined : eq(rounds.number, number),
        ),
      )
      .orderBy(desc(rounds.number))
      .limit(1)
      .get() ?? null
  )
}

/** A round that was handed in, by its number. */
export function findRound(db: Reader, manuscriptId: string, number: number) {
  return (
    db
      .select({ id: rounds.id, number: rounds.number, houseRulesVersion: rounds.houseRulesVersion })
      .from(rounds)
      .where(and(eq(rounds.manuscriptId, manuscriptId), eq(rounds.number, number)))
      .get() ?? null
  )
}
