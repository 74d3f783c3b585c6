import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export type ReviewerRow = {
  id: string
  name: string
  expertise: string
  /** Offered and accepted reviews that are not done. */
  open: number
  nextDueAt: number | null
  overdue: number
  /** Of the manuscripts asked about: those that cannot be offered to them, and why. */
  barred: { manuscriptId: string; why: 'conflict' | 'submitter' }[]
}

/** Active reviewers, the least loaded first. For editors. */
export function listReviewers(
  _db: Reader,
  _actor: Actor,
  _manuscriptIds: readonly string[],
  _now: number,
): ReviewerRow[] {
  throw new Error('not yet')
}
