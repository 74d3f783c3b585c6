import { open } from 'node:fs/promises'
import { Readable } from 'node:stream'

export type SentFile = { path: string; bytes: number; mediaType: string; name: string; sha256: string }
export type Part = { start: number; end: number }

/** The part of a file that a request asks for; null for the whole, 'none' where there is no such part. */
export function getPart(request: Request, file: Pick<SentFile, 'bytes' | 'sha256'>): Part | null | 'none' {
  const condition = request.headers.get('if-range')
  if (condition !== null && condition !== getTag(file)) return null
  // One range, such as "bytes=0-499", "bytes=500-", "bytes=-500"; several at once are answered by the whole.
  const asked = /^bytes=(\d*)-(\d*)$/.exec(request.headers.get('range')?.trim() ?? '')
  if (!asked || (asked[1] === '' && asked[2] === '')) return null
  const last = file.bytes - 1
  const suffix = asked[1] === ''
  const start = suffix ? Math.max(0, file.bytes - Number(asked[2])) : Number(asked[1])
  const end = suffix || asked[2] === '' ? last : Math.min(last, Number(asked[2]))
  return start > last || start > end ? 'none' : { start, end }
}

/** Streams a file, or the part that is asked for. A browser shows a PDF and saves everything else. */
export async function answerFile(request: Request, file: SentFile): Promise<Response> {
  const headers = new Headers({
    'Content-Type': file.mediaType.startsWith('text/') ? `${file.mediaType}; charset=utf-8` : file.mediaType,
    'Content-Disposition': describeDisposition(
      file.mediaType === 'application/pdf' ? 'inline' : 'attachment',
      file.name,
    ),
    'X-Content-Type-Options': 'nosniff',
    'Cache-Control': 'private, no-store',
    'Accept-Ranges': 'bytes',
    ETag: getTag(file),
  })
  if (request.headers.get('if-none-match') === getTag(file))
    return new Response(null, { status: 304, headers })
  const part = getPart(request, file)
  if (part === 'none') {
    headers.set('Content-Range', `bytes */${file.bytes}`)
    return new Response(null, { status: 416, headers })
  }
  const { start, end } = part ?? { start: 0, end: file.bytes - 1 }
  headers.set('Content-Length', String(end - start + 1))
  if (part) headers.set('Content-Range', `bytes ${start}-${end}/${file.bytes}`)
  const status = part ? 206 : 200
  // Opened before the answer begins: a file that is missing is a fault, not an empty answer.
  const handle = await open(file.path)
  const stream = Readable.toWeb(handle.createReadStream({ start, end })) as ReadableStream<Uint8Array>
  return new Response(stream, { status, headers })
}

/** A name in any script: plain letters for old clients beside the name itself (RFC 6266, RFC 8187). */
export function describeDisposition(how: 'inline' | 'attachment', name: string): string {
  const plain = name.replace(/[^\x20-\x7e]|["\\%]/g, '_')
  const encoded = encodeURIComponent(name.replace(/[\ud800-\udfff]/gu, '_')).replace(
    /['()*]/g,
    (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`,
  )
  return `${how}; filename="${plain}"; filename*=UTF-8''${encoded}`
}

function getTag({ sha256 }: { sha256: string }): string {
  return `"${sha256}"`
}
