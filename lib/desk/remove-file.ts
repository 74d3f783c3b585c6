import { z } from 'zod'
import type { Db } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'

export const removeFileInput = z.object({ fileId: z.string() })

export type RemoveFileResult = { manuscriptId: string }

export function removeFile(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof removeFileInput>,
  _now: number,
): RemoveFileResult {
  throw new Error('not yet')
}
