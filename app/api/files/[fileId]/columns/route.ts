import { getTableColumns } from '@/db/queries/table-columns'
import { nameColumns, nameColumnsInput } from '@/lib/desk/name-columns'
import { noteFileRead } from '@/lib/desk/note-file-read'
import { previewTable } from '@/lib/intake/preview-table'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import { readInput } from '@/lib/web/parse'
import { route } from '@/lib/web/route'

type Params = { fileId: string }

/** The first rows of a results table, and what people say that its columns hold. */
export const GET = route<Params>(async ({ params, db, settings, actor, now }) => {
  const found = getTableColumns(db, actor, params.fileId)
  if (!found) return null
  const { file, ...about } = found
  const preview = await previewTable({ path: getStoredPath(settings.uploads, file.sha256), ...file })
  noteFileRead(db, actor, file, now)
  return { fileId: file.id, name: file.name, ...about, ...preview }
})

export const PUT = route<Params>(async ({ request, params, db, actor, now }) =>
  nameColumns(db, actor, await readInput(request, nameColumnsInput, { fileId: params.fileId }), now),
)
