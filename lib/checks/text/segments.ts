import type { Word } from './words'

/** A gutter between columns: where the column at its left ends, and where the one at its right begins. */
export type Gutter = { from: number; to: number }

/**
 * A stretch of one line without a wide gap: words in reading order on a common baseline. `v` is the
 * baseline and `size` the size of its unraised text.
 */
export type Segment = { words: Word[]; u0: number; u1: number; v: number; size: number }

/** Gap, as a share of the size, from which two words may belong to different cells or columns. */
export const WIDE_GAP = 0.85

/**
 * Segments of a frame, from the top. Words are clustered by baseline first; small raised or lowered words
 * that touch a word of a larger line are moved into it. A gap that fills most of a
 * gutter parts segments however narrow it is.
 */
export function findSegments(words: readonly Word[], gutters: readonly Gutter[] = []): Segment[] {
  const rows = rowsOf.get(words) ?? attachRaised(clusterByBaseline(words))
  rowsOf.set(words, rows)
  return rows.flatMap((row) => splitRow(row, gutters))
}

/** The same words are cut twice: before the gutters of the page are known, and with them. */
const rowsOf = new WeakMap<readonly Word[], Word[][]>()

type Cluster = { words: Word[]; v: number; size: number }

/** Rows of words by baseline, from the top. */
function clusterByBaseline(words: readonly Word[]): Cluster[] {
  const sorted = [...words].sort((a, b) => b.v - a.v || a.u0 - b.u0)
  const rows: Cluster[] = []
  let row: Cluster | null = null
  for (const word of sorted) {
    if (row && row.v - word.v <= 0.22 * Math.min(word.size, row.size)) {
      row.words.push(word)
      row.size = Math.max(row.size, word.size)
    } else {
      row = { words: [word], v: word.v, size: word.size }
      rows.push(row)
    }
  }
  return rows
}

// marks that stand raised at any size: "37 ◦C", "0.03 ∗"
const raisedMark = /^[◦°*†‡§¶#′]+$/

/** Moves small words that stand at the shoulder or foot of a larger neighbour into that neighbour's row. */
function attachRaised(rows: Cluster[]): Word[][] {
  const kept: Word[][] = rows.map(() => [])
  for (const [index, row] of rows.entries()) {
    markShifted(row)
    let host: { at: number; word: Word } | null = null
    let last: Word | null = null
    for (const word of row.words.sort((a, b) => a.u0 - b.u0)) {
      const follows =
        host && last && word.u0 - last.u1 < 0.45 * word.size && word.size < 0.92 * host.word.size
      if (!follows) host = findHost(rows, index, word)
      if (host) word.level = word.v > host.word.v ? 1 : -1
      kept[host?.at ?? index]?.push(word)
      last = word
    }
  }
  return kept.filter((row) => row.length > 0)
}

function findHost(rows: readonly Cluster[], index: number, word: Word): { at: number; word: Word } | null {
  const mark = raisedMark.test(word.chars)
  for (const step of [1, -1]) {
    for (let at = index + step; at >= 0 && at < rows.length; at += step) {
      const row = rows[at]
      if (!row || Math.abs(row.v - word.v) > 24) break
      if (Math.abs(row.v - word.v) > 0.75 * row.size || (!mark && word.size >= 0.85 * row.size)) continue
      const host = row.words.find((other) => isHost(other, word, mark))
      if (host) return { at, word: host }
    }
  }
  return null
}

function isHost(other: Word, word: Word, mark: boolean): boolean {
  const shift = word.v - other.v
  if (shift > 0 ? shift > 0.7 * other.size : -shift > (mark ? 0 : 0.4 * other.size)) return false
  if (!mark && word.size >= 0.85 * other.size) return false
  const after = word.u0 - other.u1
  const before = other.u0 - word.u1
  const near = (gap: number, most: number) => gap < most * other.size && gap > -0.35 * other.size
  return near(after, 0.3) || (shift > 0 && near(before, 0.4))
}

function splitRow(row: Word[], gutters: readonly Gutter[]): Segment[] {
  const sorted = [...row].sort((a, b) => a.u0 - b.u0 || a.u1 - b.u1)
  const segments: Segment[] = []
  let words: Word[] = []
  let end = -Infinity
  for (const word of sorted) {
    const size = Math.max(word.size, words.at(-1)?.size ?? 0)
    const gap = word.u0 - end
    const crosses = gap > 0.3 * size && gutters.some((gutter) => isParted(end, word.u0, gutter))
    if (words.length > 0 && (word.u0 - end > WIDE_GAP * size || crosses)) {
      segments.push(toSegment(words))
      words = []
      end = -Infinity
    }
    words.push(word)
    end = Math.max(end, word.u1)
  }
  if (words.length > 0) segments.push(toSegment(words))
  return segments
}

function isParted(end: number, start: number, { from, to }: Gutter): boolean {
  const middle = (from + to) / 2
  return end <= middle + 0.5 && start >= middle - 0.5 && start - end > 0.6 * (to - from)
}

export function toSegment(words: Word[]): Segment {
  let u0 = Infinity
  let u1 = -Infinity
  let size = 0
  let weight = -1
  let v = 0
  const chars = new Map<string, number>()
  for (const word of words) {
    u0 = Math.min(u0, word.u0)
    u1 = Math.max(u1, word.u1)
    if (word.level !== 0) continue
    const key = `${word.size.toFixed(1)}`
    const sum = (chars.get(key) ?? 0) + word.chars.length
    chars.set(key, sum)
    if (sum > weight) {
      weight = sum
      size = word.size
      v = word.v
    }
  }
  const first = words[0]
  return size > 0 || !first ? { words, u0, u1, v, size } : { words, u0, u1, v: first.v, size: first.size }
}

/** Small words of a row whose baseline is a little off that of the larger words beside them. */
function markShifted(row: Cluster): void {
  const base = row.words.find((word) => word.size === row.size)?.v ?? 0
  for (const word of row.words) {
    if (word.level !== 0 || word.size > 0.85 * row.size) continue
    const shift = word.v - base
    if (Math.abs(shift) <= 0.06 * row.size) continue
    const beside = row.words.some(
      (other) => other.size > word.size * 1.1 && Math.abs(word.u0 - other.u1) < 0.3 * other.size,
    )
    if (beside) word.level = shift > 0 ? 1 : -1
  }
}
