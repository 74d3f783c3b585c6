import type { ReadDocument, ReadPage, TextRun } from '@/lib/checks/types'

/** Half an em for every character: runs placed by hand have plain, foreseeable widths. */
export function widthOf(text: string, size: number): number {
  return text.length * 0.5 * size
}

export function run(text: string, x: number, y: number, more: Partial<TextRun> = {}): TextRun {
  const size = more.size ?? 10
  return { text, x, y, size, width: widthOf(text, size), angle: 0, font: 'body', endsLine: false, ...more }
}

/** Lines one below the other, 12 points apart. */
export function block(
  lines: readonly string[],
  x: number,
  top: number,
  more: Partial<TextRun> = {},
): TextRun[] {
  const pitch = 1.2 * (more.size ?? 10)
  return lines.map((text, i) => run(text, x, top - i * pitch, more))
}

/** Cells of a table's row: texts at their abscissas on one baseline. */
export function row(
  cells: readonly (readonly [text: string, x: number])[],
  y: number,
  more: Partial<TextRun> = {},
): TextRun[] {
  return cells.map(([text, x]) => run(text, x, y, more))
}

export function page(runs: TextRun[], number = 1, more: Partial<ReadPage> = {}): ReadPage {
  return { number, width: 600, height: 800, rotation: 0, runs, ...more }
}

export function document(...pages: ReadPage[]): ReadDocument {
  const font = { family: 'serif', ascent: 0.75, descent: -0.25, vertical: false }
  return { sha256: '', title: null, pages, fonts: { body: font, heading: font, symbol: font } }
}

const fill = [
  'Readings were taken each morning by the same person and',
  'entered twice, and the entries were compared at the end of',
  'every week, so that a slip of the pen could be mended while',
  'the sheet was still at hand, which happened on six days',
]

/** Running text of so many lines, 12 points apart, none of which ends a paragraph. */
export function prose(lines: number, x: number, top: number, more: Partial<TextRun> = {}): TextRun[] {
  return block(
    Array.from({ length: lines }, (_, i) => fill[i % fill.length] ?? ''),
    x,
    top,
    more,
  )
}
