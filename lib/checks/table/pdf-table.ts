import { readCommand } from '../extract/grammar/console'
import type { LaidOut, PdfTable, SectionKind } from '../types'
import { readP } from './cell'
import { readCorrelations } from './correlations'
import { readGrid, type Grid, type GridRow, type Part } from './grid'
import { isHeadLine } from './head'
import { readInCells } from './in-cells'

/** Reports and statistics of every table found on the pages. `controls`: groups that the text compares all others with. */
export function readPdfTables(laidOut: LaidOut, alpha: number, controls: readonly Control[] = []): Part {
  const parts = toGrids(laidOut, alpha).map((grid) => {
    const matrix = readCorrelations(grid)
    if (matrix) return matrix
    const read = readGrid(grid, controls)
    const inCells = readInCells(grid, read)
    return {
      reports: [...read.reports, ...inCells.reports],
      statistics: [...read.statistics, ...inCells.statistics],
    }
  })
  return {
    reports: parts.flatMap(({ reports }) => reports),
    statistics: parts.flatMap(({ statistics }) => statistics),
  }
}

/** A control named in the text, with the sentence that names it. */
export type Control = { name: string; sentence: string }

/**
 * The grids of all tables. A line of heads within a table begins a grid of its own; a table without caption that
 * has the heads or the width of the one before it, on the same or the next page, goes on with that one.
 */
function toGrids(laidOut: LaidOut, alpha: number): Grid[] {
  const grids: Grid[] = []
  laidOut.tables.forEach((table, i) => {
    const previous = grids[grids.length - 1]
    const printedBy = table.caption.trim() === '' ? findCommand(laidOut, table) : null
    for (const [k, { headers, rows }] of cutAtHeads(table).entries()) {
      const last = k === 0 ? previous : undefined
      const goesOn =
        last !== undefined &&
        printedBy === null &&
        table.caption.trim() === '' &&
        last.page !== null &&
        table.page - last.page <= 1 &&
        headers.length === last.headers.length &&
        (headers.every((head) => head === '') || headers.join('|') === last.headers.join('|'))
      grids.push({
        key: `table${i}-${k}`,
        source: 'pdf-table',
        page: table.page,
        sheet: null,
        table: i,
        caption: goesOn ? last.caption : table.caption,
        notes: goesOn ? `${last.notes} ${table.notes}`.trim() : table.notes,
        headers: goesOn ? last.headers : headOutput(headers, rows, printedBy),
        rows,
        offset: table.offset,
        section: sectionAt(laidOut, table.offset),
        alpha,
      })
    }
  })
  return grids
}

/** The command typed at a prompt right above a table that is its output, where it gives p-values. */
function findCommand({ prose }: LaidOut, { offset }: PdfTable): ReturnType<typeof readCommand> {
  const before = prose.text.slice(0, offset).replace(/\n+$/, '')
  return readCommand(before.slice(before.lastIndexOf('\n\n') + 1))
}

/** A matrix that a command printed has outcomes as heads: each column of numbers holds p-values. */
function headOutput(
  headers: readonly string[],
  rows: readonly GridRow[],
  printedBy: ReturnType<typeof readCommand>,
): string[] {
  if (!printedBy) return [...headers]
  const head = printedBy.scale === 'adjusted' ? 'p adj' : 'p'
  return headers.map((text, c) =>
    rows.every(({ cells }) => c > 0 && readP(cells[c] ?? '') !== null) ? `${text} | ${head}` : text,
  )
}

type Cut = { headers: string[]; rows: GridRow[] }

function cutAtHeads(table: PdfTable): Cut[] {
  const joined = Array.from({ length: table.columns }, (_, c) =>
    table.header
      .map((row) => row[c]?.text.trim() ?? '')
      .filter((text) => text !== '')
      .join(' | '),
  )
  const parts: Cut[] = [{ headers: joined, rows: [] }]
  table.rows.forEach((cells, r) => {
    const texts = cells.map(({ text }) => text)
    if (isHeadLine(texts)) parts.push({ headers: texts, rows: [] })
    else
      parts[parts.length - 1]?.rows.push({
        cells: texts,
        boxes: cells.map(({ boxes }) => boxes),
        number: null,
        index: r,
      })
  })
  return parts.filter(({ rows }) => rows.length > 0).map(partColumns)
}

/** '4391', '-2', '0.12', '1.2e-04' */
const LONE_NUMBER = /^[-−+]?\d*\.?\d+(?:[eE][-+]?\d+)?$/

/**
 * Columns that stand a blank apart, 'Res.Df Df Chisq' over '4391 -2 4.1213', are parted where the fullest cell has as
 * many numbers as the head has words; a cell with fewer keeps them from the left.
 */
function partColumns({ headers, rows }: Cut): Cut {
  const widths = headers.map((head, c) => {
    const words = head.split(/\s+/)
    const cells = rows.map(({ cells: texts }) => (texts[c] ?? '').trim()).filter((text) => text !== '')
    const numbers = cells.map((text) => text.split(/\s+/))
    const all = numbers.every((tokens) => tokens.every((token) => LONE_NUMBER.test(token)))
    const most = Math.max(0, ...numbers.map((tokens) => tokens.length))
    return head !== '' && !head.includes('|') && all && most >= 2 && words.length === most ? most : 1
  })
  if (widths.every((width) => width === 1)) return { headers, rows }
  const spread = (texts: readonly string[]) =>
    texts.flatMap((text, c) => {
      const width = widths[c] ?? 1
      if (width === 1) return [text]
      const tokens = text.trim() === '' ? [] : text.trim().split(/\s+/)
      return Array.from({ length: width }, (_, i) => tokens[i] ?? '')
    })
  return {
    headers: spread(headers),
    rows: rows.map((row) => ({
      ...row,
      cells: spread(row.cells),
      boxes: row.boxes.flatMap((boxes, c) => new Array<typeof boxes>(widths[c] ?? 1).fill(boxes)),
    })),
  }
}

/** The section in which the table stands; a table that stands nowhere belongs to the results. */
function sectionAt({ prose }: LaidOut, offset: number): SectionKind {
  const section = prose.sections.findLast(({ start }) => start <= offset)
  return section && section.kind !== 'references' && section.kind !== 'title' ? section.kind : 'results'
}
