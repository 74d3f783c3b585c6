import { toSegment, type Segment } from './segments'
import type { Word } from './words'

/** Segments of one lane (a column, or the full width) on one baseline, from the left. */
export type Row = { segments: Segment[]; u0: number; u1: number; v: number; size: number }

/** A stretch of the page between gutters that is read from its top to its foot. */
export type Lane = { left: number; right: number; rows: Row[] }

/** Groups segments to rows by baseline, from the top. */
export function toRows(segments: readonly Segment[]): Row[] {
  const sorted = [...segments].sort((a, b) => b.v - a.v || a.u0 - b.u0)
  const groups: Segment[][] = []
  for (const segment of sorted) {
    const group = groups.at(-1)
    const head = group?.[0]
    if (group && head && head.v - segment.v <= 0.3 * Math.min(head.size, segment.size)) group.push(segment)
    else groups.push([segment])
  }
  return groups.map(toRow)
}

export function toRow(segments: Segment[]): Row {
  const sorted = [...segments].sort((a, b) => a.u0 - b.u0)
  const widest = sorted.reduce((best, s) => (s.u1 - s.u0 > best.u1 - best.u0 ? s : best))
  return {
    segments: sorted,
    u0: Math.min(...sorted.map((s) => s.u0)),
    u1: Math.max(...sorted.map((s) => s.u1)),
    v: widest.v,
    size: widest.size,
  }
}

export function median(values: readonly number[]): number {
  if (values.length === 0) return 0
  const sorted = [...values].sort((a, b) => a - b)
  return sorted[Math.floor((sorted.length - 1) / 2)] ?? 0
}

// a token of a number: "9", "44.29", "-2.4", "<.001", "(0.61)", "12%"
const numberToken = /^[<>≤≥=(\[±~-]*\d[\d.,·]*\S{0,3}$|^[<>≤≥=(\[-]*[.·]\d+\S{0,2}$/

/**
 * The row cut more finely, as the cells of a table are: numbers stand apart from their neighbours by less
 * than words of different columns do. Null where the row is one of prose.
 */
export function cutFinely(row: Row): Row {
  const segments: Segment[] = []
  for (const segment of row.segments) {
    let open: Word[] = []
    let last: Word | null = null
    for (const word of segment.words) {
      if (last && word.level === 0 && last.level >= 0 && isCellGap(last, word)) {
        segments.push(toSegment(open))
        open = []
      }
      open.push(word)
      last = word
    }
    if (open.length > 0) segments.push(toSegment(open))
  }
  return segments.length === row.segments.length ? row : { ...row, segments }
}

function isCellGap(last: Word, word: Word): boolean {
  const gap = word.u0 - last.u1
  const size = Math.max(last.size, word.size)
  if (gap > 0.8 * size) return true
  return gap > 0.48 * size && (numberToken.test(last.chars) || numberToken.test(word.chars))
}

/** A line of running words: many of them, mostly letters, with word spaces between. */
export function isProseLine(row: Row): boolean {
  const words = row.segments.flatMap((segment) => segment.words).filter((word) => word.level === 0)
  if (words.length < 8) return false
  const wordy = words.filter((word) => /^[(“"‘]?\p{L}{2,}/u.test(word.chars)).length
  if (wordy < 0.6 * words.length) return false
  const wide = words.slice(1).some((word, i) => word.u0 - (words[i]?.u1 ?? word.u0) > 1.3 * word.size)
  return !wide
}
