import { and, count, eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { people, points, rounds, verdicts } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'
import type { PointStatus, Verdict, VerdictStatus } from '@/lib/rules/words'
import { findViewing } from './viewing'

export type VerdictView = {
  id: string
  round: number
  reviewer: { id: string; name: string }
  verdict: Verdict
  /** To the editor, never to the authors. */
  remark: string
  effortMinutes: number | null
  /** Markdown. */
  body: string
  status: VerdictStatus
  sentBackReason: string
  draftedAt: number
  changedAt: number
  releasedAt: number | null
  /** Points of the round: how many are kept for the letter, and how many nobody has decided. */
  kept: number
  undecided: number
}

/** For its reviewer and the editors; the submitter reads the letter. Of the current round unless told. */
export function getVerdict(
  db: Reader,
  actor: Actor,
  manuscriptId: string,
  round?: number,
): VerdictView | null {
  const viewing = findViewing(db, actor, manuscriptId, 'verdict.read')
  if (!viewing) return null
  const row = db
    .select({
      id: verdicts.id,
      roundId: rounds.id,
      round: rounds.number,
      reviewer: { id: people.id, name: people.name },
      verdict: verdicts.verdict,
      remark: verdicts.remark,
      effortMinutes: verdicts.effortMinutes,
      body: verdicts.body,
      status: verdicts.status,
      sentBackReason: verdicts.sentBackReason,
      draftedAt: verdicts.draftedAt,
      changedAt: verdicts.changedAt,
      releasedAt: verdicts.releasedAt,
    })
    .from(verdicts)
    .innerJoin(rounds, eq(rounds.id, verdicts.roundId))
    .innerJoin(people, eq(people.id, verdicts.reviewerId))
    .where(
      and(
        eq(rounds.manuscriptId, manuscriptId),
        eq(rounds.number, round ?? viewing.manuscript.currentRound),
        // What another reviewer drafted before the manuscript came to this one is the editors' to read.
        viewing.sight === 'editor' ? undefined : eq(verdicts.reviewerId, actor.id),
      ),
    )
    .get()
  if (!row) return null
  const { roundId, ...verdict } = row
  const counts = db
    .select({ status: points.status, n: count() })
    .from(points)
    .where(eq(points.roundId, roundId))
    .groupBy(points.status)
    .all()
  const countOf = (status: PointStatus) => counts.find((row) => row.status === status)?.n ?? 0
  return { ...verdict, kept: countOf('kept'), undecided: countOf('open') }
}
