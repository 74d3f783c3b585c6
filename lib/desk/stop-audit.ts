import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const stopAuditInput = z.object({
  auditId: z.string(),
  /** What is wrong and what to do, one or two sentences for the submitter. */
  trouble: z.string().trim().min(1).max(2000),
})

export type StopAuditResult = { stopped: boolean }

export function stopAudit(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof stopAuditInput>,
  _now: number,
): StopAuditResult {
  throw new Error('not yet')
}
