import type { PdfCell } from '../types'
import { captionNumber, isFigureCaption, textOf } from './captions'
import { findColumns, type Column } from './table-columns'
import { median, type Lane, type Row } from './rows'
import { fillCells, isNumeric } from './table-cells'

/** A table found in a lane: its rows as drawn, and what belongs to it. */
export type FoundTable = {
  rows: Row[]
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
  const kinds = rows.map((row) => isTabular(row, lane))
  const pitch = median(rows.slice(1).map((row, i) => (rows[i]?.v ?? 0) - row.v)) || 12
  const tables: FoundTable[] = []
  let at = 0
  let free = 0
  while (at < rows.length) {
    if (!kinds[at]) {
      at++
      continue
    }
    const end = growDown(rows, kinds, at, lane, pitch)
    const table = buildTable(rows, at, end, free, lane, bodySize, pitch)
    if (table) {
      tables.push(table.found)
      at = table.next
      free = at
    } else at = end
  }
  return tables
}

/** Two or more pieces apart from each other, none of which is a line of prose. */
function isTabular(row: Row, lane: Lane): boolean {
  if (row.segments.length < 2) return false
  const width = lane.right - lane.left
  return row.segments.every((s) => s.words.length <= 9 || s.u1 - s.u0 < 0.45 * width)
}

/** Index after the last row of the run of tabular rows that starts at `from`, short single pieces bridged. */
function growDown(
  rows: readonly Row[],
  kinds: readonly boolean[],
  from: number,
  lane: Lane,
  pitch: number,
): number {
  let end = from + 1
  let bridged = 0
  for (let at = from + 1; at < rows.length; at++) {
    const row = rows[at]
    const before = rows[at - 1]
    if (!row || !before) break
    if (before.v - row.v > Math.max(3.2 * row.size, 2.2 * pitch)) break
    const text = textOf(row)
    if (captionNumber(text) !== null || isFigureCaption(text)) break
    if (kinds[at]) {
      end = at + 1
      bridged = 0
      continue
    }
    bridged++
    if (bridged > 2 || isProseLike(row, lane)) break
  }
  return end
}

function isProseLike(row: Row, lane: Lane): boolean {
  return row.segments.some((s) => s.u1 - s.u0 > 0.6 * (lane.right - lane.left) && s.words.length > 6)
}

function buildTable(
  rows: readonly Row[],
  from: number,
  end: number,
  free: number,
  lane: Lane,
  bodySize: number,
  pitch: number,
): { found: FoundTable; next: number } | null {
  const own = rows.slice(from, end)
  const above = findCaptionAbove(rows, from, free)
  const start = above ? above.end : from
  const all = above ? rows.slice(start, end) : own
  const columns = findColumns(all)
  if (columns.length < 2) return null
  const { header, body } = fillCells(all, columns)
  const numeric = body.flat().filter((cell) => isNumeric(cell.text)).length
  const filled = body.flat().filter((cell) => cell.text !== '').length
  const below = above ? null : findCaptionBelow(rows, end, pitch)
  const captioned = above !== null || below !== null
  if (body.length < (captioned ? 1 : 2)) return null
  if (!captioned && (numeric < 0.4 * filled || numeric < 4)) return null
  const afterCaption = below ? below.end : end
  const notesEnd = findNotes(rows, afterCaption, bodySize, lane, all)
  return {
    found: {
      rows: all,
      caption: above ? rows.slice(above.from, above.end) : below ? rows.slice(end, below.end) : [],
      notes: rows.slice(afterCaption, notesEnd),
      number: above?.number ?? below?.number ?? null,
      columns,
      header,
      body,
    },
    next: notesEnd,
  }
}

type CaptionSpan = { from: number; end: number; number: string }

function findCaptionAbove(rows: readonly Row[], from: number, free: number): CaptionSpan | null {
  for (let at = from - 1; at >= Math.max(free, from - 8); at--) {
    const row = rows[at]
    const next = rows[at + 1]
    if (!row || !next || row.v - next.v > 4.5 * row.size) return null
    const number = captionNumber(textOf(row))
    if (number === null) continue
    return { from: at, end: endOfCaption(rows, at, from), number }
  }
  return null
}

/** A caption runs on while its lines are as close as lines are; what follows it, up to the table, is header. */
function endOfCaption(rows: readonly Row[], at: number, from: number): number {
  let end = at + 1
  while (end < from) {
    const row = rows[end]
    const before = rows[end - 1]
    if (!row || !before) break
    if (before.v - row.v > 1.45 * before.size || Math.abs(row.size - before.size) > 0.7) {
      const bare =
        end === at + 1 &&
        captionNumber(textOf(before)) !== null &&
        !/\p{L}{3,}.*\p{L}{3,}/u.test(textOf(before))
      if (!bare) break
    }
    end++
  }
  return end
}

function findCaptionBelow(rows: readonly Row[], end: number, pitch: number): CaptionSpan | null {
  const row = rows[end]
  const before = rows[end - 1]
  if (!row || !before || before.v - row.v > 3 * pitch) return null
  const number = captionNumber(textOf(row))
  if (number === null) return null
  let last = end + 1
  while (last < rows.length) {
    const next = rows[last]
    const prior = rows[last - 1]
    if (!next || !prior || prior.v - next.v > 1.4 * prior.size || Math.abs(next.size - prior.size) > 0.5)
      break
    last++
  }
  return { from: end, end: last, number }
}

// "Note.", "Notes:", "* p < .05", "a Different from …", "Values are means …", "Signif. codes"
const noteStart =
  /^(?:notes?\b|[*†‡§#]|\^?[a-e]\b[ ,]|abbreviations?\b|values (?:are|with)\b|data are\b|means? (?:with|followed)\b|signif)/i

function findNotes(
  rows: readonly Row[],
  from: number,
  bodySize: number,
  lane: Lane,
  table: readonly Row[],
): number {
  let end = from
  const size = median(table.map((row) => row.size))
  while (end < rows.length && end < from + 12) {
    const row = rows[end]
    const before = rows[end - 1] ?? table.at(-1)
    if (!row || !before) break
    const text = textOf(row)
    const near = before.v - row.v < 2.2 * Math.max(row.size, size)
    if (!near || captionNumber(text) !== null || isFigureCaption(text)) break
    const small = row.size < 0.95 * bodySize
    const first = end === from
    const continues = !first && before.v - row.v < 1.45 * row.size && Math.abs(row.size - before.size) < 0.4
    if (!(noteStart.test(text) || small || continues)) break
    if (isHeadingLike(row, bodySize)) break
    end++
  }
  return end
}

function isHeadingLike(row: Row, bodySize: number): boolean {
  return row.size > 1.12 * bodySize
}
