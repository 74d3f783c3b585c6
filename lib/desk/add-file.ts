import { and, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { files } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { FILE_KINDS } from '@/lib/rules/words'
import { loadOpenFiles } from './load-open-files'

export const addFileInput = z.object({
  manuscriptId: z.string(),
  kind: z.enum(FILE_KINDS),
  name: z.string().trim().min(1).max(255),
  mediaType: z.string().min(1).max(200),
  // A SHA-256 in 64 hexadecimal digits.
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  bytes: z.number().int().min(1),
})

export type AddFileResult = { fileId: string; replaced: string | null }

/** Adds a file that is stored already; one of its kind that was there before is kept as replaced. */
export function addFile(
  db: Db,
  actor: Actor,
  input: z.infer<typeof addFileInput>,
  now: number,
): AddFileResult {
  return transact(db, (tx) => {
    const { manuscript, round } = loadOpenFiles(tx, actor, input.manuscriptId)
    const { kind, name, mediaType, sha256, bytes } = input
    const before = tx
      .update(files)
      .set({ replacedAt: now })
      .where(and(eq(files.roundId, round.id), eq(files.kind, kind), isNull(files.replacedAt)))
      .returning({ id: files.id })
      .all()
    const fileId = newId('file')
    tx.insert(files)
      .values({
        id: fileId,
        roundId: round.id,
        kind,
        name,
        mediaType,
        sha256,
        bytes,
        uploadedBy: actor.id,
        createdAt: now,
      })
      .run()
    recordEvent(tx, actor, 'file added', now, {
      manuscriptId: manuscript.id,
      subject: fileId,
      detail: { kind, bytes, sha256, round: round.number },
    })
    return { fileId, replaced: before[0]?.id ?? null }
  })
}
