import type { LaidOut, PdfTable, Place, ReadDocument, ReadPage } from '../types'
import { repairGlyphs } from './damage'
import { readFlow, type FlowItem } from './flow'
import { dropFurniture } from './furniture'
import { dropHiddenLayers } from './layers'
import { measureDigits } from './glyphs'
import { findAllGutters } from './gutters'
import { textOf } from './captions'
import { toParts, type Part, type Usual } from './paragraphs'
import { joinRows, readVocabulary, toProse, type Vocabulary } from './prose'
import { findSections, toMark, type Mark } from './sections'
import { findSegments } from './segments'
import type { FoundTable } from './tables'
import { readFrames, type Frame } from './words'
import type { Origin } from './write-line'

/**
 * Makes readable text and tables of a document's positioned runs. Never throws on content.
 *
 * Conventions of the text that the extractors read:
 * paragraphs are separated by '\n\n'; a line break inside a paragraph is one space; words broken at a line's
 * end are whole again. Raised characters follow '^', lowered ones '_' ('10^-5', 'F_2,38', '12.3^a',
 * 'p_adj'); χ² is 'χ2'; raised asterisks and daggers stand plain ('0.03*'). Minus signs, and dashes that
 * stand for one before a digit, are '-'; dashes between numbers and between words stay '–'. All spaces are
 * ' '. Ligatures are letters. A mid-dot decimal is '.'.
 */
export function layOut(document: ReadDocument): LaidOut {
  const digits = measureDigits(document.pages.flatMap((page) => page.runs))
  const pages = document.pages.map((page) => ({ page, frames: readFrames(document, page, digits) }))
  const unread = pages.filter(({ frames }) => frames.length === 0).map(({ page }) => toWholePage(page))
  const told = pages.flatMap(({ frames }) => frames.filter((frame, i) => i === 0 || frame.words.length > 25))
  const remarks = [...(document.remarks ?? []), ...repairGlyphs(told)]
  const frames = dropFurniture(dropHiddenLayers(told)).filter((frame) => frame.words.length > 0)
  const usual = findUsual(frames)
  const segments = frames.map((frame) => findSegments(frame.words))
  const gutters = findAllGutters(frames, segments)
  const flows = frames.map((frame, i) => ({
    page: frame.page.number,
    items: readFlow(frame, segments[i] ?? [], gutters[i] ?? [], usual.size),
  }))
  const recognised = document.pages.filter((page) => page.recognised).map(toWholePage)
  return {
    ...write(toParts(flows, usual), flows, unread),
    ...(recognised.length > 0 ? { recognised } : {}),
    ...(remarks.length > 0 ? { remarks } : {}),
  }
}

function toWholePage({ number, width, height }: ReadPage): Place {
  return { source: 'text', page: number, row: null, sheet: null, quote: '', boxes: [[0, 0, width, height]] }
}

/** Size, font and distance of lines of the running text: those of most characters. */
function findUsual(frames: readonly Frame[]): Usual {
  const sizes = new Map<number, number>()
  const fonts = new Map<string, number>()
  for (const frame of frames)
    for (const word of frame.words) add(sizes, Math.round(word.size * 2) / 2, word.chars.length)
  const size = largest(sizes) ?? 10
  const pitches = new Map<number, number>()
  for (const frame of frames) {
    let last = Infinity
    for (const word of frame.words) {
      if (Math.abs(word.size - size) > 0.5) continue
      add(fonts, word.font, word.chars.length)
      const drop = last - word.v
      if (drop > 0.9 * size && drop < 3.2 * size) add(pitches, Math.round(drop * 2) / 2, 1)
      last = word.v
    }
  }
  return { size, font: largest(fonts) ?? '', pitch: largest(pitches) ?? 1.2 * size }
}

function add<K>(counts: Map<K, number>, key: K, by: number): void {
  counts.set(key, (counts.get(key) ?? 0) + by)
}

function largest<K>(counts: Map<K, number>): K | null {
  let best: K | null = null
  let most = 0
  for (const [key, count] of counts)
    if (count > most) {
      most = count
      best = key
    }
  return best
}

function write(parts: readonly Part[], flows: readonly { items: FlowItem[] }[], unread: Place[]): LaidOut {
  const vocabulary = readVocabulary(linesOf(flows))
  const chunks: string[] = []
  const origins: Origin[] = []
  const tables: PdfTable[] = []
  const marks: Mark[] = []
  let length = 0
  let last: TablePart | null = null
  for (const part of parts) {
    if (part.kind === 'table') {
      const table = toTable(part.table, part.page, length, vocabulary)
      const before = tables.at(-1)
      tables.push(last && before && goesOn(last, part) ? carryOver(before, table) : table)
      last = part
      continue
    }
    const written = joinRows(part.rows, vocabulary)
    if (written.text.trim() === '') continue
    if (length > 0) {
      chunks.push('\n\n')
      origins.push(null, null)
      length += 2
    }
    if (part.kind === 'body') last = null
    marks.push(toMark(part, written.text, length))
    chunks.push(written.text)
    for (const origin of written.origins) origins.push(origin)
    length += written.text.length
  }
  return { prose: toProse(chunks.join(''), origins, findSections(marks, length)), tables, unread }
}

function* linesOf(flows: readonly { items: FlowItem[] }[]): Generator<string> {
  for (const { items } of flows) for (const item of items) if (item.kind === 'line') yield textOf(item.row)
}

type TablePart = Extract<Part, { kind: 'table' }>

/** The second table has the columns of the first, stands on the next page and no text lies between. */
function goesOn(first: TablePart, second: TablePart): boolean {
  const [before, after] = [first.table, second.table]
  if (second.page !== first.page + 1 || before.columns.length !== after.columns.length) return false
  const caption = after.caption.map(textOf).join(' ')
  if (caption !== '' && !(/continued/i.test(caption) || after.number === before.number)) return false
  return before.columns.every((column, i) => {
    const other = after.columns[i]
    return other !== undefined && Math.min(column.to, other.to) > Math.max(column.from, other.from) - 2
  })
}

/** A table that goes on keeps the header, the number and the caption of its first part. */
function carryOver(first: PdfTable, second: PdfTable): PdfTable {
  const header = second.header.length > 0 ? second.header : first.header
  return {
    ...second,
    header,
    number: second.number ?? first.number,
    caption: second.caption || first.caption,
  }
}

function toTable(found: FoundTable, page: number, offset: number, vocabulary: Vocabulary): PdfTable {
  return {
    page,
    number: found.number,
    caption: joinRows(found.caption, vocabulary).text,
    notes: joinRows(found.notes, vocabulary).text,
    columns: found.columns.length,
    header: found.header,
    rows: found.body,
    offset,
  }
}
