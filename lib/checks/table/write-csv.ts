/** A cell of a table that is written out; null is an empty cell. */
export type CsvCell = string | number | boolean | null

/**
 * Rows as CSV (RFC 4180: commas, CRLF, doubled quotes). Text that a spreadsheet would take for a formula is led by an
 * apostrophe; numbers stay numbers.
 */
export function writeCsv(rows: readonly (readonly CsvCell[])[]): string {
  return rows.map((row) => `${row.map(writeCell).join(',')}\r\n`).join('')
}

function writeCell(cell: CsvCell): string {
  if (cell === null) return ''
  if (typeof cell !== 'string') return String(cell)
  const text = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
}
