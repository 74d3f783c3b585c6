import type { ReadCell, ReadTable } from '../types'
import { isMark, readCall, readNumber, readP } from './cell'
import { readGrid, type GridRow, type Part } from './grid'
import { roleIsKnown } from './head'

type Block = { title: string; headers: string[]; rows: GridRow[]; notes: string }

/** Reports and statistics of a results table handed in beside the manuscript, sheet by sheet, table by table. */
export function readResultsTable(table: ReadTable, alpha: number): Part {
  const parts = table.sheets.flatMap((sheet, s) =>
    splitTables(sheet.rows).map((block, b) =>
      readGrid({
        key: `sheet${s}-${b}`,
        source: 'results-table',
        page: null,
        sheet: sheet.name,
        table: s,
        caption: block.title || (table.sheets.length > 1 ? (sheet.name ?? '') : ''),
        notes: block.notes,
        headers: block.headers,
        rows: block.rows,
        offset: 0,
        section: 'results',
        alpha,
      }),
    ),
  )
  return {
    reports: parts.flatMap(({ reports }) => reports),
    statistics: parts.flatMap(({ statistics }) => statistics),
  }
}

/**
 * The tables of one sheet. A line of heads begins one (two or more words, no number, at least one known head); a
 * line with a single text above it is its title, below it a note. Blank lines alone end nothing: rows after them
 * belong to the table above. Data rows are numbered from 1 within the sheet.
 */
export function splitTables(rows: readonly ReadCell[][]): Block[] {
  const blocks: Block[] = []
  let pending: string[] = []
  let number = 0
  let current: Block | undefined
  for (const row of rows) {
    const cells = row.map(({ text }) => text.trim())
    const filled = cells.filter((cell) => cell !== '')
    const [only] = filled
    if (filled.length === 0) continue
    if (isHead(cells)) {
      current = { title: pending.join(' '), headers: cells, rows: [], notes: '' }
      pending = []
      blocks.push(current)
    } else if (filled.length === 1 && only !== undefined && !holdsData(only)) {
      pending.push(only)
      // an asterisk legend or a note below the rows
      if (current && current.rows.length > 0 && /[*†‡]|^note|p\s?[<=]|adjust|correct/i.test(only))
        current.notes += ` ${only}`
    } else {
      number += 1
      if (!current) {
        current = { title: pending.join(' '), headers: cells.map(() => ''), rows: [], notes: '' }
        blocks.push(current)
      } else if (pending.length > 0 && !/[*†‡]|^note/i.test(pending.join(' '))) {
        // a title without a new line of heads: rows of another outcome under the same heads
        current.rows.push({ cells: [pending.join(' ')], boxes: [], number: null, index: current.rows.length })
      }
      pending = []
      current.rows.push({ cells, boxes: cells.map(() => []), number, index: current.rows.length })
    }
  }
  return blocks
}

function isHead(cells: readonly string[]): boolean {
  const filled = cells.filter((cell) => cell !== '')
  return filled.length >= 2 && !filled.some(holdsNumber) && filled.some(roleIsKnown)
}

/** A head may say 'significant' or 'Sig.', but holds no number and no mark. */
const holdsNumber = (cell: string): boolean =>
  readNumber(cell) !== null || readP(cell) !== null || isMark(cell)

/** Numbers, p-values, marks and calls are data. */
function holdsData(cell: string): boolean {
  return (
    readNumber(cell) !== null ||
    readP(cell) !== null ||
    isMark(cell) ||
    (readCall(cell) !== null && cell.length > 1)
  )
}
