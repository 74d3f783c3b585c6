import type { Reader } from '@/db/client'
import type { Rule, Severity } from '@/lib/checks/vocabulary'
import type { Actor } from '@/lib/rules/roles'
import type { PointStatus } from '@/lib/rules/words'

export type PointRow = {
  id: string
  round: number
  /** Key of the finding it came from; null for the reviewer's own. */
  findingKey: string | null
  rule: Rule | null
  familyKey: string | null
  familyLabel: string
  status: PointStatus
  reason: string
  severity: Severity
  says: string
  asks: string
  quote: string
  page: number | null
  cites: string[]
  position: number
  decidedBy: { id: string; name: string } | null
  decidedAt: number | null
  answer: { body: string; createdAt: number; changedAt: number | null } | null
}

/**
 * In their order. The submitter gets the kept points of a released round only, in the order of the letter,
 * without who decided and why. `round`: the current one unless told; for the submitter the newest released one.
 */
export function listPoints(_db: Reader, _actor: Actor, _manuscriptId: string, _round?: number): PointRow[] {
  throw new Error('not yet')
}
