import { eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { files, rounds } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'
import { seesSubmitter } from '@/lib/rules/sight'
import type { FileKind } from '@/lib/rules/words'
import { findViewing, hideFileName } from './viewing'

export type StoredFile = {
  id: string
  manuscriptId: string
  kind: FileKind
  /** As the viewer may see it. */
  name: string
  mediaType: string
  sha256: string
  bytes: number
}

/** A file of a round that is not handed in is its submitter's alone. */
export function getFile(db: Reader, actor: Actor, fileId: string): StoredFile | null {
  const row = db
    .select({
      id: files.id,
      manuscriptId: rounds.manuscriptId,
      kind: files.kind,
      name: files.name,
      mediaType: files.mediaType,
      sha256: files.sha256,
      bytes: files.bytes,
      handedInAt: rounds.handedInAt,
    })
    .from(files)
    .innerJoin(rounds, eq(rounds.id, files.roundId))
    .where(eq(files.id, fileId))
    .get()
  if (!row) return null
  const { handedInAt, ...file } = row
  const viewing = findViewing(db, actor, file.manuscriptId, 'file.read')
  if (!viewing || (handedInAt === null && viewing.sight !== 'submitter')) return null
  const named = seesSubmitter(viewing.sight, viewing.blinding)
  return named ? file : { ...file, name: hideFileName(file.kind, file.name) }
}
