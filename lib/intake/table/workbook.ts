import { read, SSF, type CellObject, type WorkSheet } from '@e965/xlsx'
import type { ReadCell, ReadTable } from '@/lib/checks/types'
import { refuse } from '@/lib/rules/refusal'
import { maxCells, maxColumns, maxRows, tooManyRows } from './limits'

/** Reads the sheets of a workbook: values and how they are shown; formulas count by their last result. */
export function readWorkbook(bytes: Buffer): ReadTable['sheets'] {
  const book = open(bytes)
  let cells = 0
  return book.SheetNames.map((name) => {
    const rows = readSheet(book.Sheets[name])
    cells += rows.reduce((sum, row) => sum + row.length, 0)
    if (cells > maxCells) throw refuse('too-large', tooManyRows)
    return { name, rows }
  })
}

function open(bytes: Buffer) {
  try {
    return read(bytes, {
      type: 'buffer',
      dense: true,
      cellFormula: false,
      cellHTML: false,
      cellNF: true,
      cellDates: false,
      sheetRows: maxRows + 1,
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
  if (isDate(cell)) return { text: shown(cell), value: null }
  return { text: isGeneral(cell) ? shortest(cell.v) : shown(cell), value: cell.v }
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
