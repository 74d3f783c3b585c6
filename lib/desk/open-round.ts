import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const openRoundInput = z.object({ manuscriptId: z.string() })

export type OpenRoundResult = { roundId: string; round: number }

export function openRound(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof openRoundInput>,
  _now: number,
): OpenRoundResult {
  throw new Error('not yet')
}
