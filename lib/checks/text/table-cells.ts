import type { Box, PdfCell } from '../types'
import { normalise } from './normalise'
import type { Row } from './rows'
import { isLabelOnly, mergeWrapped } from './table-lines'
import type { Column } from './table-columns'
import { toPageBox, type Word } from './words'
import { writeLine } from './write-line'

// numbers, with relation, sign, percent, stars or marks: "<0.001", "-2.46", ".03*", "12.9 ± 3", "2e-16 ***", "–"
const numeric = /^[<>≤≥=~≈]?\s*[-+±–]?\s*(?:\d|[.·]\d)|^[–—-]$/

export function isNumeric(text: string): boolean {
  return numeric.test(text.trim())
}

// a number with words to it is a head or a label: "18–25 Years", "0 Day"
export function isPlainNumber(text: string): boolean {
  return isNumeric(text) && !/\p{L}{3,}/u.test(text.replace(/\([^)]*\)/g, ''))
}

/** A row of a table: the words of each column, and those that reach over several. */
export type Line = { cells: Word[][]; row: Row; spans: { from: number; to: number; words: Word[] }[] }

/** Puts every row's words into the columns; rows above the first row of numbers are the header. */
export function fillCells(
  rows: readonly Row[],
  columns: readonly Column[],
): { header: PdfCell[][]; body: PdfCell[][] } {
  const lines = rows.map((row) => toLine(row, columns))
  const first = lines.findIndex((line) => isBody(line))
  const headEnd = first < 0 ? Math.min(1, lines.length) : backOverLabels(lines, first)
  const header = spreadHeads(lines.slice(0, headEnd).map((line) => toCells(line, columns.length, true)))
  const merged = mergeWrapped(lines.slice(headEnd))
  return { header, body: merged.map((line) => toCells(line, columns.length, false)) }
}

function toLine(row: Row, columns: readonly Column[]): Line {
  const cells: Word[][] = columns.map(() => [])
  const spans: Line['spans'] = []
  for (const segment of row.segments) {
    for (const piece of cut(segment.words, columns).flatMap((p) => cutByEdges(p, columns))) {
      const u0 = Math.min(...piece.map((w) => w.u0))
      const u1 = Math.max(...piece.map((w) => w.u1))
      const hit = columns.map((c, i) => ({ i, overlap: Math.min(u1, c.to) - Math.max(u0, c.from) }))
      const over = hit.filter((h) => h.overlap > 1)
      const best = hit.reduce((a, b) => (b.overlap > a.overlap ? b : a))
      if (over.length > 1) spans.push({ from: over[0]?.i ?? 0, to: over.at(-1)?.i ?? 0, words: piece })
      else cells[best.i]?.push(...piece)
    }
  }
  return { cells, row, spans }
}

/** Cuts a piece at the gaps between columns wherever no word stands in the gap. */
function cut(words: readonly Word[], columns: readonly Column[]): Word[][] {
  const columnOf = (word: Word) => {
    const middle = (word.u0 + word.u1) / 2
    let best = 0
    let distance = Infinity
    columns.forEach((c, i) => {
      const d = middle < c.from ? c.from - middle : middle > c.to ? middle - c.to : 0
      if (d < distance) {
        distance = d
        best = i
      }
    })
    return best
  }
  const pieces: Word[][] = []
  let last: Word | null = null
  for (const word of words) {
    const gapWidth: number = last ? word.u0 - last.u1 : Infinity
    const boundary =
      last !== null &&
      columnOf(last) !== columnOf(word) &&
      word.level === 0 &&
      columns.some((c, i) => {
        const next = columns[i + 1]
        return (
          next !== undefined &&
          last !== null &&
          last.u1 <= next.from - 0.5 &&
          word.u0 >= c.to + 0.5 &&
          (gapWidth > 0.48 * word.size || isNumeric(word.chars) || isNumeric(last.chars))
        )
      })
    if (!last || boundary) pieces.push([word])
    else pieces.at(-1)?.push(word)
    last = word
  }
  return pieces
}

/** Labels of groups just above the first row of numbers belong to the body. */
function backOverLabels(lines: readonly Line[], first: number): number {
  let end = first
  for (let at = first - 1; at > 0; at--) {
    const line = lines[at]
    if (!line || !isLabelOnly(line)) break
    end = at
  }
  return end
}

/**
 * A head over several columns whose words end (or begin) where the columns do: "Alzheimer Other dementias"
 * above two columns of numbers set flush right.
 */
function cutByEdges(words: Word[], columns: readonly Column[]): Word[][] {
  const u0 = words[0]?.u0 ?? 0
  const u1 = words.at(-1)?.u1 ?? 0
  const spanned = columns.filter((c) => Math.min(u1, c.to) - Math.max(u0, c.from) > 1)
  if (spanned.length < 2 || words.length < spanned.length) return [words]
  const ends = spanned.map((c) => words.findIndex((word) => Math.abs(word.u1 - c.to) < 0.15 * word.size))
  const begins = spanned.map((c) => words.findIndex((word) => Math.abs(word.u0 - c.from) < 0.15 * word.size))
  const cuts = isRising(ends)
    ? ends.slice(0, -1).map((at) => at + 1)
    : isRising(begins)
      ? begins.slice(1)
      : []
  if (cuts.length === 0) return [words]
  return [0, ...cuts].map((from, i) => words.slice(from, cuts[i] ?? words.length))
}

function isRising(indices: readonly number[]): boolean {
  return indices.every((at, i) => at >= 0 && (i === 0 || at > (indices[i - 1] ?? -1)))
}

function isBody(line: Line): boolean {
  const filled = line.cells
    .map((words, i) => ({ i, text: writeLine(words).text }))
    .filter((c) => c.text !== '')
  const rest = filled.length > 1 ? filled.filter((c) => c.i > 0) : filled
  if (filled.length < 2) return false
  return rest.filter((c) => isPlainNumber(c.text)).length >= 0.5 * rest.length
}

function toCells(line: Line, count: number, header: boolean): PdfCell[] {
  const groups: Word[][] = Array.from({ length: count }, (_, i) => [...(line.cells[i] ?? [])])
  for (const span of line.spans)
    for (let i = span.from; i <= (header ? span.to : span.from); i++) groups[i]?.push(...span.words)
  return groups.map(toCell)
}

/**
 * Heads over groups of columns, where the names below them repeat themselves ('t', 'P', 't', 'P'): each
 * head above stands over its whole group, wherever in the group it was printed.
 */
function spreadHeads(header: PdfCell[][]): PdfCell[][] {
  return header.map((row, index) => {
    const below = header.slice(index + 1)
    const names = row.slice(1).map((_, i) =>
      below
        .map((cells) => cells[i + 1]?.text ?? '')
        .join(' ')
        .trim(),
    )
    const period = findPeriod(names)
    if (period === null) return row
    const groups = Array.from({ length: names.length / period }, (_, g) => {
      const filled = row.slice(1 + g * period, 1 + (g + 1) * period).filter((cell) => cell.text !== '')
      return new Set(filled.map((cell) => cell.text)).size === 1 ? filled[0] : undefined
    })
    if (new Set(groups.map((cell) => cell?.text)).size < groups.length || groups.includes(undefined))
      return row
    return row.map((cell, i) => (i === 0 ? cell : (groups[Math.floor((i - 1) / period)] ?? cell)))
  })
}

function findPeriod(names: readonly string[]): number | null {
  for (let period = 2; period <= names.length / 2; period++) {
    if (names.length % period !== 0) continue
    if (names.every((name, i) => name !== '' && name === names[i % period])) return period
  }
  return null
}

export function toCell(words: readonly Word[]): PdfCell {
  if (words.length === 0) return { text: '', boxes: [] }
  const lines: Word[][] = []
  for (const word of words) {
    const line = lines.at(-1)
    const head = line?.find((w) => w.level === 0) ?? line?.[0]
    if (line && head && (word.level !== 0 || Math.abs(head.v - word.v) < 0.5 * head.size)) line.push(word)
    else lines.push([word])
  }
  const text = lines.map((line) => normalise(writeLine(line)).text).join(' ')
  return { text, boxes: lines.map(boxOf) }
}

export function boxOf(words: readonly Word[]): Box {
  let [u0, u1, v0, v1] = [Infinity, -Infinity, Infinity, -Infinity]
  for (const word of words) {
    u0 = Math.min(u0, word.u0)
    u1 = Math.max(u1, word.u1)
    v0 = Math.min(v0, word.v + word.drop)
    v1 = Math.max(v1, word.v + word.rise)
  }
  return toPageBox(words[0]?.turn ?? 0, u0, v0, u1, v1)
}
