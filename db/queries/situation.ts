import { and, desc, eq, isNotNull, isNull } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { assignments, audits, conflicts, rounds, verdicts } from '@/db/schema'
import type { Situation } from '@/lib/rules/actions'
import type { Actor } from '@/lib/rules/roles'
import type { State } from '@/lib/rules/states'
import { getRulesOf } from './rules-in-force'

/** The facts about a manuscript that decide what the actor can do next with it. */
export function getSituation(
  db: Reader,
  actor: Actor,
  manuscript: { id: string; state: State; currentRound: number },
): Situation & { rules: ReturnType<typeof getRulesOf> } {
  const all = db
    .select({
      id: rounds.id,
      number: rounds.number,
      handedInAt: rounds.handedInAt,
      houseRulesVersion: rounds.houseRulesVersion,
    })
    .from(rounds)
    .where(eq(rounds.manuscriptId, manuscript.id))
    .orderBy(desc(rounds.number))
    .all()
  const current = all.find((round) => round.number === manuscript.currentRound)
  if (!current) throw new Error(`manuscript ${manuscript.id} has no round ${manuscript.currentRound}`)
  const rules = getRulesOf(db, current.houseRulesVersion)
  const reviewing = db
    .select({ id: assignments.id })
    .from(assignments)
    .where(
      and(
        eq(assignments.roundId, current.id),
        eq(assignments.reviewerId, actor.id),
        eq(assignments.status, 'accepted'),
      ),
    )
    .get()
  const verdict = db
    .select({ reviewerId: verdicts.reviewerId })
    .from(verdicts)
    .where(eq(verdicts.roundId, current.id))
    .get()
  const audited = db
    .select({ id: audits.id })
    .from(audits)
    .where(and(eq(audits.roundId, current.id), eq(audits.status, 'done')))
    .limit(1)
    .get()
  const letter = db
    .select({ id: verdicts.id })
    .from(verdicts)
    .innerJoin(rounds, eq(rounds.id, verdicts.roundId))
    .where(and(eq(rounds.manuscriptId, manuscript.id), isNotNull(verdicts.releasedAt)))
    .limit(1)
    .get()
  const conflict = db
    .select({ id: conflicts.id })
    .from(conflicts)
    .where(and(eq(conflicts.manuscriptId, manuscript.id), isNull(conflicts.liftedAt)))
    .limit(1)
    .get()
  return {
    state: manuscript.state,
    roundBegun: all.some((round) => round.handedInAt === null),
    reviewing: reviewing !== undefined,
    ownVerdict: verdict?.reviewerId === actor.id,
    twoPersonRelease: rules.twoPersonRelease,
    submitterSeesAudit: rules.submitterSeesAudit,
    letterSent: letter !== undefined,
    audited: audited !== undefined,
    openConflicts: conflict !== undefined,
    rules,
  }
}
