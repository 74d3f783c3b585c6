import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const handInAgainInput = z.object({ manuscriptId: z.string() })

export type HandInAgainResult = { auditId: string }

export function handInAgain(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof handInAgainInput>,
  _now: number,
): HandInAgainResult {
  throw new Error('not yet')
}
