import { Readable } from 'node:stream'
import { addFile } from '@/lib/desk/add-file'
import { changeDraft } from '@/lib/desk/change-draft'
import { createDraft } from '@/lib/desk/create-draft'
import { handIn } from '@/lib/desk/hand-in'
import { storeFile } from '@/lib/intake/store-file'
import type { FileKind } from '@/lib/rules/words'
import type { World } from './world'

type Files = Partial<Record<FileKind, { name: string; bytes: Uint8Array }>>

/** A manuscript handed in with real files, stored as an upload stores them. */
export async function makeHandedIn(
  { db, submitter, now }: Pick<World, 'db' | 'submitter' | 'now'>,
  uploads: string,
  given: Files,
): Promise<{ manuscriptId: string; auditId: string }> {
  const { manuscriptId } = createDraft(db, submitter, { title: 'Kelp holdfasts under tow' }, now())
  const author = { correspondingAuthor: 'Corin Inglis', correspondingEmail: 'corin.inglis@kelpbay.example' }
  changeDraft(db, submitter, { manuscriptId, ...author }, now())
  for (const kind of ['manuscript', 'table'] as const) {
    const file = given[kind]
    if (!file) continue
    const body = Readable.from([file.bytes])
    const stored = await storeFile(body, { folder: uploads, kind, limit: 50 * 1024 * 1024 })
    addFile(db, submitter, { manuscriptId, kind, name: file.name, ...stored }, now())
  }
  const { auditId } = handIn(db, submitter, { manuscriptId }, now())
  return { manuscriptId, auditId }
}
