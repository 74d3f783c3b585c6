import type { Gutter, Segment } from './segments'
import type { Frame } from './words'

/**
 * Gutters of every frame. A gutter that the document uses elsewhere is taken with less evidence, for pages
 * that hold few lines.
 */
export function findAllGutters(
  frames: readonly Frame[],
  segments: readonly (readonly Segment[])[],
): Gutter[][] {
  const lines = frames.map((frame, i) => toLines(frame, segments[i] ?? []))
  const found = frames.map((frame, i) => findGutters(frame, segments[i] ?? [], lines[i] ?? []))
  const known = findRepeated(found)
  return found.map((gutters, i) => {
    const own = lines[i] ?? []
    const frame = frames[i]
    if (gutters.length > 0 || !frame) return gutters
    const shared = known.filter((gutter) => holds(gutter, own) && gutter.to < frame.right)
    return shared.length > 0 ? shared : gutters
  })
}

/** Lines of prose. Short pieces (cells, labels) do not count, so that a table's columns are not taken for text's. */
function toLines(frame: Frame, segments: readonly Segment[]): Segment[] {
  return segments.filter((s) => s.u1 - s.u0 > 0.13 * (frame.right - frame.left) && s.words.length >= 2)
}

/** Left edges that many lines share while other lines end before them. */
function findGutters(frame: Frame, segments: readonly Segment[], lines: readonly Segment[]): Gutter[] {
  const width = frame.right - frame.left
  const gutters: Gutter[] = []
  for (const [edge, starters] of countEdges(lines)) {
    if (starters.length < 6) continue
    const top = Math.max(...starters.map((s) => s.v))
    const bottom = Math.min(...starters.map((s) => s.v))
    if (top - bottom < 0.1 * (frame.top - frame.bottom)) continue
    const beside = lines.filter((s) => s.u1 < edge - 3 && s.v <= top + 20 && s.v >= bottom - 20)
    const crossing = lines.filter((s) => crosses(s, edge) && s.v <= top && s.v >= bottom)
    if (beside.length < 6 || crossing.length > 0.5 * starters.length) continue
    const ends = beside.map((s) => s.u1).sort((a, b) => a - b)
    const from = ends[Math.floor(0.97 * (ends.length - 1))] ?? edge
    const leftEdge = Math.min(...beside.map((s) => s.u0))
    if (edge - leftEdge < 0.15 * width || edge - from > 0.2 * width) continue
    gutters.push({ from: Math.min(from, edge - 3), to: findLeftmost(segments, from, edge, top, bottom) })
  }
  return thin(gutters)
}

function crosses(segment: Segment, edge: number): boolean {
  return segment.u0 < edge - 4 && segment.u1 > edge + 4
}

/** Numbers and marks that hang left of the lines (a list's, the references') begin the column. */
function findLeftmost(
  segments: readonly Segment[],
  from: number,
  edge: number,
  top: number,
  bottom: number,
): number {
  const starts = segments
    .filter((s) => s.u0 > from + 2 && s.u0 <= edge && s.v <= top + 2 && s.v >= bottom - 2)
    .map((s) => s.u0)
    .sort((a, b) => a - b)
  return starts.find((start, i) => (starts[i + 1] ?? Infinity) - start < 2) ?? edge
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

function findRepeated(found: readonly Gutter[][]): Gutter[] {
  const known: { gutter: Gutter; pages: number }[] = []
  for (const gutter of found.flat()) {
    const same = known.find((k) => Math.abs(k.gutter.to - gutter.to) < 4)
    if (same) same.pages++
    else known.push({ gutter, pages: 1 })
  }
  return known.filter(({ pages }) => pages >= 2).map(({ gutter }) => gutter)
}

function holds(gutter: Gutter, lines: readonly Segment[]): boolean {
  const starters = lines.filter((s) => s.u0 > gutter.to - 3 && s.u0 < gutter.to + 40).length
  const beside = lines.filter((s) => s.u1 < gutter.to - 3).length
  const crossing = lines.filter((s) => crosses(s, gutter.to)).length
  return starters >= 2 && beside >= 2 && crossing <= 0.5 * (starters + beside)
}
