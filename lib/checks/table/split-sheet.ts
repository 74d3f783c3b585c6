import type { Merge, ReadSheet } from '../types'
import type { GridRow } from './grid'
import { holdsData, isHead, namesColumns } from './head'
import { joinHeads } from './join-heads'
import { findRegions, type Region } from './regions'

/**
 * One table of a sheet. `row`: where it begins, its first line of heads or, without one, its first row (0-based, of the
 * sheet); `column`: the sheet's column of its first; `lines`: the sheet's row of each body row, null for a heading.
 */
export type Block = {
  row: number
  column: number
  title: string
  headers: string[]
  rows: GridRow[]
  lines: (number | null)[]
  notes: string
}

/**
 * The tables of one sheet. A line of heads begins one (two or more words, no number, at least one known head), further
 * lines of heads right below it belong to it; a line with a single text above it is its title, below its rows a note.
 * Blank lines alone end nothing: rows after them belong to the table above. Data rows are numbered from 1 within the
 * sheet; tables side by side share their numbers.
 */
export function splitSheet(sheet: ReadSheet): Block[] {
  const texts = sheet.rows.map((row) => row.map(({ text }) => text.trim()))
  const blocks = findRegions(texts).flatMap((region) => splitRegion(texts, region, sheet.merges ?? []))
  for (const block of blocks) {
    const width = block.rows.reduce((widest, { cells }) => Math.max(widest, cells.length), 0)
    while (block.headers.length < width) block.headers.push('')
  }
  const lines = new Set(blocks.flatMap((block) => block.lines.filter((line) => line !== null)))
  const numbers = new Map([...lines].sort((a, b) => a - b).map((line, i) => [line, i + 1] as const))
  for (const { rows, lines: own } of blocks)
    rows.forEach((row, i) => {
      const line = own[i]
      row.number = line === null || line === undefined ? null : (numbers.get(line) ?? null)
    })
  return blocks
}

/** `data`: a plain number is among the cells, so that it is no line of heads. */
type Line = { at: number; cells: string[]; filled: string[]; afterBlank: boolean; data: boolean }

/** '12', '-0.3', ',05' */
const PLAIN_NUMBER = /^[-+]?\d*[.,]?\d+$/

function splitRegion(texts: readonly string[][], region: Region, merges: readonly Merge[]): Block[] {
  const lines = listLines(texts, region)
  const blocks: Block[] = []
  let titles: string[] = []
  let current: Block | undefined
  const begin = (row: number, headers: string[]): Block => {
    const title = titles.join(' ')
    const block: Block = { row, column: region.left, title, headers, rows: [], lines: [], notes: '' }
    blocks.push(block)
    titles = []
    return block
  }
  for (let i = 0; i < lines.length; i += 1) {
    const line = lines[i]
    if (!line) continue
    const heads = countHeadLines(lines, i, merges)
    const [only] = line.filled
    if (heads > 0) {
      const head = lines.slice(i, i + heads)
      current = begin(line.at, joinHeads(head, merges, region.left))
      i += heads - 1
    } else if (line.filled.length === 1 && only !== undefined && !holdsData(only)) {
      const isNote = current !== undefined && current.rows.length > 0 && NOTE.test(only)
      if (isNote && current) current.notes += ` ${only}`
      // what stands right below the rows and reads as a note is no title of what follows
      if (!(isNote && (!line.afterBlank || NOTE_BEGINS.test(only)))) titles.push(only)
    } else {
      current ??= begin(
        line.at,
        line.cells.map(() => ''),
      )
      const heading = titles.join(' ')
      // a title without a new line of heads: rows of another outcome under the same heads
      if (current.rows.length > 0 && heading !== '' && !/[*†‡]|^note/i.test(heading))
        pushRow(current, [heading], null)
      titles = []
      pushRow(current, line.cells, line.at)
    }
  }
  return blocks
}

/** An asterisk legend or a note below the rows. */
const NOTE = /[*†‡]|^note|p\s?[<=]|adjust|correct/i
/** 'Note. …', '* p < 0.05', 'Abbreviations: …', 'n.s., not significant', 'SE = …'. */
const NOTE_BEGINS = /^(?:notes?\b|[*†‡]|abbreviations?|legend|n\.?s\.?[\s,=:]|key\b)/i

function pushRow(block: Block, cells: string[], line: number | null): void {
  block.rows.push({
    cells,
    boxes: line === null ? [] : cells.map(() => []),
    number: null,
    index: block.rows.length,
  })
  block.lines.push(line)
}

function listLines(texts: readonly string[][], { top, bottom, left, right }: Region): Line[] {
  const lines: Line[] = []
  let afterBlank = false
  for (let at = top; at < bottom; at += 1) {
    const cells = (texts[at] ?? []).slice(left, right)
    const filled = cells.filter((cell) => cell !== '')
    const data = filled.some((cell) => PLAIN_NUMBER.test(cell))
    if (filled.length > 0) lines.push({ at, cells, filled, afterBlank, data })
    afterBlank = filled.length === 0
  }
  return lines
}

/** How many lines of heads begin here: the lowest names columns, those above it spans of columns. At most four. */
function countHeadLines(lines: readonly Line[], from: number, merges: readonly Merge[]): number {
  const first = lines[from]
  if (!first || first.data) return 0
  let last = isHead(first.cells) ? 1 : 0
  for (let k = 1; k < 4; k += 1) {
    const [above, line] = [lines[from + k - 1], lines[from + k]]
    if (!above || !line || line.afterBlank) break
    if (!(isHead(above.cells) || isSpans(above, line, merges))) break
    if (isHead(line.cells) && namesColumns(line.cells)) last = k + 1
    else if (!isSpans(line, lines[from + k + 1], merges)) break
  }
  return last
}

/** Names of spans over the heads of the next line: no numbers, and not a title in the first column alone. */
function isSpans(
  { at, cells, filled, data }: Line,
  next: Line | undefined,
  merges: readonly Merge[],
): boolean {
  if (!next || data || filled.some(holdsData)) return false
  if (filled.length >= 2) return true
  const c = cells.findIndex((cell) => cell !== '')
  const merge = merges.find(([row, column]) => row === at && column === c)
  const widest = next.filled.length
  if (merge && merge[3] >= widest) return false
  return c > next.cells.findIndex((cell) => cell !== '') && (filled[0]?.length ?? 0) <= 40
}
