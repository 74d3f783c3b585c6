import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { basename } from 'node:path'
import { parse } from 'csv-parse/sync'
import { read, utils, type WorkSheet } from '@e965/xlsx'
import type { ReadCell, ReadTable } from '@/lib/checks/types'
import { refuse } from '@/lib/rules/refusal'

const maxRows = 200_000
const maxColumns = 500

/** Reads CSV, TSV or XLSX by its content. Rejects with a refusal `unreadable` or `too-large`. */
export async function readTableFile(path: string, name = basename(path)): Promise<ReadTable> {
  const bytes = await readFile(path)
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const zipped = bytes[0] === 0x50 && bytes[1] === 0x4b
  return {
    file: name,
    sha256,
    sheets: zipped ? readWorkbook(bytes) : [{ name: null, rows: readDelimited(bytes) }],
  }
}

function readWorkbook(bytes: Buffer): ReadTable['sheets'] {
  const book = (() => {
    try {
      return read(bytes, { type: 'buffer', cellFormula: false, cellHTML: false, sheetRows: maxRows + 1 })
    } catch (cause) {
      throw Object.assign(refuse('unreadable', troubles.workbook), { cause })
    }
  })()
  return book.SheetNames.map((name) => {
    const sheet = book.Sheets[name]
    return { name, rows: sheet ? readSheet(sheet) : [] }
  })
}

function readSheet(sheet: WorkSheet): ReadCell[][] {
  if (!sheet['!ref']) return []
  const range = utils.decode_range(sheet['!ref'])
  const rows = Math.min(range.e.r, maxRows) + 1
  const columns = Math.min(range.e.c, maxColumns) + 1
  if (range.e.r >= maxRows) throw refuse('too-large', troubles.rows)
  return Array.from({ length: rows }, (_, r) =>
    Array.from({ length: columns }, (_, c) => {
      const cell: unknown = sheet[utils.encode_cell({ r, c })]
      return toCell(cell)
    }),
  )
}

function toCell(cell: unknown): ReadCell {
  if (typeof cell !== 'object' || cell === null) return { text: '', value: null }
  const { v, w } = cell as { v?: unknown; w?: unknown }
  const text = typeof w === 'string' ? w : v === undefined || v === null ? '' : String(v)
  return { text: text.trim(), value: typeof v === 'number' ? v : null }
}

function readDelimited(bytes: Buffer): ReadCell[][] {
  const text = decode(bytes)
  const delimiter = guessDelimiter(text)
  try {
    const rows: unknown = parse(text, {
      delimiter,
      relax_column_count: true,
      relax_quotes: true,
      skip_empty_lines: false,
      trim: true,
      bom: true,
      to: maxRows + 1,
    })
    const table = rows as string[][]
    if (table.length > maxRows) throw refuse('too-large', troubles.rows)
    return table.map((row) => row.slice(0, maxColumns).map((cell) => ({ text: cell, value: null })))
  } catch (cause) {
    if (cause instanceof Error && 'refusal' in cause) throw cause
    throw Object.assign(refuse('unreadable', troubles.delimited), { cause })
  }
}

/** UTF-16 by its mark, UTF-8 where it is valid, else the Western code page of older spreadsheets. */
function decode(bytes: Buffer): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes)
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes)
  if (bytes.includes(0)) throw refuse('unreadable', troubles.delimited)
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return new TextDecoder('windows-1252').decode(bytes)
  }
}

/** The delimiter that splits the first lines into the most, and the same number of, cells. */
function guessDelimiter(text: string): string {
  const lines = text.split(/\r?\n|\r/, 30).filter((line) => line.trim() !== '')
  const scores = [',', ';', '\t', '|'].map((delimiter) => {
    const counts = lines.map((line) => line.split(delimiter).length - 1)
    const most = Math.max(0, ...counts)
    return {
      delimiter,
      score: most === 0 ? 0 : counts.filter((count) => count === most).length * 1000 + most,
    }
  })
  return scores.reduce((best, next) => (next.score > best.score ? next : best)).delimiter
}

const troubles = {
  workbook: 'The spreadsheet is damaged or protected; please save it again as XLSX or CSV and hand that in.',
  delimited: 'The results table is not CSV, TSV or XLSX; please export it as one of these and hand that in.',
  rows: `The results table has more than ${maxRows.toLocaleString('en')} rows; please hand in only the rows of reported tests.`,
}
