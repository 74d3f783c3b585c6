import { isFigureCaption, textOf } from './captions'
import { continuesCommand, isPrompt } from './console'
import type { FlowItem } from './flow'
import { isNumbered, kindOfHeading, readRunIn } from './headings'
import { median, type Lane, type Row } from './rows'
import type { FoundTable } from './tables'

/**
 * Lines that are read in one go. `aside`: captions and notes, which a sentence may run around; `command`: what was typed
 * at the prompt of a statistics program, which stays beside what that printed.
 */
export type Paragraph = { kind: 'body' | 'heading' | 'aside' | 'command'; rows: Row[]; page: number }
export type Part = Paragraph | { kind: 'table'; table: FoundTable; page: number }

/** What is usual in a document's running text. */
export type Usual = { size: number; font: string; pitch: number }

type Line = { row: Row; lane: Lane; page: number; text: string }

/** Groups the lines of a document to paragraphs, joins those that run over columns, pages and floats. */
export function toParts(pages: readonly { page: number; items: FlowItem[] }[], usual: Usual): Part[] {
  const parts: Part[] = []
  let open: Line[] = []
  const close = () => {
    if (open.length > 0) parts.push(toParagraph(open, usual))
    open = []
  }
  for (const { page, items } of pages) {
    for (const item of items) {
      if (item.kind === 'table') {
        close()
        parts.push({ kind: 'table', table: item.table, page })
        continue
      }
      const line: Line = { row: item.row, lane: item.lane, page, text: textOf(item.row) }
      const last = open.at(-1)
      if (last && startsParagraph(open, last, line, usual)) close()
      open.push(line)
    }
    close()
  }
  return joinBroken(parts)
}

function toParagraph(lines: Line[], usual: Usual): Paragraph {
  const rows = lines.map((line) => line.row)
  const first = lines[0]
  const page = first?.page ?? 1
  if (isPrompt(first?.text ?? '')) return { kind: 'command', rows, page }
  if (isHeading(lines, usual)) return { kind: 'heading', rows, page }
  const small = median(rows.map((row) => row.size)) < 0.93 * usual.size
  const aside = small || isFigureCaption(first?.text ?? '')
  return { kind: aside ? 'aside' : 'body', rows, page }
}

function startsParagraph(open: readonly Line[], last: Line, line: Line, usual: Usual): boolean {
  if (last.lane !== line.lane || last.page !== line.page) return true
  if (isPrompt(line.text)) return true
  if (isPrompt(open[0]?.text ?? ''))
    return !continuesCommand(
      open.map(({ text }) => text),
      line.text,
    )
  const drop = last.row.v - line.row.v
  const pitch = usualPitch(open, last, usual)
  if (drop > 1.32 * pitch || drop < -1) return true
  if (Math.abs(last.row.size - line.row.size) > 0.12 * usual.size) return true
  if (isFigureCaption(line.text) || readRunIn(line.text)) return true
  const heads = looksLikeHeading(line, usual)
  if (heads !== looksLikeHeading(last, usual)) return true
  if (heads && isNewHeading(last, line)) return true
  const unfinished = !/[.!?:;)\]"”’*]$/.test(last.text) || /^[\p{Ll}]/u.test(line.text)
  if (unfinished) return false
  const indent = line.row.u0 - line.lane.left
  const lastIndent = last.row.u0 - last.lane.left
  if (indent > 0.7 * usual.size && indent < 4 * usual.size && lastIndent < indent - 0.5 * usual.size)
    return true
  const short = last.row.u1 < last.lane.right - 0.12 * (last.lane.right - last.lane.left)
  return short && /[.!?]["”’)\]]*$/.test(last.text)
}

/** Two headings one below the other, as against one of two lines. */
function isNewHeading(last: Line, line: Line): boolean {
  if (isNumbered(line.text) || kindOfHeading(last.text) !== null) return true
  return Math.abs(last.row.size - line.row.size) > 0.3 || fontOf(last.row) !== fontOf(line.row)
}

function usualPitch(open: readonly Line[], last: Line, usual: Usual): number {
  if (open.length >= 2) {
    const before = open.at(-2)
    if (before) return Math.max(before.row.v - last.row.v, 1.02 * last.row.size)
  }
  return Math.max(usual.pitch * (last.row.size / usual.size), 1.02 * last.row.size)
}

function fontOf(row: Row): string {
  const chars = new Map<string, number>()
  let best = ''
  for (const segment of row.segments)
    for (const word of segment.words) {
      const sum = (chars.get(word.font) ?? 0) + word.chars.length
      chars.set(word.font, sum)
      if (sum > (chars.get(best) ?? 0)) best = word.font
    }
  return best
}

/** What a heading looks like: headings of one rank look alike. */
export function styleOf(paragraph: Paragraph): string {
  const row = paragraph.rows[0]
  if (!row) return ''
  const letters = textOf(row).replace(/[^\p{L}]/gu, '')
  return `${fontOf(row)}|${row.size.toFixed(1)}|${letters === letters.toUpperCase() ? 'capitals' : ''}`
}

function looksLikeHeading(line: Line, usual: Usual): boolean {
  const { text, row } = line
  if (text.length > 140 || row.segments.length > 3) return false
  if (
    kindOfHeading(text) !== null &&
    text.split(' ').length <= 6 &&
    !/[.,;]$/.test(text.replace(/^\S+\.\s/, ''))
  ) {
    const bare = text.trim()
    if (/^[\p{Lu}\d]/u.test(bare)) return true
  }
  const letters = text.replace(/[^\p{L}]/gu, '')
  if (letters.length < 3) return false
  const large = row.size > 1.08 * usual.size
  const styled = fontOf(row) !== usual.font && row.size > 0.97 * usual.size
  const capitals = letters === letters.toUpperCase() && letters.length > 4
  const ends = /[.,;]$/.test(text)
  if (large && !ends) return true
  const short = row.u1 - row.u0 < 0.85 * (line.lane.right - line.lane.left)
  if (!short || ends || !/^[\p{Lu}\d]/u.test(text)) return false
  if (/[=<>]/.test(text)) return false
  return (
    (isNumbered(text) && (styled || capitals)) ||
    (styled && text.split(' ').length <= 12) ||
    (capitals && text.split(' ').length <= 8)
  )
}

function isHeading(lines: readonly Line[], usual: Usual): boolean {
  return lines.length <= 4 && lines.every((line) => looksLikeHeading(line, usual))
}

/** A sentence that runs on after a column, a page or a float is one paragraph. */
function joinBroken(parts: readonly Part[]): Part[] {
  const joined: Part[] = []
  let body: Paragraph | null = null
  for (const part of parts) {
    if (part.kind === 'heading') body = null
    if (part.kind === 'body') {
      if (body && runsOn(body, part)) {
        body.rows = [...body.rows, ...part.rows]
        continue
      }
      body = part
    }
    joined.push(part)
  }
  return joined
}

function runsOn(before: Paragraph, after: Paragraph): boolean {
  const lastRow = before.rows.at(-1)
  const firstRow = after.rows[0]
  if (!lastRow || !firstRow) return false
  const last = textOf(lastRow)
  const first = textOf(firstRow)
  if (/[.!?]["”’)\]*]*$/.test(last) && !/(?:\b(?:vs|e\.g|i\.e|cf|Fig|Figs|no|al|approx|pp)\.)$/.test(last))
    return false
  if (/[-–(,=<>]$/.test(last) || /^[\p{Ll}(=<>–-]/u.test(first)) return true
  return before.page !== after.page || Math.abs(lastRow.u0 - firstRow.u0) > 60
}
