import { refuse } from '@/lib/rules/refusal'
import { unpackZip, type ZipLimits } from './unpack-zip'
import { sayInstead } from './what-it-is'

const xlsx = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet' as const

/** What a workbook may come to when unpacked: a small file that unpacks without end fills the memory. */
const limits: ZipLimits = {
  entries: 5_000,
  bytes: 200 * 1024 * 1024,
  damaged: 'The spreadsheet is damaged or cut off; please save it again as XLSX or CSV and hand that in.',
  locked:
    'The spreadsheet is protected by a password; please save it without one, as XLSX or CSV, and hand that in.',
  tooLarge:
    'The spreadsheet unpacks to more than a results table may hold; please hand in only the rows of reported tests, as CSV.',
}

/** Refuses a zipped file that is not an XLSX workbook, or that unpacks to more than a workbook may. */
export async function checkWorkbook(path: string): Promise<typeof xlsx> {
  const parts = await unpackZip(path, limits)
  if (parts.has('xl/workbook.xml')) return xlsx
  throw refuse('unreadable', sayInstead(nameZip(parts) ?? 'a ZIP archive', 'table'))
}

/** What a zipped file is by what it holds; null for an archive of anything. */
export function nameZip(parts: ReadonlyMap<string, unknown>): string | null {
  return kinds.find(([name]) => parts.has(name))?.[1] ?? null
}

const kinds = [
  ['word/document.xml', 'a Word document'],
  ['ppt/presentation.xml', 'a presentation'],
  ['xl/workbook.xml', 'an Excel workbook'],
  ['xl/workbook.bin', 'a binary Excel workbook'],
  ['content.xml', 'an OpenDocument file'],
] as const
