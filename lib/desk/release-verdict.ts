import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const releaseVerdictInput = z.object({ manuscriptId: z.string() })

export type ReleaseVerdictResult = { letterId: string; version: number }

export function releaseVerdict(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof releaseVerdictInput>,
  _now: number,
): ReleaseVerdictResult {
  throw new Error('not yet')
}
