import type { Segment } from './segments'
import type { Frame } from './words'

/** A gutter between columns: the left edge of the column at its right, and where the column at its left ends. */
export type Gutter = { from: number; to: number }

/**
 * Gutters of a page from the left edges that many lines of prose share while other lines end before them.
 * Short pieces (cells, labels) do not count, so that a table's columns are not taken for columns of text.
 */
export function findGutters(frame: Frame, segments: readonly Segment[]): Gutter[] {
  const width = frame.right - frame.left
  const lines = segments.filter((s) => s.u1 - s.u0 > 0.13 * width && s.words.length >= 2)
  const edges = countEdges(lines)
  const gutters: Gutter[] = []
  for (const [edge, starters] of edges) {
    if (starters.length < 6) continue
    const top = Math.max(...starters.map((s) => s.v))
    const bottom = Math.min(...starters.map((s) => s.v))
    if (top - bottom < 0.1 * (frame.top - frame.bottom)) continue
    const beside = lines.filter((s) => s.u1 < edge - 3 && s.v <= top + 20 && s.v >= bottom - 20)
    if (beside.length < 6) continue
    const crossing = lines.filter((s) => s.u0 < edge - 4 && s.u1 > edge + 4 && s.v <= top && s.v >= bottom)
    if (crossing.length > 0.5 * starters.length) continue
    const ends = beside.map((s) => s.u1).sort((a, b) => a - b)
    const from = ends[Math.floor(0.97 * (ends.length - 1))] ?? edge
    const leftEdge = Math.min(...beside.map((s) => s.u0))
    if (edge - leftEdge < 0.15 * width || edge - from > 0.2 * width) continue
    gutters.push({ from: Math.min(from, edge - 3), to: edge })
  }
  return thin(gutters)
}

function countEdges(lines: readonly Segment[]): [number, Segment[]][] {
  const sorted = [...lines].sort((a, b) => a.u0 - b.u0)
  const groups: [number, Segment[]][] = []
  for (const line of sorted) {
    const group = groups.at(-1)
    if (group && line.u0 - group[0] < 2.5) group[1].push(line)
    else groups.push([line.u0, [line]])
  }
  return groups
}

/** Edges that lie close together are a column's margin and its indents: the leftmost counts. */
function thin(gutters: readonly Gutter[]): Gutter[] {
  const kept: Gutter[] = []
  for (const gutter of gutters) {
    const last = kept.at(-1)
    if (!last || gutter.to - last.to > 60) kept.push(gutter)
  }
  return kept
}
