import { zipSync } from 'fflate'
import type { ReadRemark } from '@/lib/checks/types'
import { isRefusal } from '@/lib/rules/refusal'
import { asDamagedWord, readWordParts } from '../check/check-word'
import { preparePart, type LeftOut } from './prepare-part'
import { readBlocks } from './read-blocks'
import { setCopy } from './set-copy'

export type ReadingCopy = {
  pdf: Buffer
  /** What the copy leaves out or takes one way of two. */
  remarks: ReadRemark[]
}

// parts whose text is read: "word/document.xml", "word/footnotes.xml"
const running = /^word\/(?:document\d*|footnotes|endnotes)\.xml$/

/**
 * Turns a Word document into a reading copy: a PDF with real text, in which every number has a page and a place.
 * The same document gives the same bytes. Rejects with a refusal for a document that cannot be read.
 */
export async function makeReadingCopy(path: string): Promise<ReadingCopy> {
  const parts = await readWordParts(path)
  const leftOut: LeftOut = { pictures: 0, embedded: 0, changes: 0 }
  try {
    const prepared: Record<string, Uint8Array> = {}
    for (const [name, part] of parts)
      prepared[name] = running.test(name)
        ? new TextEncoder().encode(preparePart(new TextDecoder().decode(part), leftOut))
        : new Uint8Array(part)
    const text = await readBlocks(Buffer.from(zipSync(prepared, { level: 0 })))
    return { pdf: await setCopy(text), remarks: describe(leftOut) }
  } catch (error) {
    // Memory and time are the thread's limits and end it from outside.
    if (isRefusal(error)) throw error
    throw asDamagedWord(error)
  }
}

function describe({ pictures, embedded, changes }: LeftOut): ReadRemark[] {
  const count = (number: number, one: string) => `${number} ${one}${number === 1 ? '' : 's'}`
  const unread = (what: string) => ({
    says: `${what} of the Word document could not be read; look whether there are numbers inside.`,
    asks: 'Please supply any reported numbers inside pictures and embedded objects as text or as a results table.',
  })
  return [
    ...(pictures > 0 ? [unread(count(pictures, 'picture'))] : []),
    ...(embedded > 0 ? [unread(count(embedded, 'embedded object'))] : []),
    ...(changes > 0
      ? [
          {
            says: `The Word document has ${count(changes, 'tracked change')}: it was read as if all were accepted.`,
            asks: 'Please accept or reject all tracked changes before the manuscript is handed in again.',
          },
        ]
      : []),
  ]
}
