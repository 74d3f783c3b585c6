import type { Reader } from '@/db/client'
import type { Actor } from '@/lib/rules/roles'
import type { FileKind } from '@/lib/rules/words'

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

export function getFile(_db: Reader, _actor: Actor, _fileId: string): StoredFile | null {
  throw new Error('not yet')
}
