import type { Reader } from '@/db/client'
import { getAudit } from '@/db/queries/audit'
import type { Report } from '@/lib/checks/types'
import type { Actor } from '@/lib/rules/roles'

export function listReports(db: Reader, actor: Actor, manuscriptId: string): readonly Report[] {
  return getAudit(db, actor, manuscriptId)?.audit.reports ?? []
}
