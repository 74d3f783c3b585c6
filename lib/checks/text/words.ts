import type { Box, ReadDocument, ReadFont, ReadPage, TextRun } from '../types'
import { readGlyphs, type DigitWidths } from './glyphs'

/**
 * A word as drawn: characters without white space, with the edges between them along the baseline.
 * Coordinates are those of the reading frame: u along the baseline, v upwards, so that turned text is read
 * as upright text is. `gap`: white space was drawn before it; `order`: when. `level`: raised (1) or lowered (-1) text.
 */
export type Word = {
  chars: string
  edges: number[]
  u0: number
  u1: number
  v: number
  size: number
  font: string
  level: -1 | 0 | 1
  gap: boolean
  order: number
  page: number
  turn: Turn
  rise: number
  drop: number
}

export type Turn = 0 | 90 | 180 | 270

/** The words of a page that share one direction of the baseline. */
export type Frame = {
  page: ReadPage
  turn: Turn
  words: Word[]
  left: number
  right: number
  top: number
  bottom: number
}

/** Groups a page's runs by direction, the direction with most characters first. Oblique text is left out. */
export function readFrames(document: ReadDocument, page: ReadPage, digits: DigitWidths): Frame[] {
  const byTurn = new Map<Turn, Word[]>()
  const seen = new Set<string>()
  for (const run of page.runs) {
    const turn = turnOf(run.angle)
    if (turn === null || !(run.size > 0) || isRepeated(run, seen)) continue
    const words = byTurn.get(turn) ?? []
    byTurn.set(turn, words)
    for (const word of splitRun(
      run,
      page.number,
      turn,
      document.fonts[run.font],
      digits.get(run.font) ?? 0.5,
    )) {
      word.order = words.length
      words.push(word)
    }
  }
  const length = (words: Word[]) => words.reduce((sum, word) => sum + word.chars.length, 0)
  return [...byTurn]
    .filter(([, words]) => words.length > 0)
    .map(([turn, words]) => toFrame(page, turn, words))
    .sort((a, b) => length(b.words) - length(a.words) || a.turn - b.turn)
}

/** A box of the reading frame in the page's own coordinates. */
export function toPageBox(turn: Turn, u0: number, v0: number, u1: number, v1: number): Box {
  if (turn === 90) return [-v1, u0, -v0, u1]
  if (turn === 180) return [-u1, -v1, -u0, -v0]
  if (turn === 270) return [v0, -u1, v1, -u0]
  return [u0, v0, u1, v1]
}

function toFrame(page: ReadPage, turn: Turn, words: Word[]): Frame {
  const [u0, v0] = toFramePoint(turn, 0, 0)
  const [u1, v1] = toFramePoint(turn, page.width, page.height)
  return {
    page,
    turn,
    words,
    left: Math.min(u0, u1),
    right: Math.max(u0, u1),
    bottom: Math.min(v0, v1),
    top: Math.max(v0, v1),
  }
}

function toFramePoint(turn: Turn, x: number, y: number): [u: number, v: number] {
  if (turn === 90) return [y, -x]
  if (turn === 180) return [-x, -y]
  if (turn === 270) return [-y, x]
  return [x, y]
}

function turnOf(angle: number): Turn | null {
  const folded = ((angle % 360) + 360) % 360
  const nearest = Math.round(folded / 90) * 90
  return Math.abs(folded - nearest) > 5 ? null : ((nearest % 360) as Turn)
}

/** Text drawn twice at one place (imitated bold, shadows). */
function isRepeated(run: TextRun, seen: Set<string>): boolean {
  if (run.text.trim() === '') return false
  const key = `${run.font}|${run.text}|${Math.round(run.x / 1.5)}|${Math.round(run.y / 1.5)}|${Math.round(run.size)}`
  if (seen.has(key)) return true
  seen.add(key)
  return false
}

function splitRun(run: TextRun, page: number, turn: Turn, font: ReadFont | undefined, digit: number): Word[] {
  const [u, v] = toFramePoint(turn, run.x, run.y)
  const even = font?.family === 'monospace' || isEven(run.text)
  const glyphs = readGlyphs(run.text, u, u + run.width, even, digit * run.size)
  const rise = Math.min(1, Math.max(0.6, font?.ascent ?? 0.75)) * run.size
  const drop = Math.max(-0.35, Math.min(-0.1, font?.descent ?? -0.25)) * run.size
  const words: Word[] = []
  let open: Word | null = null
  let gap = false
  for (const glyph of glyphs) {
    if (glyph.char === ' ') {
      gap = true
      open = null
      continue
    }
    if (!open || open.level !== glyph.level) {
      open = {
        chars: '',
        edges: [glyph.from],
        u0: glyph.from,
        u1: glyph.to,
        v,
        size: run.size,
        font: run.font,
        level: glyph.level,
        gap,
        order: 0,
        page,
        turn,
        rise,
        drop,
      }
      words.push(open)
      gap = false
    }
    for (let unit = 0; unit < glyph.char.length; unit++) open.edges.push(glyph.to)
    open.chars += glyph.char
    open.u1 = glyph.to
  }
  return words
}

/** Columns set with runs of spaces are monospaced whatever the font is called. */
function isEven(text: string): boolean {
  return text.includes('   ')
}
