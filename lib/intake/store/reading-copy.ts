import { randomBytes } from 'node:crypto'
import { rename, rm, writeFile } from 'node:fs/promises'

/** Beside the stored Word document: the PDF that its audit refers to. */
export function getReadingCopyPath(stored: string): string {
  return `${stored}.reading.pdf`
}

/** Puts the reading copy beside its document, whole or not at all; a later audit may write it anew. */
export async function keepReadingCopy(stored: string, pdf: Uint8Array): Promise<void> {
  const temporary = `${stored}.${randomBytes(8).toString('hex')}`
  try {
    await writeFile(temporary, pdf, { mode: 0o600, flush: true })
    await rename(temporary, getReadingCopyPath(stored))
  } finally {
    await rm(temporary, { force: true })
  }
}
