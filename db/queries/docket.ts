import { and, asc, count, desc, eq, inArray, or, sql, type SQL } from 'drizzle-orm'
import { alias, type SQLiteSelect } from 'drizzle-orm/sqlite-core'
import type { Reader } from '@/db/client'
import { assignments, audits, families, manuscripts, people, points, rounds } from '@/db/schema'
import type { Outcome } from '@/lib/checks/vocabulary'
import type { DocketFilter, DocketSort, DueFilter } from '@/lib/rules/docket'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { seesReviewer, type PersonRef, type Sight } from '@/lib/rules/sight'
import { STATES, type State } from '@/lib/rules/states'
import { contains } from './contains'
import { getDocketScope, type DocketScope } from './docket-scope'
import { getBlinding, hideReviewer, listPseudonyms } from './viewing'

export type DocketRow = {
  id: string
  reference: string | null
  title: string
  state: State
  stateSince: number
  receivedAt: number | null
  round: number
  /** In which part the viewer sees this one. */
  sight: Sight
  reviewer: PersonRef | null
  /** Null where the house rules hide it. */
  submitter: PersonRef | null
  dueAt: number | null
  /** Families of the finished audit of the current round; null without one, or who may not read it. */
  outcomes: Record<Outcome, number> | null
  /** Points of the round nobody has decided yet; null who may not read the audit. */
  openPoints: number | null
}

export type DocketPage = { rows: DocketRow[]; total: number; page: number; pageSize: number }

export type DocketFacets = {
  total: number
  states: Record<State, number>
  outcomes: Record<Outcome, number>
  due: Record<DueFilter, number>
}

const reviewer = alias(people, 'reviewer')
const submitter = alias(people, 'submitter')

/** `now` is what "overdue" is held against. */
export function listDocket(db: Reader, actor: Actor, filter: DocketFilter, now: number): DocketPage {
  const { page, pageSize } = filter
  if (!may(actor, 'docket.list')) return { rows: [], total: 0, page, pageSize }
  const scope = getDocketScope(db, actor, filter.as)
  const where = and(scope.seen, ...narrow(db, actor, scope, filter, now))
  const rows = join(
    db
      .select({
        id: manuscripts.id,
        reference: manuscripts.reference,
        title: manuscripts.title,
        state: manuscripts.state,
        stateSince: manuscripts.stateSince,
        receivedAt: manuscripts.receivedAt,
        round: manuscripts.currentRound,
        roundId: rounds.id,
        dueAt: manuscripts.dueAt,
        reviewer: { id: reviewer.id, name: reviewer.name },
        assignment: assignments.status,
        submitter: { id: submitter.id, name: submitter.name },
        own: sql<number>`${scope.asSubmitter}`,
        edited: sql<number>`${scope.asEditor}`,
        readsAudit: sql<number>`${scope.readsAudit}`,
        knowsSubmitter: sql<number>`${scope.knowsSubmitter}`,
        auditId: newestAudit,
      })
      .from(manuscripts)
      .$dynamic(),
  )
    .where(where)
    .orderBy(...orderOf(scope, filter))
    .limit(pageSize)
    .offset((page - 1) * pageSize)
    .all()
  const counted = join(db.select({ n: count() }).from(manuscripts).$dynamic())
    .where(where)
    .get()
  const audited = rows.filter((row) => row.readsAudit === 1)
  const outcomes = countOutcomes(
    db,
    audited.flatMap((row) => row.auditId ?? []),
  )
  const open = countOpenPoints(
    db,
    audited.map((row) => row.roundId),
  )
  const own = rows.filter((row) => row.own === 1).map((row) => row.id)
  const names = listPseudonyms(db, own)
  const blinded = new Set(own.filter((id) => !seesReviewer('submitter', getBlinding(db, id))))
  return {
    rows: rows.map((row) => {
      const { roundId, auditId, own, edited, readsAudit, knowsSubmitter, assignment, ...about } = row
      const sight = own === 1 ? 'submitter' : edited === 1 ? 'editor' : 'reviewer'
      const offered = assignment === 'offered' && sight === 'submitter'
      const shown = offered ? null : row.reviewer
      return {
        ...about,
        sight,
        reviewer: shown && blinded.has(row.id) ? hideReviewer(shown, names.get(row.id)) : shown,
        submitter: knowsSubmitter === 1 ? row.submitter : null,
        outcomes: readsAudit === 1 && auditId !== null ? (outcomes.get(auditId) ?? noOutcomes()) : null,
        openPoints: readsAudit === 1 && auditId !== null ? (open.get(roundId) ?? 0) : null,
      }
    }),
    total: counted?.n ?? 0,
    page,
    pageSize,
  }
}

/** How many rows each filter alone would leave, over everything that the actor sees (as `filter.as`). */
export function getDocketFacets(
  db: Reader,
  actor: Actor,
  filter: Pick<DocketFilter, 'as'>,
  now: number,
): DocketFacets {
  const states = Object.fromEntries(STATES.map((state) => [state, 0])) as Record<State, number>
  const facets: DocketFacets = {
    total: 0,
    states,
    outcomes: noOutcomes(),
    due: { overdue: 0, 'this week': 0 },
  }
  if (!may(actor, 'docket.list')) return facets
  const scope = getDocketScope(db, actor, filter.as)
  const byState = join(
    db
      .select({
        state: manuscripts.state,
        n: count(),
        overdue: sql<number>`coalesce(sum(${isDue('overdue', now)}), 0)`,
        thisWeek: sql<number>`coalesce(sum(${isDue('this week', now)}), 0)`,
      })
      .from(manuscripts)
      .$dynamic(),
  )
    .where(scope.seen)
    .groupBy(manuscripts.state)
    .all()
  for (const { state, n, overdue, thisWeek } of byState) {
    facets.total += n
    facets.states[state] = n
    facets.due.overdue += overdue
    facets.due['this week'] += thisWeek
  }
  const worst = worstOutcome(db)
  const byOutcome = join(db.select({ worst, n: count() }).from(manuscripts).$dynamic())
    .where(and(scope.seen, scope.readsAudit))
    .groupBy(worst)
    .all()
  for (const { worst, n } of byOutcome) {
    const outcome = worst === null ? undefined : worstFirst[worst]
    if (outcome) facets.outcomes[outcome] = n
  }
  return facets
}

/** Each manuscript with its current round, its submitter, and the reviewer of that round. */
function join<T extends SQLiteSelect>(query: T) {
  return query
    .innerJoin(
      rounds,
      and(eq(rounds.manuscriptId, manuscripts.id), eq(rounds.number, manuscripts.currentRound)),
    )
    .innerJoin(submitter, eq(submitter.id, manuscripts.submitterId))
    .leftJoin(
      assignments,
      and(eq(assignments.roundId, rounds.id), inArray(assignments.status, ['offered', 'accepted', 'done'])),
    )
    .leftJoin(reviewer, eq(reviewer.id, assignments.reviewerId))
}

/** The newest finished audit of the current round. */
const newestAudit = sql<string | null>`(
  select ${audits.id} from ${audits}
  where ${audits.roundId} = ${rounds.id} and ${audits.status} = 'done'
  order by ${audits.queuedAt} desc, ${audits}.rowid desc limit 1)`

const worstFirst: readonly Outcome[] = ['fails', 'uncorrected', 'undecidable', 'holds']

/** Rank in `worstFirst` of the worst family of that audit; null without one. */
function worstOutcome(db: Reader): SQL<number | null> {
  const cases = worstFirst.map((outcome, rank) => sql`when ${outcome} then ${rank}`)
  const rank = sql<number>`min(case ${families.outcome} ${sql.join(cases, sql` `)} end)`
  const query = db
    .select({ rank })
    .from(families)
    .where(sql`${families.auditId} = ${newestAudit}`)
  return sql<number | null>`${query}`
}

const week = 7 * 24 * 3_600_000

function isDue(due: DueFilter, now: number): SQL {
  return due === 'overdue'
    ? sql`(${manuscripts.dueAt} < ${now})`
    : sql`(${manuscripts.dueAt} >= ${now} and ${manuscripts.dueAt} < ${now + week})`
}

function narrow(db: Reader, actor: Actor, scope: DocketScope, filter: DocketFilter, now: number) {
  const { states, search, outcome, due, mine } = filter
  return [
    states.length === 0 ? undefined : inArray(manuscripts.state, states),
    search === '' ? undefined : matches(scope, search),
    outcome === undefined
      ? undefined
      : and(scope.readsAudit, sql`${worstOutcome(db)} = ${worstFirst.indexOf(outcome)}`),
    due === undefined ? undefined : isDue(due, now),
    mine
      ? or(
          eq(manuscripts.submitterId, actor.id),
          eq(assignments.reviewerId, actor.id),
          and(scope.asEditor, eq(assignments.assignedBy, actor.id)),
        )
      : undefined,
  ]
}

function matches(scope: DocketScope, search: string): SQL | undefined {
  return or(
    contains(manuscripts.title, search),
    contains(manuscripts.reference, search),
    and(scope.knowsSubmitter, contains(submitter.name, search)),
    and(scope.asEditor, contains(reviewer.name, search)),
  )
}

function orderOf(scope: DocketScope, { sort, direction }: DocketFilter): SQL[] {
  const towards = direction === 'asc' ? asc : desc
  const along = STATES.map((state, i) => sql`when ${state} then ${i}`)
  const keys: Record<DocketSort, SQL[]> = {
    received: [sql`${towards(manuscripts.receivedAt)} nulls last`],
    state: [
      towards(sql`case ${manuscripts.state} ${sql.join(along, sql` `)} end`),
      asc(manuscripts.stateSince),
    ],
    due: [sql`${towards(manuscripts.dueAt)} nulls last`],
    title: [towards(manuscripts.title)],
    // A hidden name must not show in the order of the rows either.
    reviewer: [
      sql`${towards(sql`case when ${scope.asSubmitter} then null else ${reviewer.name} end`)} nulls last`,
    ],
  }
  return [...keys[sort], asc(manuscripts.id)]
}

function noOutcomes(): Record<Outcome, number> {
  return { holds: 0, fails: 0, undecidable: 0, uncorrected: 0 }
}

function countOutcomes(db: Reader, auditIds: string[]): Map<string, Record<Outcome, number>> {
  const counts = new Map<string, Record<Outcome, number>>()
  if (auditIds.length === 0) return counts
  const rows = db
    .select({ auditId: families.auditId, outcome: families.outcome, n: count() })
    .from(families)
    .where(inArray(families.auditId, auditIds))
    .groupBy(families.auditId, families.outcome)
    .all()
  for (const { auditId, outcome, n } of rows) {
    counts.set(auditId, { ...(counts.get(auditId) ?? noOutcomes()), [outcome]: n })
  }
  return counts
}

function countOpenPoints(db: Reader, roundIds: string[]): Map<string, number> {
  if (roundIds.length === 0) return new Map()
  const rows = db
    .select({ roundId: points.roundId, n: count() })
    .from(points)
    .where(and(inArray(points.roundId, roundIds), eq(points.status, 'open')))
    .groupBy(points.roundId)
    .all()
  return new Map(rows.map(({ roundId, n }) => [roundId, n]))
}
