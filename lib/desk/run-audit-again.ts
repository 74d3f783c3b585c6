import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const runAuditAgainInput = z.object({ manuscriptId: z.string() })

export type RunAuditAgainResult = { auditId: string }

export function runAuditAgain(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof runAuditAgainInput>,
  _now: number,
): RunAuditAgainResult {
  throw new Error('not yet')
}
