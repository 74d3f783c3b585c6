import { captionNumber, isFigureCaption, textOf } from './captions'
import { toRow, toRows, type Lane, type Row } from './rows'
import { findSegments, type Gutter, type Segment } from './segments'
import { findTables, type FoundTable } from './tables'
import type { Frame } from './words'

/** What follows what on a page: lines of text with the lane they stand in, and tables. */
export type FlowItem = { kind: 'line'; row: Row; lane: Lane } | { kind: 'table'; table: FoundTable }

/** The reading order of a frame: bands between full-width rows from the top, lanes of a band from the left. */
export function readFlow(
  frame: Frame,
  rough: readonly Segment[],
  gutters: readonly Gutter[],
  bodySize: number,
): FlowItem[] {
  const segments = gutters.length > 0 ? findSegments(frame.words, gutters) : rough
  const left = Math.min(...segments.map((s) => s.u0))
  const right = Math.max(...segments.map((s) => s.u1))
  if (gutters.length === 0) return readLane({ left, right, rows: toRows(segments) }, bodySize)
  const wide = findWideTables(segments, gutters, left, right, bodySize)
  const used = new Set(wide.flatMap((table) => table.wide))
  const rest = segments.filter((segment) => !used.has(segment))
  return orderBands(
    rest,
    wide.map((w) => w.table),
    gutters,
    left,
    right,
    bodySize,
  )
}

function readLane(lane: Lane, bodySize: number): FlowItem[] {
  const tables = findTables(lane, bodySize)
  const first = new Map<Row, FoundTable>()
  const used = new Set<Row>()
  for (const table of tables) {
    const all = [...table.caption, ...table.rows, ...table.notes]
    first.set(table.anchor, table)
    for (const row of all) used.add(row)
  }
  const items: FlowItem[] = []
  for (const row of lane.rows) {
    const table = first.get(row)
    if (table) items.push({ kind: 'table', table })
    else if (!used.has(row)) items.push({ kind: 'line', row, lane })
  }
  return items
}

type WideTable = { table: FoundTable; wide: Segment[] }

/** Tables that span columns of text: rows with cells on both sides of a gutter and no prose in them. */
function findWideTables(
  segments: readonly Segment[],
  gutters: readonly Gutter[],
  left: number,
  right: number,
  bodySize: number,
): WideTable[] {
  const rows = toRows(segments)
  const bounds = [left, ...gutters.map((g) => g.to), right + 1]
  const isProse = (row: Row) =>
    row.segments.some((s) => {
      const lane = laneOf(s, gutters)
      if (lane === null || s.words.length < 5) return false
      const width = (bounds[lane + 1] ?? right) - (bounds[lane] ?? left)
      const alone = row.segments.every((other) => other === s || laneOf(other, gutters) !== lane)
      return alone && s.u1 - s.u0 > 0.7 * width
    })
  const spans = (row: Row) =>
    new Set(row.segments.map((s) => laneOf(s, gutters))).size > 1 ||
    row.segments.some((s) => laneOf(s, gutters) === null)
  const tables: WideTable[] = []
  let at = 0
  let floor = 0
  while (at < rows.length) {
    const row = rows[at]
    if (!row || isProse(row) || !spans(row) || row.segments.length < 3) {
      at++
      continue
    }
    let from = at
    while (from > floor && !stops(rows, from - 1, isProse)) from--
    let end = at + 1
    let last = at + 1
    while (end < rows.length && !stops(rows, end, isProse) && gapBefore(rows, end) < 3.5) {
      const next = rows[end]
      end++
      if (next && spans(next)) last = end
    }
    const zone = rows.slice(from, Math.min(end, last + 6))
    const tabular = zone.filter((r) => r.segments.length >= 3 && spans(r)).length
    if (tabular >= 3 && !hasTwoCaptions(zone, gutters)) {
      for (const table of findTables({ left, right, rows: zone }, bodySize)) {
        const wide = [...table.caption, ...table.rows, ...table.notes].flatMap((r) => r.segments)
        if (table.rows.some(spans)) tables.push({ table, wide })
      }
    }
    at = end
    floor = end
  }
  return tables
}

function stops(rows: readonly Row[], at: number, isProse: (row: Row) => boolean): boolean {
  const row = rows[at]
  return !row || isProse(row) || isFigureCaption(textOf(row))
}

function gapBefore(rows: readonly Row[], at: number): number {
  const row = rows[at]
  const before = rows[at - 1]
  return row && before ? (before.v - row.v) / row.size : 0
}

function hasTwoCaptions(zone: readonly Row[], gutters: readonly Gutter[]): boolean {
  return zone.some((row) => {
    const lanes = row.segments
      .filter((s) => captionNumber(textOf(toRow([s]))) !== null)
      .map((s) => laneOf(s, gutters))
    return new Set(lanes).size > 1
  })
}

/** Index of the column a segment stands in, or null where it crosses a gutter. */
function laneOf(segment: Segment, gutters: readonly Gutter[]): number | null {
  let lane = 0
  for (const gutter of gutters) {
    const middle = (gutter.from + gutter.to) / 2
    if (segment.u0 < middle && segment.u1 > middle + 3) return null
    if (segment.u0 >= middle - 3) lane++
  }
  return lane
}

function orderBands(
  segments: readonly Segment[],
  tables: readonly FoundTable[],
  gutters: readonly Gutter[],
  left: number,
  right: number,
  bodySize: number,
): FlowItem[] {
  const wide: { v: number; row: Row | null; table: FoundTable | null }[] = tables.map((table) => ({
    v: table.anchor.v,
    row: null,
    table,
  }))
  const inLane: Segment[][] = Array.from({ length: gutters.length + 1 }, () => [])
  const crossing: Segment[] = []
  for (const segment of segments) {
    const lane = laneOf(segment, gutters)
    if (lane === null) crossing.push(segment)
    else inLane[lane]?.push(segment)
  }
  takeLastLines(crossing, inLane, right - left)
  const crossingRows = toRows(crossing)
  for (const row of crossingRows) wide.push({ v: row.v, row, table: null })
  wide.sort((a, b) => b.v - a.v)
  const bounds = [left, ...gutters.map((g) => g.to), right]
  const ends = [left, ...gutters.map((g) => g.from), right]
  const items: FlowItem[] = []
  const takeLanes = (above: number) => {
    inLane.forEach((lane, i) => {
      const taken = lane.filter((s) => s.v > above)
      inLane[i] = lane.filter((s) => s.v <= above)
      if (taken.length === 0) return
      const rows = toRows(taken)
      items.push(...readLane({ left: bounds[i] ?? left, right: ends[i + 1] ?? right, rows }, bodySize))
    })
  }
  let pending: Row[] = []
  const flush = () => {
    if (pending.length > 0) items.push(...readLane({ left, right, rows: pending }, bodySize))
    pending = []
  }
  for (const block of wide) {
    if (inLane.some((lane) => lane.some((s) => s.v > block.v + 2))) {
      flush()
      takeLanes(block.v + 2)
    }
    if (block.row) {
      const beside: Segment[] = []
      inLane.forEach((lane, i) => {
        const same = lane.filter((s) => Math.abs(s.v - block.v) <= 2)
        beside.push(...same)
        inLane[i] = lane.filter((s) => !same.includes(s))
      })
      pending.push(toRow([...block.row.segments, ...beside]))
    }
    if (block.table) {
      flush()
      items.push({ kind: 'table', table: block.table })
    }
  }
  flush()
  takeLanes(-Infinity)
  return items
}

/** The last, short line of a full-width paragraph crosses no gutter and yet belongs to it. */
function takeLastLines(crossing: Segment[], lanes: Segment[][], width: number): void {
  lanes.forEach((lane, index) => {
    for (const segment of lane) {
      const above = crossing.some((c) => {
        const drop = c.v - segment.v
        const beneath = drop > 0.8 * segment.size && drop < 1.5 * segment.size
        return (
          beneath &&
          Math.abs(c.size - segment.size) < 0.3 &&
          Math.abs(c.u0 - segment.u0) < 2 &&
          c.u1 - c.u0 > 0.55 * width
        )
      })
      const alone = lanes.every(
        (other, i) => i === index || !other.some((o) => Math.abs(o.v - segment.v) < 0.8 * segment.size),
      )
      if (above && alone) {
        crossing.push(segment)
        lanes[index] = (lanes[index] ?? []).filter((s) => s !== segment)
      }
    }
  })
}
