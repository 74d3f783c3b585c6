import { utils, write } from '@e965/xlsx'
import type { Story } from './stories'

/** The results table as bytes: CSV (its first sheet) or XLSX, by the ending of the file's name. */
export function writeResults(results: NonNullable<Story['results']>): Buffer {
  const [first] = results.sheets
  if (results.file.endsWith('.csv'))
    return Buffer.from(utils.sheet_to_csv(utils.aoa_to_sheet(first?.rows ?? [])))
  const book = utils.book_new()
  for (const sheet of results.sheets)
    utils.book_append_sheet(book, utils.aoa_to_sheet(sheet.rows), sheet.name)
  const bytes: unknown = write(book, { type: 'buffer', bookType: 'xlsx' })
  return bytes as Buffer
}
