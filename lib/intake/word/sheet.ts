import PDFDocument from 'pdfkit'
import { openFaces, type Faces } from './faces'
import { smaller, type Line } from './set-lines'

const long = 841.89
const short = 595.28
const margin = 56
const noteSize = 8
const leading = 1.32

/** The pages of a reading copy, written from the top; footnotes stand at the foot of the page that refers to them. */
export type Sheet = {
  faces: Faces
  /** What is left of the page. */
  room: () => number
  fullHeight: () => number
  /** How the pages lie that are begun from now on. */
  turn: (landscape: boolean) => void
  newPage: () => void
  skip: (height: number) => void
  /** Writes a line and goes on below it; takes a new page where it does not fit. */
  write: (line: Line, size: number, indent?: number) => void
  /** Draws a line of a cell without moving on. */
  draw: (line: Line, size: number, x: number, down: number) => void
  rule: (x0: number, down0: number, x1: number, down1: number) => void
  addNote: (lines: Line[]) => void
  end: () => Promise<Buffer>
}

/** What a line may take of an upright page, and of a turned one. */
export const widths = { upright: short - 2 * margin, turned: long - 2 * margin }
export const noteLook = { size: noteSize, width: widths.upright }

export function openSheet(title: string | null): Sheet {
  const doc = new PDFDocument({
    autoFirstPage: false,
    margin: 0,
    // Without the time of the day: the same document gives the same copy.
    info: { ...(title === null ? {} : { Title: title }), CreationDate: new Date(0) },
  })
  const chunks: Buffer[] = []
  doc.on('data', (chunk: Buffer) => chunks.push(chunk))
  const done = new Promise<Buffer>((resolve, reject) =>
    doc.on('end', () => resolve(Buffer.concat(chunks))).on('error', reject),
  )
  const faces = openFaces(doc)
  /** Of the page that is written, and of those that will be begun. */
  let [high, y] = [long, margin]
  let next: [wide: number, high: number] = [short, long]
  let notes: Line[] = []
  let waiting: Line[] = []
  const noteHeight = noteSize * leading
  const foot = () => (notes.length === 0 ? 0 : notes.length * noteHeight + 10)
  const room = () => high - margin - foot() - y

  const stroke = (line: Line, size: number, x: number, baseline: number) => {
    let at = x
    for (const piece of line.pieces) {
      const points = piece.level === 0 ? size : size * smaller
      const shift = piece.level === 1 ? 0.34 * size : piece.level === -1 ? -0.16 * size : 0
      for (const part of faces.split(piece.text, piece)) {
        doc.font(part.font).fontSize(points)
        doc.text(part.text, at, baseline - shift, { lineBreak: false, baseline: 'alphabetic' })
        at += doc.widthOfString(part.text)
      }
    }
  }
  const closePage = () => {
    if (notes.length === 0) return
    let at = high - margin - notes.length * noteHeight
    doc
      .moveTo(margin, at - 5)
      .lineTo(margin + 90, at - 5)
      .lineWidth(0.4)
      .stroke()
    for (const line of notes) {
      stroke(line, noteSize, margin, at + noteSize)
      at += noteHeight
    }
    notes = []
  }
  const newPage = () => {
    closePage()
    doc.addPage({ size: next, margin: 0 })
    high = next[1]
    y = margin
    takeNotes()
  }
  /** What does not fit in half the page goes on at the foot of the next. */
  const takeNotes = () => {
    const most = Math.floor(Math.min(0.5 * (high - 2 * margin), Math.max(0, room() - 12)) / noteHeight)
    const now = waiting.slice(0, Math.max(0, most - notes.length))
    notes.push(...now)
    waiting = waiting.slice(now.length)
  }
  newPage()
  return {
    faces,
    room,
    fullHeight: () => high - 2 * margin,
    turn(landscape) {
      next = landscape ? [long, short] : [short, long]
    },
    newPage,
    skip(height) {
      y += height
    },
    write(line, size, indent = 0) {
      if (room() < size * leading) newPage()
      stroke(line, size, margin + indent, y + size)
      y += size * leading
    },
    draw(line, size, x, down) {
      stroke(line, size, margin + x, y + down + size)
    },
    rule(x0, down0, x1, down1) {
      doc
        .moveTo(margin + x0, y + down0)
        .lineTo(margin + x1, y + down1)
        .lineWidth(0.4)
        .stroke()
    },
    addNote(lines) {
      waiting.push(...lines)
      takeNotes()
    },
    end() {
      while (waiting.length > 0) newPage()
      closePage()
      doc.end()
      return done
    },
  }
}
