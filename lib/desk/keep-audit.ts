import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Audit } from '@/lib/checks/types'
import type { Actor } from '@/lib/rules/roles'

export const keepAuditInput = z.object({
  auditId: z.string(),
  audit: z.custom<Audit>((value) => typeof value === 'object' && value !== null),
})

export type KeepAuditResult = { kept: boolean }

export function keepAudit(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof keepAuditInput>,
  _now: number,
): KeepAuditResult {
  throw new Error('not yet')
}
