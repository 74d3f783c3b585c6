import { z } from 'zod'
import type { Db } from '@/db/client'
import { FILE_KINDS } from '@/lib/rules/words'
import type { Actor } from '@/lib/rules/roles'

export const addFileInput = z.object({
  manuscriptId: z.string(),
  kind: z.enum(FILE_KINDS),
  name: z.string().trim().min(1).max(255),
  mediaType: z.string().min(1).max(200),
  sha256: z.string().regex(/^[0-9a-f]{64}$/), // 64 hexadecimal digits
  bytes: z.number().int().min(1),
})

export type AddFileResult = { fileId: string; replaced: string | null }

export function addFile(
  _db: Db,
  _actor: Actor,
  _input: z.input<typeof addFileInput>,
  _now: number,
): AddFileResult {
  throw new Error('not yet')
}
