import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import PDFDocument from 'pdfkit'

export type TableBlock = { caption: string; header: string[]; rows: string[][]; notes?: string }
export type Block =
  { kind: 'heading'; text: string } | { kind: 'paragraph'; text: string } | ({ kind: 'table' } & TableBlock)

export type Manuscript = {
  title: string
  authors: string
  affiliation: string
  runningHead: string
  layout: 'one column' | 'two columns'
  lineNumbers: boolean
  /** A password makes a file that cannot be opened without it. */
  password?: string
  blocks: Block[]
}

const fonts = join(dirname(createRequire(import.meta.url).resolve('@fontsource/source-serif-4')), 'files')
const face = (style: string) => join(fonts, `source-serif-4-latin-${style}.woff`)

const page = { width: 595.28, height: 841.89, margin: 64, gap: 22 }
const size = { body: 10, small: 8.5, heading: 12, title: 17 }
const leading = 1.32

/** Sets a manuscript as a PDF: text flows over columns and pages, a table stays in one piece. */
export function writeManuscript(manuscript: Manuscript): Promise<Buffer> {
  const doc = new PDFDocument({
    size: 'A4',
    margin: 0,
    bufferPages: true,
    info: { Title: manuscript.title, Author: manuscript.authors },
    ...(manuscript.password ? { userPassword: manuscript.password, ownerPassword: manuscript.password } : {}),
  })
  doc.registerFont('regular', face('400-normal'))
  doc.registerFont('italic', face('400-italic'))
  doc.registerFont('bold', face('700-normal'))
  const chunks: Buffer[] = []
  doc.on('data', (chunk: Buffer) => chunks.push(chunk))
  const done = new Promise<Buffer>((resolve) => doc.on('end', () => resolve(Buffer.concat(chunks))))

  const pen = startPen(doc, manuscript)
  pen.wide(manuscript.title, 'bold', size.title)
  pen.wide(manuscript.authors, 'regular', size.body)
  pen.wide(manuscript.affiliation, 'italic', size.small)
  pen.beginColumns()
  for (const block of manuscript.blocks) {
    if (block.kind === 'heading') pen.heading(block.text)
    else if (block.kind === 'paragraph') pen.paragraph(block.text)
    else pen.table(block)
  }
  numberPages(doc, manuscript)
  doc.end()
  return done
}

type Doc = InstanceType<typeof PDFDocument>

function startPen(doc: Doc, manuscript: Manuscript) {
  const count = manuscript.layout === 'two columns' ? 2 : 1
  const full = page.width - 2 * page.margin
  const width = (full - (count - 1) * page.gap) / count
  const bottom = page.height - page.margin
  let top = page.margin
  let column = 0
  let y = top
  let line = 0
  const left = () => page.margin + column * (width + page.gap)

  const room = (height: number) => {
    if (y + height <= bottom) return
    column += 1
    if (column >= count) {
      doc.addPage()
      column = 0
      top = page.margin
    }
    y = top
  }
  const put = (text: string, x: number, font: string, points: number) => {
    doc.font(font).fontSize(points).text(text, x, y, { lineBreak: false })
  }
  const lines = (text: string, font: string, points: number, within: number): string[] => {
    doc.font(font).fontSize(points)
    const out: string[] = []
    let current = ''
    for (const word of text.split(/\s+/)) {
      const longer = current === '' ? word : `${current} ${word}`
      if (current !== '' && doc.widthOfString(longer) > within) {
        out.push(current)
        current = word
      } else current = longer
    }
    return current === '' ? out : [...out, current]
  }
  const flow = (text: string, font: string, points: number) => {
    for (const one of lines(text, font, points, width)) {
      room(points * leading)
      line += 1
      if (manuscript.lineNumbers && column === 0) put(String(line), page.margin - 28, 'regular', 7)
      put(one, left(), font, points)
      y += points * leading
    }
  }

  return {
    wide(text: string, font: string, points: number) {
      for (const one of lines(text, font, points, full)) {
        put(one, page.margin, font, points)
        y += points * leading
      }
      y += 6
    },
    beginColumns() {
      y += 8
      top = y
    },
    heading(text: string) {
      y += 6
      room(size.heading * leading + 3 * size.body * leading)
      put(text, left(), 'bold', size.heading)
      y += size.heading * leading + 2
    },
    paragraph(text: string) {
      flow(text, 'regular', size.body)
      y += 5
    },
    table(block: TableBlock) {
      const points = count === 2 ? 7.5 : size.small
      const height = points * leading + 1.5
      const caption = lines(block.caption, 'regular', size.small, width)
      const notes = block.notes ? lines(block.notes, 'italic', 7.5, width) : []
      y += 4
      room((caption.length + block.rows.length + notes.length + 2) * height + 24)
      for (const one of caption) {
        put(one, left(), 'regular', size.small)
        y += size.small * leading
      }
      const rule = () => {
        doc
          .moveTo(left(), y)
          .lineTo(left() + width, y)
          .lineWidth(0.5)
          .stroke()
        y += 3
      }
      y += 2
      rule()
      const xs = columnStarts(doc, block, points, left(), width)
      const row = (cells: string[], font: string) => {
        cells.forEach((cell, i) => put(cell, xs[i] ?? left(), font, points))
        y += height
      }
      row(block.header, 'bold')
      rule()
      for (const cells of block.rows) row(cells, 'regular')
      rule()
      for (const one of notes) {
        put(one, left(), 'italic', 7.5)
        y += 7.5 * leading
      }
      y += 8
    },
  }
}

/** Column starts that share the width in proportion to each column's widest cell. */
function columnStarts(doc: Doc, block: TableBlock, points: number, left: number, width: number): number[] {
  doc.font('bold').fontSize(points)
  const widths = block.header.map((_, i) =>
    Math.max(...[block.header, ...block.rows].map((row) => doc.widthOfString(row[i] ?? ''))),
  )
  const spare = Math.max(4, (width - widths.reduce((a, b) => a + b, 0)) / Math.max(1, widths.length - 1))
  return widths.map((_, i) => left + widths.slice(0, i).reduce((a, b) => a + b + spare, 0))
}

function numberPages(doc: Doc, manuscript: Manuscript) {
  const { count } = doc.bufferedPageRange()
  for (let i = 0; i < count; i++) {
    doc.switchToPage(i)
    doc.font('italic').fontSize(8)
    if (i > 0) doc.text(manuscript.runningHead, page.margin, 34, { lineBreak: false })
    doc.text(String(i + 1), page.width / 2 - 3, page.height - 40, { lineBreak: false })
  }
}
