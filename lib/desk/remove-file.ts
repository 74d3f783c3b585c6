import { and, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { files, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { loadOpenFiles } from './load-open-files'

export const removeFileInput = z.object({ fileId: z.string() })

export type RemoveFileResult = { manuscriptId: string }

/** Takes a file out of a round that is not handed in, or that is stuck on it. */
export function removeFile(
  db: Db,
  actor: Actor,
  input: z.infer<typeof removeFileInput>,
  now: number,
): RemoveFileResult {
  return transact(db, (tx) => {
    const file = tx
      .select({ roundId: files.roundId, kind: files.kind, manuscriptId: rounds.manuscriptId })
      .from(files)
      .innerJoin(rounds, eq(rounds.id, files.roundId))
      .where(and(eq(files.id, input.fileId), isNull(files.replacedAt)))
      .get()
    if (!file) throw refuseUnknown()
    const { manuscript, round } = loadOpenFiles(tx, actor, file.manuscriptId)
    if (round.id !== file.roundId) throw refuse('conflict', 'This file was handed in and is kept.')
    tx.update(files).set({ replacedAt: now }).where(eq(files.id, input.fileId)).run()
    recordEvent(tx, actor, 'file removed', now, {
      manuscriptId: manuscript.id,
      subject: input.fileId,
      detail: { kind: file.kind, round: round.number },
    })
    return { manuscriptId: manuscript.id }
  })
}
