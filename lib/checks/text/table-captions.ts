import { captionNumber, textOf } from './captions'
import type { Lane, Row } from './rows'

/** `fine`: the same rows cut into cells; `tabular`: which of them look like rows of a table. */
export type Reading = {
  lane: Lane
  rows: readonly Row[]
  fine: Row[]
  tabular: boolean[]
  pitch: number
  bodySize: number
}

export type CaptionSpan = { from: number; end: number; number: string }

export function findCaptionAbove(rows: readonly Row[], from: number, free: number): CaptionSpan | null {
  for (let at = from - 1; at >= Math.max(free, from - 8); at--) {
    const row = rows[at]
    const next = rows[at + 1]
    if (!row || !next || row.v - next.v > 4.5 * row.size) return null
    const number = captionNumber(textOf(row))
    if (number !== null) return { from: at, end: endOfCaption(rows, at, from), number }
  }
  return null
}

/** A caption runs on while its lines are as close as lines are; what follows it, up to the table, is header. */
function endOfCaption(rows: readonly Row[], at: number, from: number): number {
  let end = at + 1
  while (end < from) {
    const row = rows[end]
    const before = rows[end - 1]
    if (!row || !before) break
    const apart = before.v - row.v > 1.45 * before.size || Math.abs(row.size - before.size) > 0.7
    if (apart && !(end === at + 1 && isBareNumber(textOf(before)))) break
    end++
  }
  return end
}

/** 'TABLE II' alone on its line: the title follows on the next. */
function isBareNumber(text: string): boolean {
  return captionNumber(text) !== null && !/\p{L}{3,}.*\p{L}{3,}/u.test(text)
}

/** A caption under the table; one with a table under it belongs to that. */
export function findCaptionBelow({ rows, tabular, pitch }: Reading, end: number): CaptionSpan | null {
  const row = rows[end]
  const before = rows[end - 1]
  if (!row || !before || before.v - row.v > 3 * pitch) return null
  const number = captionNumber(textOf(row))
  if (number === null) return null
  let last = end + 1
  while (last < rows.length) {
    const next = rows[last]
    const prior = rows[last - 1]
    if (!next || !prior || prior.v - next.v > 1.4 * prior.size || Math.abs(next.size - prior.size) > 0.5)
      break
    if (tabular[last]) return null
    last++
  }
  const [foot, under] = [rows[last - 1], rows[last]]
  const heads = foot && under && foot.v - under.v < 2.6 * under.size && tabular[last] && tabular[last + 1]
  return heads ? null : { from: end, end: last, number }
}

/** A caption that stands below the table's notes. */
export function findCaptionWithin(reading: Reading, from: number, to: number): CaptionSpan | null {
  for (let at = from + 1; at < Math.min(to, reading.rows.length); at++) {
    const found = findCaptionBelow(reading, at)
    if (found) return found
  }
  return null
}
