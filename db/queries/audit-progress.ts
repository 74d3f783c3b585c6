import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import type { AuditStatus } from '@/lib/rules/words'

export type AuditProgress = {
  auditId: string
  status: AuditStatus
  stage: string
  /** Within the stage, in [0, 1]. */
  progress: number
  trouble: string | null
  queuedAt: number
  startedAt: number | null
  finishedAt: number | null
}

/** The newest audit of the current round. */
export function getAuditProgress(_db: Reader, _actor: Actor, _manuscriptId: string): AuditProgress | null {
  throw new Error('not yet')
}
