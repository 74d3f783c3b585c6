import type { PdfCell } from '../types'
import { captionNumber, isCommand, isFigureCaption, textOf } from './captions'
import { cutFinely, isProseLine, median, type Lane, type Row } from './rows'
import { findCaptionAbove, findCaptionBelow, findCaptionWithin, type Reading } from './table-captions'
import { fillCells, isNumeric, isPlainNumber } from './table-cells'
import { cutAtColumns, findColumns, type Column } from './table-columns'
import { findNotes } from './table-notes'

/** A table found in a lane: its rows as drawn, and what belongs to it. */
export type FoundTable = {
  rows: Row[]
  /** The row at which the table stands in the flow: its topmost. */
  anchor: Row
  caption: Row[]
  notes: Row[]
  number: string | null
  columns: Column[]
  header: PdfCell[][]
  body: PdfCell[][]
}

/** Tables of a lane from the top; `bodySize` is the size of the running text. */
export function findTables(lane: Lane, bodySize: number): FoundTable[] {
  const { rows } = lane
  const fine = rows.map(cutFinely)
  const pitch = median(rows.slice(1).map((row, i) => (rows[i]?.v ?? 0) - row.v)) || 12
  const reading: Reading = {
    lane,
    rows,
    fine,
    tabular: fine.map((row) => isTabular(row, lane)),
    pitch,
    bodySize,
  }
  const tables: FoundTable[] = []
  let at = 0
  let free = 0
  while (at < rows.length) {
    if (!reading.tabular[at]) {
      at++
      continue
    }
    const end = growDown(reading, at)
    const found = buildTable(reading, at, end, free)
    if (found) {
      tables.push(...found.tables)
      at = Math.max(found.next, at + 1)
      free = at
    } else at = end
  }
  return tables
}

/** Two or more pieces apart from each other, none of which is a line of prose. */
function isTabular(row: Row, lane: Lane): boolean {
  if (row.segments.length < 2 || isProseLine(row) || isCommand(textOf(row))) return false
  const width = lane.right - lane.left
  return row.segments.every((s) => s.words.length <= 9 || s.u1 - s.u0 < 0.45 * width)
}

/** Index after the last row of the run of tabular rows that starts at `from`, short single pieces bridged. */
function growDown({ lane, rows, tabular, pitch }: Reading, from: number): number {
  let end = from + 1
  let bridged = 0
  for (let at = from + 1; at < rows.length; at++) {
    const row = rows[at]
    const before = rows[at - 1]
    if (!row || !before) break
    if (before.v - row.v > Math.max(3.2 * row.size, 2.2 * pitch)) break
    const text = textOf(row)
    if (captionNumber(text) !== null || isFigureCaption(text) || isCommand(text)) break
    if (tabular[at]) {
      end = at + 1
      bridged = 0
      continue
    }
    bridged++
    const tight = before.v - row.v < 1.6 * row.size
    if (bridged > (tight ? 4 : 2) || isProseLike(row, lane)) break
  }
  return end
}

function isProseLike(row: Row, lane: Lane): boolean {
  return row.segments.some((s) => s.u1 - s.u0 > 0.6 * (lane.right - lane.left) && s.words.length > 6)
}

function buildTable(
  reading: Reading,
  from: number,
  grown: number,
  free: number,
): { tables: FoundTable[]; next: number } | null {
  const { rows, fine, lane, bodySize } = reading
  const above = findCaptionAbove(rows, from, free)
  const start = above ? above.end : from
  const columns = findColumns(fine.slice(start, grown))
  if (columns.length < 2) return null
  const first = above ? start : absorb(reading, columns, from, -1, free)
  const end = absorb(reading, columns, trimEnd(fine, start, grown) - 1, 1, free) + 1
  const blocks = splitStacked(fine.slice(first, end)).map((block) => toBlock(block))
  const cells = blocks.flatMap((block) => block.body.flat()).filter((cell) => cell.text !== '')
  const numeric = cells.filter((cell) => isPlainNumber(cell.text)).length
  const lines = blocks.reduce((sum, block) => sum + block.body.length, 0)
  const below = above ? null : findCaptionBelow(reading, end)
  const captioned = above !== null || below !== null
  if (lines < (captioned ? 1 : 2)) return null
  const wordy = cells.filter((cell) => cell.text.split(' ').length >= 7).length
  if (!captioned && (numeric < 0.4 * cells.length || numeric < 4 || wordy > 0.25 * lines)) return null
  const notesFrom = below ? below.end : end
  const notesEnd = findNotes(rows, notesFrom, bodySize, lane, rows.slice(first, end))
  const late = captioned ? null : findCaptionWithin(reading, end, notesEnd + 1)
  const caption = above ? rows.slice(above.from, above.end) : below ? rows.slice(end, below.end) : []
  const number = above?.number ?? below?.number ?? late?.number ?? null
  let at = first
  const tables = blocks.flatMap(({ size, ...block }, index): FoundTable[] => {
    const own = rows.slice(at, at + size)
    at += size
    const last = index === blocks.length - 1
    const anchor = (index === 0 ? caption[0] : undefined) ?? own[0]
    if (!anchor) return []
    const highest = own[0] && own[0].v > anchor.v ? own[0] : anchor
    return [
      {
        anchor: highest,
        ...block,
        rows: own,
        number,
        caption: late ? rows.slice(late.from, late.end) : caption,
        notes: last ? rows.slice(notesFrom, late ? late.from : notesEnd) : [],
      },
    ]
  })
  return { tables, next: late ? late.end : notesEnd }
}

/** Rows at the foot that break the columns of those above are no rows of the table. */
function trimEnd(fine: readonly Row[], from: number, end: number): number {
  let last = end
  let whole: number | null = null
  for (let cut = 1; cut <= 5 && end - cut - from >= 3; cut++) {
    whole ??= findColumns(fine.slice(from, last)).length
    const without = findColumns(fine.slice(from, end - cut)).length
    if (without <= whole) continue
    last = end - cut
    whole = without
  }
  return last
}

function toBlock(rows: readonly Row[]): {
  size: number
  columns: Column[]
  header: PdfCell[][]
  body: PdfCell[][]
} {
  const columns = findColumns(rows)
  return { size: rows.length, columns, ...fillCells(rows, columns) }
}

/**
 * Takes in neighbouring rows whose words all fall into the columns although no gap between them is wide
 * (console output, tight headers). Returns the index of the outermost row.
 */
function absorb(
  { rows, fine, lane }: Reading,
  columns: readonly Column[],
  from: number,
  step: 1 | -1,
  free: number,
): number {
  let at = from
  if (columns.length < 3) return at
  for (let next = at + step; next >= free && next < rows.length; next += step) {
    const row = fine[next]
    const last = rows[at]
    if (!row || !last || Math.abs(last.v - row.v) > 1.75 * row.size || isProseLine(row)) break
    if (row.u0 < (columns[0]?.from ?? 0) - 0.1 * (lane.right - lane.left)) break
    const pieces = cutAtColumns(row, columns)
    if (pieces === null || pieces < Math.max(2, 0.6 * (columns.length - 1))) break
    if (captionNumber(textOf(row)) !== null || isCommand(textOf(row))) break
    at = next
  }
  return at
}

/**
 * Blocks with columns of their own may stand one below the other, each under a header: they are read apart
 * where that gives clearly more columns than reading them together.
 */
function splitStacked(rows: Row[]): Row[][] {
  const whole = findColumns(rows).length * rows.length
  let best: { at: number; gain: number } | null = null
  for (let at = 2; at + 1 < rows.length; at++) {
    const row = rows[at]
    const before = rows[at - 1]
    if (!row || !before || countNumbers(row) > 0.3 * row.segments.length) continue
    if (!rows.slice(0, at).some(holdsNumbers) || !rows.slice(at + 1, at + 4).some(holdsNumbers)) continue
    const apart =
      findColumns(rows.slice(0, at)).length * at + findColumns(rows.slice(at)).length * (rows.length - at)
    const gain = apart - whole
    if (gain > 0.12 * whole && gain > (best?.gain ?? 0)) best = { at, gain }
  }
  return best ? [...splitStacked(rows.slice(0, best.at)), ...splitStacked(rows.slice(best.at))] : [rows]
}

function holdsNumbers(row: Row): boolean {
  return row.segments.length >= 2 && countNumbers(row) >= 1
}

function countNumbers(row: Row): number {
  return row.segments.filter((segment) => isNumeric(textOf({ ...row, segments: [segment] }))).length
}
