import { textOf, type WordBlock, type WordText } from './blocks'
import { setLines, type Line } from './set-lines'
import { drawTable, planTable } from './set-table'
import { noteLook, openSheet, widths, type Sheet } from './sheet'

const body = 10
const headingSizes = [16, 13, 11.5, 10.5]

/** "Table 2. Pairwise comparisons": stands with the table below it. */
const caption = /^\s*(?:supplement\w*\s+)?tab(?:le|\.)\s/i

/** Sets the text of a Word document as a PDF: one column, tables in one piece where a page holds them. */
export function setCopy(text: WordText): Promise<Buffer> {
  const sheet = openSheet(text.title)
  const notesOf = (lines: readonly Line[]) =>
    lines.flatMap((line) => line.notes).flatMap((number) => text.footnotes.get(number) ?? [])
  const write = (lines: readonly Line[], size: number, indent = 0) => {
    for (const line of lines) {
      sheet.write(line, size, indent)
      const note = notesOf([line])
      if (note.length > 0) sheet.addNote(setLines(note, sheet.faces, noteLook.size, noteLook.width))
    }
  }
  text.blocks.forEach((block, i) => {
    if (block.kind === 'table') return writeTable(sheet, block, text.blocks[i - 1], write)
    // A caption waits for its table.
    if (isCaption(block) && text.blocks[i + 1]?.kind === 'table') return
    writeText(sheet, block, write)
  })
  if (text.endnotes.length > 0) {
    writeText(sheet, { kind: 'heading', depth: 1, spans: [{ ...plainSpan, text: 'Notes' }] }, write)
    for (const spans of text.endnotes) writeText(sheet, { ...plainParagraph, spans }, write)
  }
  return sheet.end()
}

const plainSpan = { bold: false, italic: false, level: 0, note: null } as const
const plainParagraph = { kind: 'paragraph', marker: null, depth: 0 } as const

type Write = (lines: readonly Line[], size: number, indent?: number) => void

function isCaption(block: WordBlock | undefined): block is Exclude<WordBlock, { kind: 'table' }> {
  return block !== undefined && block.kind !== 'table' && caption.test(textOf(block.spans))
}

function writeText(sheet: Sheet, block: Exclude<WordBlock, { kind: 'table' }>, write: Write): void {
  if (block.kind === 'heading') {
    const size = headingSizes[Math.min(block.depth, headingSizes.length - 1)] ?? body
    const bold = block.spans.map((span) => ({ ...span, bold: true }))
    sheet.skip(8)
    // A heading does not stand alone at the foot of a page.
    if (sheet.room() < size + 4 * body) sheet.newPage()
    write(setLines(bold, sheet.faces, size, widths.upright), size)
    return sheet.skip(3)
  }
  const indent = block.depth * 14
  const marked =
    block.marker === null ? block.spans : [{ ...plainSpan, text: `${block.marker} ` }, ...block.spans]
  write(setLines(marked, sheet.faces, body, widths.upright - indent), body, indent)
  sheet.skip(6)
}

function writeTable(
  sheet: Sheet,
  table: Extract<WordBlock, { kind: 'table' }>,
  before: WordBlock | undefined,
  write: Write,
): void {
  const plan = planTable(table, sheet)
  const above = isCaption(before) ? setLines(before.spans, sheet.faces, body, widths.upright) : []
  const needed = plan.height + above.length * body * 1.32 + 20
  sheet.turn(plan.landscape)
  if (plan.landscape || (sheet.room() < needed && needed < 1.15 * sheet.fullHeight())) sheet.newPage()
  else sheet.skip(6)
  write(above, body)
  sheet.skip(4)
  drawTable(plan, sheet)
  // What follows a turned table stands beneath it; the page after it is upright again.
  sheet.turn(false)
  sheet.skip(10)
}
