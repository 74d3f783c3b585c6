import type { Reader } from '@/db/client'
import type { Audit } from '@/lib/checks/types'
import type { Actor } from '@/lib/rules/roles'

export type KeptAudit = { auditId: string; round: number; finishedAt: number; audit: Audit }

/** The newest finished audit of a round (the current one unless told), as the engine gave it. */
export function getAudit(
  _db: Reader,
  _actor: Actor,
  _manuscriptId: string,
  _round?: number,
): KeptAudit | null {
  throw new Error('not yet')
}
