import { and, count, eq, gte, inArray, isNotNull, lt, ne } from 'drizzle-orm'
import { median, quantile } from 'simple-statistics'
import type { Reader } from '@/db/client'
import { manuscripts, points, rounds, verdicts } from '@/db/schema'
import { RULES, type Rule } from '@/lib/checks/vocabulary'
import { may } from '@/lib/rules/permissions'
import { refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { STATES, type State } from '@/lib/rules/states'
import type { PointStatus } from '@/lib/rules/words'

const day = 86_400_000
const week = 7 * day

/** How long rounds took from hand-in to the released verdict, in days; null where there is none. */
export type Turnaround = { rounds: number; median: number | null; slowestTenth: number | null }

export type Figures = {
  states: { state: State; manuscripts: number }[]
  turnaround: { ever: Turnaround; lastQuarter: Turnaround }
  overdue: number
  /** Reviews due in each of the four weeks that begin now. */
  dueByWeek: number[]
  /** What became of the audit's points in rounds whose verdict is released. */
  points: ({ rule: Rule } & Record<PointStatus, number>)[]
}

/** The desk in numbers. For editors; counts only, so nothing of one manuscript can be read from it. */
export function getFigures(db: Reader, actor: Actor, now: number): Figures {
  if (!may(actor, 'figures.read')) throw refuseUnknown()
  const released = listReleased(db)
  return {
    states: countStates(db),
    turnaround: {
      ever: toTurnaround(released),
      lastQuarter: toTurnaround(released.filter((round) => round.releasedAt >= now - 90 * day)),
    },
    overdue: countDue(db, null, now),
    dueByWeek: [0, 1, 2, 3].map((n) => countDue(db, now + n * week, now + (n + 1) * week)),
    points: countPoints(db),
  }
}

function countStates(db: Reader): Figures['states'] {
  const counted = db
    .select({ state: manuscripts.state, n: count() })
    .from(manuscripts)
    .where(ne(manuscripts.state, 'draft'))
    .groupBy(manuscripts.state)
    .all()
  return STATES.filter((state) => state !== 'draft').map((state) => ({
    state,
    manuscripts: counted.find((row) => row.state === state)?.n ?? 0,
  }))
}

function listReleased(db: Reader): { days: number; releasedAt: number }[] {
  return db
    .select({ handedInAt: rounds.handedInAt, releasedAt: verdicts.releasedAt })
    .from(verdicts)
    .innerJoin(rounds, eq(rounds.id, verdicts.roundId))
    .where(and(eq(verdicts.status, 'released'), isNotNull(rounds.handedInAt), isNotNull(verdicts.releasedAt)))
    .all()
    .flatMap(({ handedInAt, releasedAt }) =>
      handedInAt === null || releasedAt === null
        ? []
        : [{ days: (releasedAt - handedInAt) / day, releasedAt }],
    )
}

function toTurnaround(released: readonly { days: number }[]): Turnaround {
  const days = released.map((round) => round.days)
  if (days.length === 0) return { rounds: 0, median: null, slowestTenth: null }
  return { rounds: days.length, median: median(days), slowestTenth: quantile(days, 0.9) }
}

/** Reviews at work that are due in [from, to); from null: at any time before. */
function countDue(db: Reader, from: number | null, to: number): number {
  const row = db
    .select({ n: count() })
    .from(manuscripts)
    .where(
      and(
        inArray(manuscripts.state, ['assigned', 'in review', 'verdict drafted']),
        from === null ? undefined : gte(manuscripts.dueAt, from),
        lt(manuscripts.dueAt, to),
      ),
    )
    .get()
  return row?.n ?? 0
}

function countPoints(db: Reader): Figures['points'] {
  const counted = db
    .select({ rule: points.rule, status: points.status, n: count() })
    .from(points)
    .innerJoin(verdicts, eq(verdicts.roundId, points.roundId))
    .where(and(isNotNull(points.rule), eq(verdicts.status, 'released')))
    .groupBy(points.rule, points.status)
    .all()
  const find = (rule: Rule, status: PointStatus) =>
    counted.find((row) => row.rule === rule && row.status === status)?.n ?? 0
  return RULES.map((rule) => ({
    rule,
    open: find(rule, 'open'),
    kept: find(rule, 'kept'),
    dropped: find(rule, 'dropped'),
  })).filter(({ open, kept, dropped }) => open + kept + dropped > 0)
}
