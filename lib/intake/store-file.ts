import { createHash, randomBytes } from 'node:crypto'
import { mkdir, open, rename, rm, type FileHandle } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { refuse } from '@/lib/rules/refusal'
import type { FileKind } from '@/lib/rules/words'
import { checkManuscript } from './check/check-manuscript'
import { cutOff } from './check/check-pdf'
import { checkTable } from './check/check-table'
import { getStoredPath, getTemporaryFolder } from './store/stored-path'

export type Stored = { sha256: string; bytes: number; mediaType: string }

type Place = {
  /** Where the uploads are kept. */
  folder: string
  kind: FileKind
  /** In bytes. */
  limit: number
  /** What the sender said it would send, where it did. */
  declaredBytes?: number | null
  signal?: AbortSignal
}

/**
 * Stores a file that arrives in pieces: never whole in memory, hashed on the way, checked by its content, and
 * only then put under its hash. Rejects with a refusal; whatever goes wrong, nothing is left behind.
 */
export async function storeFile(body: AsyncIterable<Uint8Array>, place: Place): Promise<Stored> {
  if ((place.declaredBytes ?? 0) > place.limit) throw tooLarge(place.limit)
  const folder = getTemporaryFolder(place.folder)
  await mkdir(folder, { recursive: true })
  const temporary = join(folder, randomBytes(16).toString('hex'))
  try {
    const { sha256, bytes } = await writeAll(body, temporary, place)
    const mediaType = await (place.kind === 'manuscript' ? checkManuscript(temporary) : checkTable(temporary))
    place.signal?.throwIfAborted()
    await moveInto(temporary, getStoredPath(place.folder, sha256))
    return { sha256, bytes, mediaType }
  } finally {
    await rm(temporary, { force: true })
  }
}

async function writeAll(body: AsyncIterable<Uint8Array>, path: string, place: Place) {
  const hash = createHash('sha256')
  const handle = await open(path, 'wx', 0o600)
  let bytes = 0
  try {
    for await (const chunk of body) {
      place.signal?.throwIfAborted()
      bytes += chunk.byteLength
      if (bytes > place.limit) throw tooLarge(place.limit)
      hash.update(chunk)
      await writeWhole(handle, chunk)
    }
    await handle.sync()
  } finally {
    await handle.close()
  }
  if (bytes === 0) throw refuse('unreadable', 'The file is empty; please choose it again.')
  if (typeof place.declaredBytes === 'number' && bytes < place.declaredBytes)
    throw refuse('unreadable', cutOff)
  return { sha256: hash.digest('hex'), bytes }
}

async function writeWhole(handle: FileHandle, chunk: Uint8Array): Promise<void> {
  let written = 0
  while (written < chunk.byteLength) {
    written += (await handle.write(chunk, written, chunk.byteLength - written)).bytesWritten
  }
}

/** The rename is kept over a power cut by syncing the folder as well. */
async function moveInto(temporary: string, stored: string): Promise<void> {
  await mkdir(dirname(stored), { recursive: true })
  await rename(temporary, stored)
  const folder = await open(dirname(stored))
  try {
    await folder.sync()
  } finally {
    await folder.close()
  }
}

function tooLarge(limit: number) {
  const megabytes = Math.floor((limit / 1024 / 1024) * 10) / 10
  return refuse(
    'too-large',
    `The file is larger than ${megabytes} MB; please hand in a smaller one, without supplements or with smaller pictures.`,
  )
}
