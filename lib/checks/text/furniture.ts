import { captionNumber, textOf } from './captions'
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
    for (const { row, key, outermost } of rows) {
      const text = textOf(row)
      const returns =
        (counts.get(key)?.size ?? 0) >= 2 && captionNumber(text) === null && !/^\(?continued/i.test(text)
      if (returns || (outermost && pageNumber.test(text)))
        for (const segment of row.segments) for (const word of segment.words) dropped.add(word)
    }
    return dropped.size > 0 ? { ...frame, words: frame.words.filter((word) => !dropped.has(word)) } : frame
  })
}

type EdgeRow = { row: Row; key: string; outermost: boolean }

/** Rows in the top and bottom strips, with a key that is equal for the same head on another page. */
function findEdgeRows(frame: Frame): EdgeRow[] {
  const height = frame.top - frame.bottom
  const near = frame.words.filter(
    (w) => w.v > frame.top - 0.13 * height || w.v < frame.bottom + 0.13 * height,
  )
  const rows = groupRows(near)
  return rows.map((row, index) => {
    const folded = textOf(row).toLowerCase().replace(/\d+/g, '#').replace(/\s+/g, '')
    const place = Math.round(row.v / 6)
    const upper = row.v > frame.bottom + 0.5 * height
    const outermost = upper ? index === 0 : index === rows.length - 1
    return { row, key: `${folded}|${upper ? 'top' : 'foot'}|${folded.length < 4 ? place : ''}`, outermost }
  })
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

// line numbers: "7", "214"
const lineNumber = /^\d{1,5}$/

/**
 * Line numbers: numbers at one abscissa outside the text, rising by a constant step down the page, on most
 * pages of the document and beside most of their lines.
 */
function findLineNumbers(frames: readonly Frame[]): Set<Word> {
  const found = frames.map(findNumberColumn)
  const pages = found.filter((column) => column.length > 0).length
  const full = frames.filter((frame) => frame.words.length > 80).length
  if (pages === 0 || pages < 0.6 * full) return new Set()
  return new Set(found.flat())
}

function findNumberColumn(frame: Frame): Word[] {
  const candidates = frame.words.filter((word) => lineNumber.test(word.chars) && word.level === 0)
  const groups = new Map<number, Word[]>()
  for (const word of candidates)
    for (const edge of [Math.round(word.u1 / 3), Math.round(word.u0 / 3) + 100_000]) {
      const group = groups.get(edge) ?? []
      groups.set(edge, group)
      group.push(word)
    }
  let best: Word[] = []
  const lines = new Set(frame.words.map((word) => Math.round(word.v))).size
  for (const group of groups.values()) {
    if (group.length < 4 || group.length <= best.length) continue
    const sorted = [...group].sort((a, b) => b.v - a.v)
    const steps = sorted.slice(1).map((word, i) => Number(word.chars) - Number(sorted[i]?.chars))
    const step = steps[0] ?? 0
    const regular = steps.filter((s) => s === step || s === 1).length
    if (step < 1 || regular < 0.85 * steps.length) continue
    if (!isOutside(frame, sorted) || sorted.length * step < 0.4 * lines) continue
    best = sorted
  }
  return best.length > 0 ? extend(frame, best) : best
}

function isOutside(frame: Frame, column: readonly Word[]): boolean {
  const left = Math.min(...column.map((w) => w.u0))
  const right = Math.max(...column.map((w) => w.u1))
  let before = 0
  let after = 0
  for (const word of frame.words) {
    if (word.u1 < left - 1) before++
    if (word.u0 > right + 1) after++
  }
  return before < 0.02 * frame.words.length || after < 0.02 * frame.words.length
}

/** Numbers of another width in the same column (9, 10, 100). */
function extend(frame: Frame, column: readonly Word[]): Word[] {
  const left = Math.min(...column.map((w) => w.u0))
  const right = Math.max(...column.map((w) => w.u1))
  const size = column[0]?.size ?? 0
  return frame.words.filter(
    (w) =>
      lineNumber.test(w.chars) &&
      Math.abs(w.size - size) < 0.6 &&
      (Math.abs(w.u1 - right) < 3 || Math.abs(w.u0 - left) < 3),
  )
}
