import type { Word } from './words'

/**
 * A stretch of one line without a wide gap: words in reading order on a common baseline. `v` is the
 * baseline and `size` the size of its unraised text.
 */
export type Segment = { words: Word[]; u0: number; u1: number; v: number; size: number }

/** Gap, as a share of the size, from which two words may belong to different cells or columns. */
export const WIDE_GAP = 0.85

/**
 * Segments of a frame, from the top. Words are clustered by baseline first; small raised or lowered words
 * that touch a word of a larger line are moved into it. `gutters`: abscissas no segment may cross by a gap.
 */
export function findSegments(words: readonly Word[], gutters: readonly number[] = []): Segment[] {
  return attachRaised(clusterByBaseline(words)).flatMap((row) => splitRow(row, gutters))
}

/** Rows of words by baseline; a row's baseline is that of its widest size. */
function clusterByBaseline(words: readonly Word[]): Word[][] {
  const sorted = [...words].sort((a, b) => b.v - a.v || a.u0 - b.u0)
  const rows: Word[][] = []
  let row: Word[] = []
  let top = 0
  for (const word of sorted) {
    const near = row.length > 0 && top - word.v <= 0.22 * Math.min(word.size, sizeOf(row))
    if (near) row.push(word)
    else {
      if (row.length > 0) rows.push(row)
      row = [word]
      top = word.v
    }
  }
  if (row.length > 0) rows.push(row)
  return rows
}

function sizeOf(row: readonly Word[]): number {
  let size = 0
  for (const word of row) size = Math.max(size, word.size)
  return size
}

/** Moves small words that stand at the shoulder or foot of a larger neighbour into that neighbour's row. */
function attachRaised(rows: Word[][]): Word[][] {
  rows.forEach(markShifted)
  const sized = rows.map((row) => ({ words: row, v: row[0]?.v ?? 0, keep: [] as Word[], size: sizeOf(row) }))
  for (const [index, row] of sized.entries()) {
    const pending = [...row.words].sort((a, b) => a.u0 - b.u0)
    let host: (typeof sized)[number] | null = null
    let last: Word | null = null
    for (const word of pending) {
      const follows: boolean =
        host !== null && last !== null && word.u0 - last.u1 < 0.45 * word.size && word.size < 0.92 * host.size
      if (!follows) host = findHost(sized, index, word)
      if (host) {
        word.level = word.v > hostBaseline(host.words, word) ? 1 : -1
        host.keep.push(word)
      } else row.keep.push(word)
      last = word
    }
  }
  return sized.map((row) => row.keep).filter((row) => row.length > 0)
}

function findHost<R extends { words: Word[]; v: number; size: number }>(
  rows: R[],
  index: number,
  word: Word,
): R | null {
  for (const step of [1, -1]) {
    for (let at = index + step; at >= 0 && at < rows.length; at += step) {
      const row = rows[at]
      if (!row || Math.abs(row.v - word.v) > 0.75 * row.size) {
        if (row && Math.abs(row.v - word.v) > 30) break
        continue
      }
      for (const other of row.words) {
        const shift = word.v - other.v
        const fits = shift > 0 ? shift < 0.7 * other.size : -shift < 0.4 * other.size
        const smaller = word.size < 0.85 * other.size
        const beside = word.u0 - other.u1 < 0.3 * other.size && word.u0 - other.u1 > -0.35 * other.size
        if (fits && smaller && beside) return row
      }
    }
  }
  return null
}

function hostBaseline(words: readonly Word[], near: Word): number {
  let best = near.v
  let distance = Infinity
  for (const word of words) {
    if (word.size <= near.size) continue
    const d = Math.abs(near.u0 - word.u1)
    if (d < distance) {
      distance = d
      best = word.v
    }
  }
  return best
}

function splitRow(row: Word[], gutters: readonly number[]): Segment[] {
  const sorted = [...row].sort((a, b) => a.u0 - b.u0 || a.u1 - b.u1)
  const segments: Segment[] = []
  let words: Word[] = []
  let end = -Infinity
  for (const word of sorted) {
    const size = Math.max(word.size, words.at(-1)?.size ?? 0)
    const start = Math.max(end, -1e9)
    const crosses = gutters.some((g) => start <= g + 0.5 && word.u0 >= g - 0.5) && word.u0 - end > 0.3 * size
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
function markShifted(row: Word[]): void {
  const size = sizeOf(row)
  const base = row.find((word) => word.size === size)?.v ?? 0
  for (const word of row) {
    if (word.level !== 0 || word.size > 0.85 * size) continue
    const shift = word.v - base
    const beside = row.some(
      (other) => other.size > word.size * 1.1 && Math.abs(word.u0 - other.u1) < 0.3 * other.size,
    )
    if (beside && Math.abs(shift) > 0.06 * size) word.level = shift > 0 ? 1 : -1
  }
}
