import type { Segment } from './segments'

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
