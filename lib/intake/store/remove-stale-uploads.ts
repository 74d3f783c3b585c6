import { readdir, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { getTemporaryFolder } from './stored-path'

const hour = 3_600_000

/** Removes what uploads left that were cut short by a crash; returns how many. */
export async function removeStaleUploads(uploads: string, now: number): Promise<number> {
  const folder = getTemporaryFolder(uploads)
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return []
    throw error
  })
  let removed = 0
  for (const name of names) {
    const path = join(folder, name)
    const { mtimeMs } = await stat(path)
    if (mtimeMs > now - hour) continue
    await rm(path, { force: true })
    removed++
  }
  return removed
}
