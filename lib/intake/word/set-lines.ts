import type { Span } from './blocks'
import type { Faces } from './faces'

/** A stretch of one look on a line. */
export type Piece = Omit<Span, 'note'> & { width: number }
export type Line = { pieces: Piece[]; width: number; notes: number[] }

/** Raised and lowered text is set at this share of the size. */
export const smaller = 0.66

// superscript and subscript characters, "10⁻⁵", "H₂O": set as raised and lowered ordinary ones
const shifted = /[⁰¹²³⁴-⁹⁺⁻⁼⁽⁾ⁿ]+|[₀-₉₊₋₌₍₎]+/gu
const isRaised = /^[⁰¹²³⁴-⁹⁺⁻⁼⁽⁾ⁿ]/u

type Word = { pieces: Piece[]; width: number; notes: number[]; breaks: boolean }

/** Breaks spans into lines no wider than given; a line break of the text ends a line, a long word is cut. */
export function setLines(spans: readonly Span[], faces: Faces, size: number, width: number): Line[] {
  const space = faces.widthOf(' ', { bold: false, italic: false }, size)
  const lines: Line[] = []
  let line: Line = { pieces: [], width: 0, notes: [] }
  const end = () => {
    lines.push(line)
    line = { pieces: [], width: 0, notes: [] }
  }
  for (const word of toWords(spans, faces, size, width)) {
    if (line.pieces.length > 0 && line.width + space + word.width > width + 0.01) end()
    const last = line.pieces.at(-1)
    if (last && word.pieces.length > 0) {
      // The space belongs to the stretch before it, so that text is drawn in as few strokes as it has looks.
      line.pieces.push(makePiece(' ', { ...last, level: 0 }, faces, size))
      line.width += space
    }
    line.pieces.push(...word.pieces)
    line.width += word.width
    line.notes.push(...word.notes)
    if (word.breaks) end()
  }
  if (line.pieces.length > 0) end()
  return lines.map((one) => ({ ...one, pieces: joinPieces(one.pieces, faces, size) }))
}

export function widthOfLongestWord(spans: readonly Span[], faces: Faces, size: number): number {
  return Math.max(0, ...toWords(spans, faces, size, Infinity).map((word) => word.width))
}

function toWords(spans: readonly Span[], faces: Faces, size: number, width: number): Word[] {
  const words: Word[] = []
  let word: Word = { pieces: [], width: 0, notes: [], breaks: false }
  const end = (breaks: boolean) => {
    if (word.pieces.length > 0 || breaks) words.push({ ...word, breaks })
    word = { pieces: [], width: 0, notes: [], breaks: false }
  }
  for (const span of spans) {
    for (const part of partLevels(span)) {
      for (const token of part.text.split(/(\n|[ \t\u00a0\u2000-\u200b\u202f\u3000]+)/u)) {
        if (token === '') continue
        if (token === '\n') end(true)
        else if (/^[ \t\u00a0\u2000-\u200b\u202f\u3000]+$/u.test(token)) end(false)
        else
          for (const piece of cut(makePiece(token, part, faces, size), faces, size, width)) {
            if (word.width + piece.width > width) end(false)
            word.pieces.push(piece)
            word.width += piece.width
          }
      }
    }
    if (span.note !== null) word.notes.push(span.note)
  }
  end(false)
  return words
}

function partLevels(span: Span): Omit<Span, 'note'>[] {
  if (span.level !== 0)
    return [{ ...span, text: span.text.replace(shifted, (found) => found.normalize('NFKC')) }]
  const parts: Omit<Span, 'note'>[] = []
  let at = 0
  for (const match of span.text.matchAll(shifted)) {
    if (match.index > at) parts.push({ ...span, text: span.text.slice(at, match.index) })
    const level = isRaised.test(match[0]) ? 1 : -1
    parts.push({ ...span, text: match[0].normalize('NFKC'), level })
    at = match.index + match[0].length
  }
  return [...parts, { ...span, text: span.text.slice(at) }]
}

function makePiece(text: string, look: Omit<Span, 'note' | 'text'>, faces: Faces, size: number): Piece {
  const { bold, italic, level } = look
  const width = faces.widthOf(text, look, level === 0 ? size : size * smaller)
  return { text, bold, italic, level, width }
}

/** A word wider than the line is cut where the line ends. */
function cut(piece: Piece, faces: Faces, size: number, width: number): Piece[] {
  if (piece.width <= width) return [piece]
  const pieces: Piece[] = []
  let text = ''
  for (const char of piece.text) {
    const longer = makePiece(text + char, piece, faces, size)
    if (text !== '' && longer.width > width) {
      pieces.push(makePiece(text, piece, faces, size))
      text = char
    } else text += char
  }
  return [...pieces, makePiece(text, piece, faces, size)]
}

function joinPieces(pieces: readonly Piece[], faces: Faces, size: number): Piece[] {
  const joined: Piece[] = []
  for (const piece of pieces) {
    const last = joined.at(-1)
    const same = last?.bold === piece.bold && last.italic === piece.italic && last.level === piece.level
    if (last && same) joined[joined.length - 1] = makePiece(last.text + piece.text, piece, faces, size)
    else joined.push(piece)
  }
  return joined
}
