import { utils, write, type WorkBook, type WorkSheet } from '@e965/xlsx'

/** A real XLSX workbook of one sheet from rows; `change` may set formats and formulas on its cells. */
export function makeWorkbook(
  rows: unknown[][],
  change: (sheet: WorkSheet, book: WorkBook) => void = () => undefined,
): Buffer {
  const sheet = utils.aoa_to_sheet(rows)
  const book = utils.book_new()
  utils.book_append_sheet(book, sheet, 'results')
  change(sheet, book)
  return write(book, { type: 'buffer', bookType: 'xlsx', compression: true }) as Buffer
}
