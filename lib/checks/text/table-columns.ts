import type { Row } from './rows'
import { WIDE_GAP } from './segments'
import type { Word } from './words'

/** A column's extent; columns are apart from each other by the gaps that the rows have in common. */
export type Column = { from: number; to: number }

/**
 * Columns as the stretches between the gaps that (nearly) all full rows share. A gap counts when it is wider
 * than a word space in common, and wide in at least one row.
 */
export function findColumns(rows: readonly Row[]): Column[] {
  let best = measureColumns(rows)
  // rows of a header may reach over several columns: they do not count where the rows below have more
  for (let skip = 1; skip <= 3 && rows.length - skip >= 2; skip++) {
    const below = measureColumns(rows.slice(skip))
    if (below.length > best.length) best = below
  }
  return best
}

function measureColumns(rows: readonly Row[]): Column[] {
  const most = Math.max(0, ...rows.map((row) => row.segments.length))
  const full = rows.filter((row) => row.segments.length >= Math.max(2, Math.ceil(0.6 * most)))
  if (full.length === 0) return []
  const size = Math.max(...full.map((row) => row.size))
  const words = full.map((row) => row.segments.flatMap((segment) => segment.words))
  const labels = new Set(
    full.flatMap((row) => (row.segments.length > 1 ? (row.segments[0]?.words ?? []) : [])),
  )
  const left = Math.min(...full.map((row) => row.u0))
  const right = Math.max(...full.map((row) => row.u1))
  const step = 0.5
  const cover = new Uint16Array(Math.max(1, Math.ceil((right - left) / step) + 1))
  const coverOfLabels = new Uint16Array(cover.length)
  for (const row of words) {
    for (const word of row) {
      const a = Math.max(0, Math.floor((word.u0 - left) / step))
      const b = Math.min(cover.length - 1, Math.ceil((word.u1 - left) / step))
      const into = labels.has(word) ? coverOfLabels : cover
      for (let i = a; i < b; i++) into[i] = (into[i] ?? 0) + 1
    }
  }
  const allowed = Math.floor(full.length * 0.08)
  // a long label may reach into the gap that follows the labels
  const overrun = Math.max(allowed, Math.floor(full.length * 0.15))
  const gaps: Column[] = []
  let open = -1
  for (let i = 0; i < cover.length; i++) {
    const others = cover[i] ?? 0
    const clear = others <= allowed && others + (coverOfLabels[i] ?? 0) <= (others === 0 ? overrun : allowed)
    if (clear && open < 0) open = i
    if (!clear && open >= 0) {
      const gap = { from: left + open * step, to: left + i * step }
      if (gap.to - gap.from >= 0.35 * size && isApart(words, gap, size)) gaps.push(gap)
      open = -1
    }
  }
  const edges = [left, ...gaps.flatMap((gap) => [gap.from, gap.to]), right]
  const columns: Column[] = []
  for (let i = 0; i + 1 < edges.length; i += 2) columns.push({ from: edges[i] ?? 0, to: edges[i + 1] ?? 0 })
  return columns
}

/** Wide in at least one row, or clearly wider than a word space in all of several rows of numbers. */
function isApart(rows: readonly (readonly Word[])[], gap: Column, size: number): boolean {
  const widths = rows.map((row) => gapWidth(row, gap)).filter((width) => width > 0)
  if (widths.some((width) => width > WIDE_GAP * size)) return true
  return widths.length >= 2 && gap.to - gap.from > 0.42 * size && widths.every((width) => width > 0.45 * size)
}

function gapWidth(row: readonly Word[], gap: Column): number {
  let before = -Infinity
  let after = Infinity
  for (const word of row) {
    if (word.u1 <= gap.from + 1) before = Math.max(before, word.u1)
    if (word.u0 >= gap.to - 1) after = Math.min(after, word.u0)
  }
  return Number.isFinite(after - before) ? after - before : 0
}

/** How many columns a row fills when every word falls into one of them; null where a word stands in a gap. */
export function cutAtColumns(row: Row, columns: readonly Column[]): number | null {
  const filled = new Set<number>()
  for (const segment of row.segments)
    for (const word of segment.words) {
      const over = columns.flatMap((c, i) =>
        Math.min(word.u1, c.to) - Math.max(word.u0, c.from) > 1 ? [i] : [],
      )
      if (over.length > 1) return null
      const [only] = over
      if (only !== undefined) filled.add(only)
    }
  return filled.size
}
