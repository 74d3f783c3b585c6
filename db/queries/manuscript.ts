import { and, asc, eq, inArray, isNotNull, isNull } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { Reader } from '@/db/client'
import { assignments, conflicts, files, manuscripts, people, rounds, verdicts } from '@/db/schema'
import { listActions, type Action } from '@/lib/rules/actions'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { seesReviewer, seesSubmitter, type PersonRef, type Sight } from '@/lib/rules/sight'
import type { State } from '@/lib/rules/states'
import type { AssignmentStatus, Blinding, FileKind, Verdict } from '@/lib/rules/words'
import { readProgress, type AuditProgress } from './audit-progress'
import { getSituation } from './situation'
import { findViewing, hideFileName, hideReviewer, listPseudonyms, type Viewing } from './viewing'

export type FileView = {
  id: string
  kind: FileKind
  /** "manuscript.pdf" or "table.csv" where the house rules hide who the authors are. */
  name: string
  mediaType: string
  bytes: number
  createdAt: number
  replacedAt: number | null
}

export type RoundView = {
  id: string
  number: number
  openedAt: number
  /** Null while it is begun and not handed in. */
  handedInAt: number | null
  closedAt: number | null
  alpha: number | null
  correction: string
  primaryOutcome: string
  note: string
  files: FileView[]
  verdict: { verdict: Verdict; releasedAt: number } | null
}

export type AssignmentView = {
  id: string
  reviewer: PersonRef
  status: AssignmentStatus
  dueAt: number
  offeredAt: number
  answeredAt: number | null
}

export type ConflictView = {
  id: string
  person: { id: string; name: string }
  declaredBy: string
  reason: string
  createdAt: number
}

export type ManuscriptView = {
  id: string
  reference: string | null
  title: string
  state: State
  stateSince: number
  createdAt: number
  receivedAt: number | null
  dueAt: number | null
  /** In which part the viewer sees it. */
  sight: Sight
  blinding: Blinding
  /** The round that is judged; a revision being prepared is in `rounds` with `handedInAt` null. */
  round: number
  submitter: { id: string; name: string; email: string; affiliation: string } | null
  correspondingAuthor: string | null
  correspondingEmail: string | null
  /** Oldest first. A round that is begun is seen by its submitter only. */
  rounds: RoundView[]
  assignment: AssignmentView | null
  /** Open conflicts; editors only, else empty. */
  conflicts: ConflictView[]
  progress: AuditProgress | null
  /** The newest verdict that was released. */
  verdict: { verdict: Verdict; releasedAt: number; round: number } | null
  rules: { twoPersonRelease: boolean; submitterSeesAudit: boolean; reviewDays: number; answerDays: number }
  actions: Action[]
}

/** Null where the actor may not know of it. A reviewer who has not accepted yet gets no files. */
export function getManuscript(db: Reader, actor: Actor, manuscriptId: string): ManuscriptView | null {
  const viewing = findViewing(db, actor, manuscriptId)
  if (!viewing) return null
  const { manuscript, standing, sight, blinding } = viewing
  const row = db
    .select({
      reference: manuscripts.reference,
      title: manuscripts.title,
      stateSince: manuscripts.stateSince,
      createdAt: manuscripts.createdAt,
      receivedAt: manuscripts.receivedAt,
      dueAt: manuscripts.dueAt,
      correspondingAuthor: manuscripts.correspondingAuthor,
      correspondingEmail: manuscripts.correspondingEmail,
      submitter: {
        id: people.id,
        name: people.name,
        email: people.email,
        affiliation: people.affiliation,
      },
    })
    .from(manuscripts)
    .innerJoin(people, eq(people.id, manuscripts.submitterId))
    .where(eq(manuscripts.id, manuscriptId))
    .get()
  if (!row) return null
  const { submitter, correspondingAuthor, correspondingEmail, ...about } = row
  const named = seesSubmitter(sight, blinding)
  const roundViews = listRounds(db, viewing, may(actor, 'file.read', standing))
  const { rules, ...situation } = getSituation(db, actor, manuscript)
  const { twoPersonRelease, submitterSeesAudit, reviewDays, answerDays } = rules
  const released = roundViews.findLast((round) => round.verdict !== null)
  return {
    id: manuscriptId,
    ...about,
    state: manuscript.state,
    sight,
    blinding,
    round: manuscript.currentRound,
    submitter: named ? submitter : null,
    correspondingAuthor: named ? correspondingAuthor : null,
    correspondingEmail: named ? correspondingEmail : null,
    rounds: roundViews,
    assignment: findAssignment(db, viewing),
    conflicts: sight === 'editor' ? listConflicts(db, manuscriptId) : [],
    progress: may(actor, 'audit.follow', standing) ? readProgress(db, viewing) : null,
    verdict: released?.verdict ? { ...released.verdict, round: released.number } : null,
    rules: { twoPersonRelease, submitterSeesAudit, reviewDays, answerDays },
    actions: listActions(actor, standing, situation),
  }
}

function listRounds(db: Reader, { manuscript, sight, blinding }: Viewing, withFiles: boolean): RoundView[] {
  const rows = db
    .select({
      id: rounds.id,
      number: rounds.number,
      openedAt: rounds.openedAt,
      handedInAt: rounds.handedInAt,
      closedAt: rounds.closedAt,
      alpha: rounds.alpha,
      correction: rounds.correction,
      primaryOutcome: rounds.primaryOutcome,
      note: rounds.note,
      verdict: verdicts.verdict,
      releasedAt: verdicts.releasedAt,
    })
    .from(rounds)
    .leftJoin(verdicts, and(eq(verdicts.roundId, rounds.id), eq(verdicts.status, 'released')))
    .where(
      and(
        eq(rounds.manuscriptId, manuscript.id),
        sight === 'submitter' ? undefined : isNotNull(rounds.handedInAt),
      ),
    )
    .orderBy(asc(rounds.number))
    .all()
  const named = seesSubmitter(sight, blinding)
  const stored = withFiles ? listFiles(db, manuscript.id) : []
  return rows.map(({ verdict, releasedAt, ...round }) => ({
    ...round,
    files: stored
      .filter((file) => file.roundId === round.id)
      .map(({ roundId: _, ...file }) =>
        named ? file : { ...file, name: hideFileName(file.kind, file.name) },
      ),
    verdict: verdict !== null && releasedAt !== null ? { verdict, releasedAt } : null,
  }))
}

function listFiles(db: Reader, manuscriptId: string) {
  return db
    .select({
      id: files.id,
      roundId: files.roundId,
      kind: files.kind,
      name: files.name,
      mediaType: files.mediaType,
      bytes: files.bytes,
      createdAt: files.createdAt,
      replacedAt: files.replacedAt,
    })
    .from(files)
    .innerJoin(rounds, eq(rounds.id, files.roundId))
    .where(eq(rounds.manuscriptId, manuscriptId))
    .orderBy(asc(files.createdAt), asc(files.id))
    .all()
}

/** The review of the current round that is offered, under way or done; for the submitter from its acceptance on. */
function findAssignment(db: Reader, { manuscript, sight, blinding }: Viewing): AssignmentView | null {
  const hidden = !seesReviewer(sight, blinding)
  const row = db
    .select({
      id: assignments.id,
      reviewer: { id: people.id, name: people.name },
      status: assignments.status,
      dueAt: assignments.dueAt,
      offeredAt: assignments.createdAt,
      answeredAt: assignments.answeredAt,
    })
    .from(assignments)
    .innerJoin(rounds, eq(rounds.id, assignments.roundId))
    .innerJoin(people, eq(people.id, assignments.reviewerId))
    .where(
      and(
        eq(assignments.manuscriptId, manuscript.id),
        eq(rounds.number, manuscript.currentRound),
        inArray(
          assignments.status,
          sight === 'submitter' ? ['accepted', 'done'] : ['offered', 'accepted', 'done'],
        ),
      ),
    )
    .get()
  if (!row || !hidden) return row ?? null
  const names = listPseudonyms(db, [manuscript.id]).get(manuscript.id)
  return { ...row, reviewer: hideReviewer(row.reviewer, names) }
}

function listConflicts(db: Reader, manuscriptId: string): ConflictView[] {
  const declarer = alias(people, 'declarer')
  return db
    .select({
      id: conflicts.id,
      person: { id: people.id, name: people.name },
      declaredBy: declarer.name,
      reason: conflicts.reason,
      createdAt: conflicts.createdAt,
    })
    .from(conflicts)
    .innerJoin(people, eq(people.id, conflicts.personId))
    .innerJoin(declarer, eq(declarer.id, conflicts.declaredBy))
    .where(and(eq(conflicts.manuscriptId, manuscriptId), isNull(conflicts.liftedAt)))
    .orderBy(asc(conflicts.createdAt))
    .all()
}
