import type { Reader } from '@/db/client'
import type { Action } from '@/lib/rules/actions'
import type { Actor } from '@/lib/rules/roles'
import type { PersonRef, Sight } from '@/lib/rules/sight'
import type { State } from '@/lib/rules/states'
import type { AssignmentStatus, Blinding, FileKind, Verdict } from '@/lib/rules/words'
import type { AuditProgress } from './audit-progress'

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

/** Null where the actor may not know of it. A reviewer who has not accepted sees title and dates, no files. */
export function getManuscript(_db: Reader, _actor: Actor, _manuscriptId: string): ManuscriptView | null {
  throw new Error('not yet')
}
