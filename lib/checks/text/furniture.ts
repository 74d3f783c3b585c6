import { captionNumber, textOf } from './captions'
import { findLineNumbers } from './line-numbers'
import { toRow, type Row } from './rows'
import { findSegments } from './segments'
import type { Frame, Word } from './words'

// "7", "- 7 -", "Page 7 of 12", "7/12", "e118", "xii"
const pageNumber = /^\W*(?:page\s*)?(?:[a-z]?\d{1,5}|[ivx]{1,5})(?:\s*(?:of|\/)\s*\d{1,4})?\W*$/i

/**
 * Removes what does not belong to the text from every page: line numbers, running heads and feet (rows near
 * the edge that return on other pages) and page numbers. Works on the main frame of each page.
 */
export function dropFurniture(frames: readonly Frame[]): Frame[] {
  const numbers = findLineNumbers(frames)
  const cleaned = frames.map((frame) => ({
    ...frame,
    words: frame.words.filter((word) => !numbers.has(word)),
  }))
  const edges = cleaned.map((frame) => ({ frame, rows: findEdgeRows(frame) }))
  const counts = new Map<string, Set<number>>()
  for (const { frame, rows } of edges)
    for (const { key } of rows) {
      const pages = counts.get(key) ?? new Set()
      counts.set(key, pages.add(frame.page.number))
    }
  return edges.map(({ frame, rows }) => {
    const dropped = new Set<Word>()
    for (const { row, key, outermost, inTable } of rows) {
      const text = textOf(row)
      const returns =
        (counts.get(key)?.size ?? 0) >= 2 &&
        captionNumber(text) === null &&
        !/^\(?continued/i.test(text) &&
        !inTable
      if (returns || (outermost && pageNumber.test(text)))
        for (const segment of row.segments) for (const word of segment.words) dropped.add(word)
    }
    return dropped.size > 0 ? { ...frame, words: frame.words.filter((word) => !dropped.has(word)) } : frame
  })
}

type EdgeRow = {
  row: Row
  key: string
  outermost: boolean
  /** Rows of a table that fills pages look alike at the same place of each. */
  inTable: boolean
}

/** Rows in the top and bottom strips, with a key that is equal for the same head on another page. */
function findEdgeRows(frame: Frame): EdgeRow[] {
  const height = frame.top - frame.bottom
  const within = (v: number, strip: number) =>
    v > frame.top - strip * height || v < frame.bottom + strip * height
  // a little more than the strip, so that its last row has a neighbour
  const rows = groupRows(frame.words.filter((word) => within(word.v, 0.17)))
  return rows.flatMap((row, index) => {
    if (!within(row.v, 0.13)) return []
    const folded = textOf(row).toLowerCase().replace(/\d+/g, '#').replace(/\s+/g, '')
    const place = Math.round(row.v / 6)
    const upper = row.v > frame.bottom + 0.5 * height
    const outermost = upper ? index === 0 : index === rows.length - 1
    const inTable = isTableRow(row, rows[upper ? index + 1 : index - 1])
    return {
      row,
      inTable,
      outermost,
      key: `${folded}|${upper ? 'top' : 'foot'}|${folded.length < 4 ? place : ''}`,
    }
  })
}

/** Three pieces or more, with a row of as many pieces close to it, further in on the page. */
function isTableRow(row: Row, inward: Row | undefined): boolean {
  if (!inward || row.segments.length < 3 || inward.segments.length < 3) return false
  return Math.abs(row.v - inward.v) < 2.2 * Math.max(row.size, inward.size)
}

function groupRows(words: readonly Word[]): Row[] {
  const rows: Row[] = []
  for (const segment of findSegments(words)) {
    const last = rows.at(-1)
    if (last && Math.abs(last.v - segment.v) < 0.35 * segment.size)
      rows[rows.length - 1] = toRow([...last.segments, segment])
    else rows.push(toRow([segment]))
  }
  return rows
}
