import { stat } from 'node:fs/promises'
import { getFile } from '@/db/queries/file'
import { noteFileRead } from '@/lib/desk/note-file-read'
import { getReadingCopyPath } from '@/lib/intake/store/reading-copy'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import { WORD_DOCUMENT } from '@/lib/rules/words'
import { answerFile, getPart } from '@/lib/web/file-response'
import { route } from '@/lib/web/route'

/** The PDF that a Word manuscript was turned into, which the audit's pages are those of. */
export const GET = route<{ fileId: string }>(async ({ request, params, db, settings, actor, now }) => {
  const file = getFile(db, actor, params.fileId)
  if (file?.mediaType !== WORD_DOCUMENT) return null
  const path = getReadingCopyPath(getStoredPath(settings.uploads, file.sha256))
  const found = await findFile(path)
  if (!found) return null
  const { size: bytes, mtimeMs } = found
  // An audit that runs again may write it anew: the same document, another copy.
  const copy = { bytes, sha256: `${file.sha256}-${Math.round(mtimeMs)}` }
  const name = `${file.name.replace(/\.docx$/i, '')}.pdf`
  const part = getPart(request, copy)
  const response = await answerFile(request, { ...copy, path, mediaType: 'application/pdf', name })
  if (response.ok && (part === null || (part !== 'none' && part.start === 0)))
    noteFileRead(db, actor, file, now)
  return response
})

async function findFile(path: string) {
  try {
    return await stat(path)
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return null
    throw error
  }
}
