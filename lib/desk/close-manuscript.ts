import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const closeManuscriptInput = z.object({ manuscriptId: z.string() })

export type CloseManuscriptResult = { manuscriptId: string }

export function closeManuscript(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof closeManuscriptInput>,
  _now: number,
): CloseManuscriptResult {
  throw new Error('not yet')
}
