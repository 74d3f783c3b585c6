import type { Reader } from '@/db/client'
import type { Outcome } from '@/lib/checks/vocabulary'
import type { DocketFilter, DueFilter } from '@/lib/rules/docket'
import type { Actor } from '@/lib/rules/roles'
import type { PersonRef, Sight } from '@/lib/rules/sight'
import type { State } from '@/lib/rules/states'

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

/** `now` is what "overdue" is held against. */
export function listDocket(_db: Reader, _actor: Actor, _filter: DocketFilter, _now: number): DocketPage {
  throw new Error('not yet')
}

/** How many rows each filter alone would leave, over everything that the actor sees (as `filter.as`). */
export function getDocketFacets(
  _db: Reader,
  _actor: Actor,
  _filter: Pick<DocketFilter, 'as'>,
  _now: number,
): DocketFacets {
  throw new Error('not yet')
}
