import { openPromise, type Entry, type ZipFile } from 'yauzl'
import { isRefusal, refuse } from '@/lib/rules/refusal'

export type ZipLimits = {
  entries: number
  /** Sum of what all entries unpack to. */
  bytes: number
  /** Said where there is more than that. */
  tooLarge: string
  /** Said where an entry is encrypted. */
  locked: string
  /** Said where the archive cannot be read. */
  damaged: string
}

/**
 * Unpacks every entry, within limits that hold before an entry is unpacked; the library ends where an entry is
 * larger than the file declares. What `keeps` names is returned whole, all else is unpacked into nothing.
 */
export async function unpackZip(
  path: string,
  limits: ZipLimits,
  keeps: (name: string) => boolean = () => false,
): Promise<Map<string, Buffer>> {
  try {
    const zip = await openPromise(path)
    try {
      return await unpackAll(zip, limits, keeps)
    } finally {
      zip.close()
    }
  } catch (cause) {
    if (isRefusal(cause)) throw cause
    throw Object.assign(refuse('unreadable', limits.damaged), { cause })
  }
}

async function unpackAll(zip: ZipFile, limits: ZipLimits, keeps: (name: string) => boolean) {
  const parts = new Map<string, Buffer>()
  let [entries, unpacked] = [0, 0]
  for await (const entry of zip.eachEntry()) {
    entries += 1
    unpacked += entry.uncompressedSize
    if (entries > limits.entries || unpacked > limits.bytes || isBomb(entry))
      throw refuse('too-large', limits.tooLarge)
    if (entry.isEncrypted()) throw refuse('unreadable', limits.locked)
    parts.set(entry.fileName, await unpack(zip, entry, keeps(entry.fileName)))
  }
  return parts
}

/** Text and numbers shrink to a thirtieth at best; only what repeats one byte shrinks to this part of itself. */
function isBomb({ uncompressedSize, compressedSize }: Entry): boolean {
  return uncompressedSize > 10 * 1024 * 1024 && uncompressedSize > 200 * compressedSize
}

async function unpack(zip: ZipFile, entry: Entry, kept: boolean): Promise<Buffer> {
  const stream = await zip.openReadStreamPromise(entry)
  const chunks: Buffer[] = []
  await new Promise<void>((resolve, reject) => {
    stream.on('data', (chunk: Buffer) => void (kept && chunks.push(chunk)))
    stream.on('error', reject).on('end', resolve)
  })
  return Buffer.concat(chunks)
}
