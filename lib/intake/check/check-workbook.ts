import { openPromise, type ZipFile } from 'yauzl'
import { isRefusal, refuse } from '@/lib/rules/refusal'
import { sayInstead } from './what-it-is'

/** What a workbook may come to when unpacked: a small file that unpacks without end fills the memory. */
const maxEntries = 5_000
const maxUnpackedBytes = 200 * 1024 * 1024

const xlsx = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet' as const

/** Refuses a zipped file that is not an XLSX workbook, or that unpacks to more than a workbook may. */
export async function checkWorkbook(path: string): Promise<typeof xlsx> {
  try {
    const zip = await openPromise(path)
    try {
      requireWorkbook(await listAndUnpack(zip))
    } finally {
      zip.close()
    }
    return xlsx
  } catch (cause) {
    if (isRefusal(cause)) throw cause
    throw Object.assign(refuse('unreadable', damaged), { cause })
  }
}

/** Unpacks every entry into nothing; the library ends where an entry is larger than the file declares. */
async function listAndUnpack(zip: ZipFile): Promise<Set<string>> {
  const names = new Set<string>()
  let unpacked = 0
  for await (const entry of zip.eachEntry()) {
    names.add(entry.fileName)
    unpacked += entry.uncompressedSize
    if (names.size > maxEntries || unpacked > maxUnpackedBytes) throw refuse('too-large', bomb)
    if (entry.isEncrypted()) throw refuse('unreadable', locked)
    const stream = await zip.openReadStreamPromise(entry)
    await new Promise<void>((resolve, reject) => {
      stream.on('error', reject).on('end', resolve).resume()
    })
  }
  return names
}

function requireWorkbook(names: Set<string>): void {
  if (names.has('xl/workbook.xml')) return
  const other = others.find(([name]) => names.has(name))
  throw refuse('unreadable', sayInstead(other?.[1] ?? 'a ZIP archive', 'table'))
}

const others = [
  ['word/document.xml', 'a Word document'],
  ['ppt/presentation.xml', 'a presentation'],
  ['xl/workbook.bin', 'a binary Excel workbook'],
  ['content.xml', 'an OpenDocument file'],
] as const

const damaged = 'The spreadsheet is damaged or cut off; please save it again as XLSX or CSV and hand that in.'
const locked =
  'The spreadsheet is protected by a password; please save it without one, as XLSX or CSV, and hand that in.'
const bomb =
  'The spreadsheet unpacks to more than a results table may hold; please hand in only the rows of reported tests, as CSV.'
