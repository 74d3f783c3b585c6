import type { WordCell, WordTable } from './blocks'
import type { Faces } from './faces'
import { setLines, widthOfLongestWord, type Line } from './set-lines'
import { widths as pageWidths, type Sheet } from './sheet'

const leading = 1.28
/** White space at either side of a cell's text: neighbours must stand clearly apart. */
const padding = 6
const sizes = [9, 8, 7]
/** A table too wide even turned is set smaller and smaller: a number that is broken would be read as two. */
const narrow = [6.5, 6, 5.5, 5, 4.5, 4, 3.5, 3]
/** What sums of widths may be off by. */
const slack = 0.01

type Placed = { lines: Line[]; from: number; span: number }
type SetRow = { cells: Placed[]; height: number }
export type TablePlan = {
  size: number
  landscape: boolean
  edges: number[]
  rows: SetRow[]
  headRows: number
  height: number
}

/** Sets a table in the largest type in which no cell breaks its lines, turning the page before it breaks them. */
export function planTable(table: WordTable, sheet: Sheet): TablePlan {
  const { faces } = sheet
  const grid = placeCells(table)
  const tries = [
    ...sizes.map((size) => ({ size, landscape: false, width: pageWidths.upright })),
    ...sizes.map((size) => ({ size, landscape: true, width: pageWidths.turned })),
  ]
  for (const { size, landscape, width } of tries) {
    const natural = measureColumns(grid, faces, size, (cell) =>
      Math.max(
        0,
        ...cell.paragraphs.flatMap((spans) => setLines(spans, faces, size, Infinity)).map((l) => l.width),
      ),
    )
    if (sum(natural) <= width) return plan(grid, table.headRows, faces, size, landscape, natural)
  }
  const widthOfWords = (size: number) =>
    measureColumns(grid, faces, size, (cell) =>
      Math.max(0, ...cell.paragraphs.map((spans) => widthOfLongestWord(spans, faces, size))),
    )
  const size = narrow.find((one) => sum(widthOfWords(one)) <= pageWidths.turned) ?? 3
  const columns = squeeze(grid, faces, size, widthOfWords(size), pageWidths.turned)
  return plan(grid, table.headRows, faces, size, true, columns)
}

/** Words stay whole where they can; what is left goes to the columns that would be widest. */
function squeeze(grid: Grid, faces: Faces, size: number, least: readonly number[], width: number): number[] {
  const natural = measureColumns(grid, faces, size, (cell) =>
    Math.max(
      0,
      ...cell.paragraphs.flatMap((spans) => setLines(spans, faces, size, Infinity)).map((l) => l.width),
    ),
  )
  if (sum(least) >= width) return least.map((one) => (one * width) / sum(least))
  const wish = natural.map((one, i) => one - (least[i] ?? 0))
  const spare = (width - sum(least)) / Math.max(1, sum(wish))
  return least.map((one, i) => one + spare * (wish[i] ?? 0))
}

type Grid = { columns: number; rows: { cell: WordCell; from: number }[][] }

/** Cells by their columns; one that reaches down over rows keeps the place beneath it free. */
function placeCells(table: WordTable): Grid {
  const taken = new Map<number, number>()
  let columns = 1
  const rows = table.rows.map((row) => {
    let at = 0
    const placed = row.map((cell) => {
      while ((taken.get(at) ?? 0) > 0) at++
      const from = at
      for (let i = 0; i < cell.colSpan; i++) taken.set(at++, cell.rowSpan)
      return { cell, from }
    })
    columns = Math.max(columns, at)
    for (const [column, left] of taken) taken.set(column, left - 1)
    return placed
  })
  return { columns, rows }
}

function measureColumns(
  grid: Grid,
  faces: Faces,
  size: number,
  widthOf: (cell: WordCell) => number,
): number[] {
  const widths = Array.from({ length: grid.columns }, () => 2 * padding + size)
  const wide: { from: number; span: number; width: number }[] = []
  for (const { cell, from } of grid.rows.flat()) {
    const width = widthOf(cell) + 2 * padding
    if (cell.colSpan === 1) widths[from] = Math.max(widths[from] ?? 0, width)
    else wide.push({ from, span: cell.colSpan, width })
  }
  for (const { from, span, width } of wide) {
    const short = width - sum(widths.slice(from, from + span))
    if (short > 0) for (let i = from; i < from + span; i++) widths[i] = (widths[i] ?? 0) + short / span
  }
  return widths
}

function plan(
  grid: Grid,
  headRows: number,
  faces: Faces,
  size: number,
  landscape: boolean,
  widths: number[],
): TablePlan {
  const edges = widths.reduce<number[]>((all, width) => [...all, (all.at(-1) ?? 0) + width], [0])
  const rows = grid.rows.map((row): SetRow => {
    const cells = row.map(({ cell, from }) => {
      const inner = (edges[from + cell.colSpan] ?? 0) - (edges[from] ?? 0) - 2 * padding
      const lines = cell.paragraphs.flatMap((spans) =>
        setLines(spans, faces, size, Math.max(size, inner + slack)),
      )
      return { lines, from, span: cell.colSpan }
    })
    const most = Math.max(1, ...cells.map((cell) => cell.lines.length))
    return { cells, height: most * size * leading + 3 }
  })
  return { size, landscape, edges, rows, headRows, height: sum(rows.map((row) => row.height)) }
}

/** Draws the rows from where the page stands; one that does not fit goes on a new page, below the head again. */
export function drawTable(table: TablePlan, sheet: Sheet): void {
  const head = table.rows.slice(0, table.headRows)
  for (const [index, row] of table.rows.entries()) {
    if (sheet.room() < row.height) {
      sheet.newPage()
      if (index >= table.headRows) for (const one of head) drawRow(one, table, sheet)
    }
    drawRow(row, table, sheet, index < table.headRows)
  }
}

function drawRow(row: SetRow, { size, edges }: TablePlan, sheet: Sheet, head = true): void {
  for (const cell of row.cells) {
    const [x0, x1] = [edges[cell.from] ?? 0, edges[cell.from + cell.span] ?? 0]
    const drop = head ? row.height - 3 - cell.lines.length * size * leading : 0
    cell.lines.forEach((line, i) => {
      // A head over several columns stands over their middle.
      const x = cell.span > 1 ? (x0 + x1 - line.width) / 2 : x0 + padding
      sheet.draw(line, size, x, drop + i * size * leading)
    })
    sheet.rule(x0, 0, x1, 0)
    sheet.rule(x0, row.height, x1, row.height)
    sheet.rule(x0, 0, x0, row.height)
    sheet.rule(x1, 0, x1, row.height)
  }
  sheet.skip(row.height)
}

function sum(values: readonly number[]): number {
  return values.reduce((a, b) => a + b, 0)
}
