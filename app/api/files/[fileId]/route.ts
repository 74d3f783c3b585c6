import { getFile } from '@/db/queries/file'
import { noteFileRead } from '@/lib/desk/note-file-read'
import { removeFile } from '@/lib/desk/remove-file'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import { answerFile, getPart } from '@/lib/web/file-response'
import { route } from '@/lib/web/route'

type Params = { fileId: string }

export const GET = route<Params>(async ({ request, params, db, settings, actor, now }) => {
  const file = getFile(db, actor, params.fileId)
  if (!file) return null
  const part = getPart(request, file)
  const response = await answerFile(request, { ...file, path: getStoredPath(settings.uploads, file.sha256) })
  // A reader that asks for a file part by part reads it once: the record holds the first part.
  if (response.ok && (part === null || (part !== 'none' && part.start === 0)))
    noteFileRead(db, actor, file, now)
  return response
})

export const DELETE = route<Params>(({ params, db, actor, now }) =>
  removeFile(db, actor, { fileId: params.fileId }, now),
)
