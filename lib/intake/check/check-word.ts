import { isRefusal, refuse } from '@/lib/rules/refusal'
import { WORD_DOCUMENT } from '@/lib/rules/words'
import { nameZip } from './check-workbook'
import { unpackZip, type ZipLimits } from './unpack-zip'
import { sayInstead } from './what-it-is'

export const damagedWord =
  'The Word document is damaged or cut off; please save it again as .docx, or export it as PDF, and hand that in.'

const limits: ZipLimits = {
  entries: 5_000,
  bytes: 300 * 1024 * 1024,
  damaged: damagedWord,
  locked:
    'The Word document is protected by a password; please save it without one, or export it as PDF, and hand that in.',
  tooLarge:
    'The Word document unpacks to more than a manuscript may hold; please export it as PDF and hand that in.',
}

/** The largest part that is read: the text of a long book is a tenth of it. */
const largestPart = 40 * 1024 * 1024

const withMacros =
  'The Word document carries macros (.docm); please save it as .docx, or export it as PDF, and hand that in.'

/** Parts that hold text and what gives it its shape; pictures, embedded files and links to others are left out. */
// "word/document.xml", "word/document2.xml", "word/_rels/document.xml.rels", "_rels/.rels", "[Content_Types].xml"
const textParts =
  /^(?:\[Content_Types\]\.xml|_rels\/\.rels|word\/(?:document\d*|styles|numbering|footnotes|endnotes)\.xml|word\/_rels\/[^/]+\.rels)$/

/** The parts of a Word document that hold its text. Rejects with a refusal for what is none, or not a safe one. */
export async function readWordParts(path: string): Promise<Map<string, Buffer>> {
  const parts = await unpackZip(path, limits, (name) => textParts.test(name))
  if (![...parts.keys()].some((name) => /^word\/document\d*\.xml$/.test(name)))
    throw refuse('unreadable', sayInstead(nameZip(parts) ?? 'a ZIP archive', 'manuscript'))
  if (parts.has('word/vbaProject.bin')) throw refuse('unreadable', withMacros)
  for (const [name, part] of parts) {
    if (!textParts.test(name)) parts.delete(name)
    else if (part.length > largestPart) throw refuse('too-large', limits.tooLarge)
  }
  if (!parts.has('[Content_Types].xml') || !parts.has('_rels/.rels')) throw refuse('unreadable', damagedWord)
  return parts
}

/** Refuses what is not a Word document in its present format, and one that unpacks without end. */
export async function checkWord(path: string): Promise<typeof WORD_DOCUMENT> {
  await readWordParts(path)
  return WORD_DOCUMENT
}

/** A fault of the reader on a document's content is the document's trouble. */
export function asDamagedWord(cause: unknown): Error {
  return isRefusal(cause) ? cause : Object.assign(refuse('unreadable', damagedWord), { cause })
}
