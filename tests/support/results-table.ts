import type { ReadCell, ReadTable } from '@/lib/checks/types'

/** A cell as a spreadsheet gives it: text as shown, and the stored number where it is one. */
export type CellInput = string | { text: string; value: number }

/** A results table from rows of one sheet, or of several named ones. */
export function makeResultsTable(sheets: CellInput[][] | Record<string, CellInput[][]>): ReadTable {
  const named: [string | null, CellInput[][]][] = Array.isArray(sheets)
    ? [[null, sheets]]
    : Object.entries(sheets)
  return {
    file: 'results.csv',
    sha256: '0'.repeat(64),
    sheets: named.map(([name, rows]) => ({ name, rows: rows.map((row) => row.map(toCell)) })),
  }
}

function toCell(cell: CellInput): ReadCell {
  return typeof cell === 'string' ? { text: cell, value: null } : cell
}

/** Rows from lines with '|' between cells. */
export const rowsOf = (lines: string): string[][] =>
  lines
    .trim()
    .split('\n')
    .map((line) => line.split('|').map((cell) => cell.trim()))
