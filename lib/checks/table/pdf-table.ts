import type { LaidOut, PdfTable, SectionKind } from '../types'
import { readGrid, type Grid, type GridRow, type Part } from './grid'
import { readInCells } from './in-cells'
import { readCorrelations } from './correlations'

/** Reports and statistics of every table found on the pages. */
export function readPdfTables(laidOut: LaidOut, alpha: number): Part {
  const parts = laidOut.tables.map((table, i) => {
    const grid = toGrid(laidOut, table, i, alpha)
    const matrix = readCorrelations(grid)
    if (matrix) return matrix
    const read = readGrid(grid)
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

function toGrid(laidOut: LaidOut, table: PdfTable, index: number, alpha: number): Grid {
  const rows: GridRow[] = table.rows.map((cells, r) => ({
    cells: cells.map(({ text }) => text),
    boxes: cells.map(({ boxes }) => boxes),
    number: null,
    index: r,
  }))
  return {
    key: `table${index}`,
    source: 'pdf-table',
    page: table.page,
    sheet: null,
    table: index,
    caption: table.caption,
    notes: table.notes,
    headers: Array.from({ length: table.columns }, (_, c) =>
      table.header
        .map((row) => row[c]?.text.trim() ?? '')
        .filter((text) => text !== '')
        .join(' | '),
    ),
    rows,
    offset: table.offset,
    section: sectionAt(laidOut, table.offset),
    alpha,
  }
}

/** The section in which the table stands; a table that stands nowhere belongs to the results. */
function sectionAt({ prose }: LaidOut, offset: number): SectionKind {
  const section = prose.sections.findLast(({ start }) => start <= offset)
  return section && section.kind !== 'references' && section.kind !== 'title' ? section.kind : 'results'
}
