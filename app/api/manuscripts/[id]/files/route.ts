import { z } from 'zod'
import { addFile } from '@/lib/desk/add-file'
import { loadOpenFiles } from '@/lib/desk/load-open-files'
import { noteFileRefused } from '@/lib/desk/note-file-refused'
import { storeFile } from '@/lib/intake/store-file'
import { cleanFileName } from '@/lib/intake/store/file-name'
import { isRefusal } from '@/lib/rules/refusal'
import { FILE_KINDS } from '@/lib/rules/words'
import { parse } from '@/lib/web/parse'
import { route, type RouteCall } from '@/lib/web/route'
import { getDeclaredBytes, getFileName, readBody } from '@/lib/web/upload'

type Params = { id: string }

/** The body is the file and nothing else; its name and kind are in headers. */
export const POST = route<Params>(async (call) => {
  const { request, params, db, actor, now } = call
  // Before a byte is read; the command asks again when the file has arrived.
  loadOpenFiles(db, actor, params.id)
  const kind = parse(z.enum(FILE_KINDS), request.headers.get('x-file-kind'))
  const name = cleanFileName(getFileName(request), kind === 'manuscript' ? 'manuscript.pdf' : 'results')
  const stored = await store(call, kind)
  return addFile(db, actor, { manuscriptId: params.id, kind, name, ...stored }, now)
})

async function store(
  { request, params, settings, db, actor, now }: RouteCall<Params>,
  kind: 'manuscript' | 'table',
) {
  try {
    return await storeFile(readBody(request), {
      folder: settings.uploads,
      kind,
      limit: settings.uploadLimitBytes,
      declaredBytes: getDeclaredBytes(request),
      signal: request.signal,
    })
  } catch (error) {
    if (isRefusal(error)) {
      noteFileRefused(db, actor, { manuscriptId: params.id, kind, refusal: error.refusal }, now)
    }
    throw error
  }
}
