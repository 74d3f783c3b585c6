import { read, SSF, type CellObject, type WorkSheet } from '@e965/xlsx'
import type { ReadCell, ReadSheet, ReadTable } from '@/lib/checks/types'
import { refuse } from '@/lib/rules/refusal'
import { remarkOnHidden } from './hidden'
import { maxCells, maxColumns, maxRows, tooManyRows } from './limits'

/**
 * Reads the sheets of a workbook: values and how they are shown; formulas count by their last result. What is hidden
 * is read with the rest, and said.
 */
export function readWorkbook(bytes: Buffer, firstRows?: number): Pick<ReadTable, 'sheets' | 'remarks'> {
  const book = open(bytes, firstRows ?? maxRows + 1)
  let cells = 0
  const sheets = book.SheetNames.map((name) => {
    const rows = readSheet(book.Sheets[name])
    cells += rows.reduce((sum, row) => sum + row.length, 0)
    if (cells > maxCells) throw refuse('too-large', tooManyRows)
    return withMerges({ name, rows }, book.Sheets[name])
  })
  const remarks = sheets.flatMap((sheet, i) =>
    remarkOnHidden(
      sheet,
      book.Sheets[book.SheetNames[i] ?? ''],
      (book.Workbook?.Sheets?.[i]?.Hidden ?? 0) > 0,
    ),
  )
  return remarks.length > 0 ? { sheets, remarks } : { sheets }
}

/** Merges of the cells that were read; a sheet may declare them over columns that nobody sees. */
function withMerges(sheet: ReadSheet, from: WorkSheet | undefined): ReadSheet {
  const merges = (from?.['!merges'] ?? []).filter(
    ({ s, e }) => s.r < sheet.rows.length && s.c < maxColumns && (e.r > s.r || e.c > s.c),
  )
  if (merges.length === 0) return sheet
  return {
    ...sheet,
    merges: merges.map(({ s, e }) => [
      s.r,
      s.c,
      Math.min(e.r, sheet.rows.length) - s.r + 1,
      Math.min(e.c, maxColumns) - s.c + 1,
    ]),
  }
}

function open(bytes: Buffer, sheetRows: number) {
  try {
    return read(bytes, {
      type: 'buffer',
      dense: true,
      cellFormula: false,
      cellHTML: false,
      cellNF: true,
      cellDates: false,
      // tells which rows and columns are hidden
      cellStyles: true,
      sheetRows,
    })
  } catch (cause) {
    throw Object.assign(refuse('unreadable', damaged), { cause })
  }
}

/** Only cells that are there are walked: the range that a sheet declares may be the whole grid. */
function readSheet(sheet: WorkSheet | undefined): ReadCell[][] {
  const data: unknown = sheet?.['!data']
  if (!Array.isArray(data)) return []
  if (data.length > maxRows) throw refuse('too-large', tooManyRows)
  const rows = Array.from(data, (row: unknown) =>
    Array.isArray(row) ? Array.from(row.slice(0, maxColumns), toCell) : [],
  )
  const last = rows.findLastIndex((row) => row.some((cell) => cell.text !== ''))
  return rows.slice(0, last + 1)
}

function toCell(cell: CellObject | undefined): ReadCell {
  if (!cell || cell.v === undefined || cell.v === null) return { text: '', value: null }
  if (cell.t !== 'n' || typeof cell.v !== 'number') return { text: shown(cell), value: null }
  if (isDate(cell)) return { text: shown(cell), value: null, date: true }
  const text = isGeneral(cell) || isRoundedAway(cell) ? shortest(cell.v) : shown(cell)
  return { text, value: cell.v }
}

/** '0.000' or '0%' over a number that is not zero: its format hides all of it. */
function isRoundedAway(cell: CellObject): boolean {
  return cell.v !== 0 && /^-?0(?:[.,]0*)?\s?%?$/.test(shown(cell))
}

function shown(cell: CellObject): string {
  return (cell.w ?? String(cell.v)).trim()
}

function isDate(cell: CellObject): boolean {
  return cell.z !== undefined && SSF.is_date(String(cell.z))
}

function isGeneral(cell: CellObject): boolean {
  return cell.z === undefined || cell.z === 0 || cell.z === 'General'
}

/** A number without format, to the fifteen digits that a spreadsheet keeps: 0.03, not 0.030000000000000002. */
function shortest(value: number): string {
  return String(Number(value.toPrecision(15)))
}

const damaged =
  'The spreadsheet is damaged or protected; please save it again as XLSX or CSV and hand that in.'
