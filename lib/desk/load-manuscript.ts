import { and, eq, inArray, isNull } from 'drizzle-orm'
import type { Reader, Tx } from '@/db/client'
import { assignments, files, manuscripts, people, rounds } from '@/db/schema'
import type { Permission } from '@/lib/rules/permissions'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import type { State } from '@/lib/rules/states'
import { requireOnManuscript } from './permission'

/** What fits no state on the way, told by the state it found. */
export function refuseState(state: State) {
  return refuse('conflict', `The manuscript is “${state}” by now; please reload the page.`)
}

export function loadManuscript(tx: Reader, actor: Actor, permission: Permission, manuscriptId: string) {
  requireOnManuscript(tx, actor, permission, manuscriptId)
  return getManuscriptRow(tx, manuscriptId)
}

/** Without asking who wants to know: for the system, and for what a permission was asked for already. */
export function getManuscriptRow(tx: Reader, manuscriptId: string) {
  const row = tx
    .select({
      id: manuscripts.id,
      reference: manuscripts.reference,
      title: manuscripts.title,
      submitterId: manuscripts.submitterId,
      correspondingAuthor: manuscripts.correspondingAuthor,
      correspondingEmail: manuscripts.correspondingEmail,
      state: manuscripts.state,
      currentRound: manuscripts.currentRound,
      receivedAt: manuscripts.receivedAt,
    })
    .from(manuscripts)
    .where(eq(manuscripts.id, manuscriptId))
    .get()
  if (!row) throw refuseUnknown()
  return row
}

const roundColumns = {
  id: rounds.id,
  manuscriptId: rounds.manuscriptId,
  number: rounds.number,
  houseRulesVersion: rounds.houseRulesVersion,
}

export function getRoundRow(tx: Reader, manuscript: { id: string; currentRound: number }) {
  const row = tx
    .select(roundColumns)
    .from(rounds)
    .where(and(eq(rounds.manuscriptId, manuscript.id), eq(rounds.number, manuscript.currentRound)))
    .get()
  if (!row) throw new Error(`manuscript ${manuscript.id} has no round ${manuscript.currentRound}`)
  return row
}

/** The round that is begun and not handed in, if there is one. */
export function findBegunRound(tx: Reader, manuscriptId: string) {
  return tx
    .select(roundColumns)
    .from(rounds)
    .where(and(eq(rounds.manuscriptId, manuscriptId), isNull(rounds.handedInAt)))
    .get()
}

/** The assignment that somebody is due for. */
export function findOpenAssignment(tx: Reader, manuscriptId: string) {
  return tx
    .select({
      id: assignments.id,
      roundId: assignments.roundId,
      reviewerId: assignments.reviewerId,
      assignedBy: assignments.assignedBy,
      status: assignments.status,
    })
    .from(assignments)
    .where(
      and(eq(assignments.manuscriptId, manuscriptId), inArray(assignments.status, ['offered', 'accepted'])),
    )
    .get()
}

/** Manuscript and round of the actor's own review under way; refuses everybody else, at any other state. */
export function loadReview(
  tx: Reader,
  actor: Actor,
  permission: Permission,
  manuscriptId: string,
  states: readonly State[] = ['in review'],
) {
  const manuscript = loadManuscript(tx, actor, permission, manuscriptId)
  if (!states.includes(manuscript.state)) throw refuseState(manuscript.state)
  const assignment = findOpenAssignment(tx, manuscriptId)
  if (assignment?.reviewerId !== actor.id || assignment.status !== 'accepted') {
    throw refuse('conflict', 'Somebody else reviews this manuscript by now; please reload the page.')
  }
  return { manuscript, assignment, round: getRoundRow(tx, manuscript) }
}

export function hasManuscriptFile(tx: Reader, roundId: string): boolean {
  const row = tx
    .select({ id: files.id })
    .from(files)
    .where(and(eq(files.roundId, roundId), eq(files.kind, 'manuscript'), isNull(files.replacedAt)))
    .get()
  return row !== undefined
}

export function getRecipient(tx: Reader, personId: string) {
  const row = tx
    .select({ id: people.id, name: people.name, email: people.email })
    .from(people)
    .where(eq(people.id, personId))
    .get()
  if (!row) throw new Error(`there is no person ${personId}`)
  return row
}

/** Ends an open assignment in any way; nobody is due any more. */
export function closeAssignment(
  tx: Tx,
  assignment: { id: string },
  manuscriptId: string,
  status: 'declined' | 'ended' | 'done',
  reason: string,
  now: number,
): void {
  tx.update(assignments)
    .set({ status, reason, endedAt: now, ...(status === 'declined' ? { answeredAt: now } : {}) })
    .where(eq(assignments.id, assignment.id))
    .run()
  tx.update(manuscripts).set({ dueAt: null }).where(eq(manuscripts.id, manuscriptId)).run()
}
