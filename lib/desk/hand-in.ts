import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const handInInput = z.object({ manuscriptId: z.string() })

export type HandInResult = { reference: string; round: number; auditId: string }

export function handIn(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof handInInput>,
  _now: number,
): HandInResult {
  throw new Error('not yet')
}
