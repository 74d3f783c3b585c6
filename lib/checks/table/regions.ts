import { holdsData, holdsNumber, isHead } from './head'

/** Part of a sheet, half-open in both directions: [top, bottom) × [left, right), 0-based. */
export type Region = { top: number; bottom: number; left: number; right: number }

type Span = { left: number; right: number }
type Texts = readonly (readonly string[])[]

/**
 * The parts of a sheet that stand side by side, each with heads and names of its own; most sheets are one part. Parts
 * are cut at blank columns, over the whole sheet or between blank rows; a blank column within one table cuts nothing.
 * `rows`: the cells' texts.
 */
export function findRegions(rows: Texts): Region[] {
  const width = rows.reduce((widest, row) => Math.max(widest, row.length), 0)
  const whole: Region = { top: 0, bottom: rows.length, left: 0, right: width }
  const spans = cutColumns(rows, whole)
  if (spans.length > 1) return spans.map((span) => ({ ...whole, ...span }))
  return cutBands(rows, width)
}

/** Bands between blank rows; those that hold one table beside another are cut, the others belong to what is above. */
function cutBands(rows: Texts, width: number): Region[] {
  const regions: Region[] = []
  let beside: Span[] = []
  for (const band of listBands(rows, width)) {
    const spans = cutColumns(rows, band)
    const previous = regions[regions.length - 1]
    if (spans.length > 1) {
      const top = previous && isTitles(rows, previous) ? (regions.pop()?.top ?? band.top) : band.top
      regions.push(...spans.map((span) => ({ ...band, ...span, top })))
      beside = spans
    } else if (beside.length > 1 && goesOn(rows, band, beside)) {
      for (const region of regions.slice(-beside.length)) region.bottom = band.bottom
    } else if (previous && beside.length === 0 && !isTitles(rows, band)) previous.bottom = band.bottom
    else {
      regions.push(band)
      beside = []
    }
  }
  return joinPlain(regions, width)
}

/** Parts over the full width that follow each other are one. */
function joinPlain(regions: readonly Region[], width: number): Region[] {
  const joined: Region[] = []
  for (const region of regions) {
    const last = joined[joined.length - 1]
    if (last && isFull(last, width) && isFull(region, width)) last.bottom = region.bottom
    else joined.push({ ...region })
  }
  return joined
}

const isFull = ({ left, right }: Region, width: number): boolean => left === 0 && right === width

function listBands(rows: Texts, width: number): Region[] {
  const bands: Region[] = []
  rows.forEach((row, r) => {
    if (row.every((cell) => cell === '')) return
    const last = bands[bands.length - 1]
    if (last?.bottom === r) last.bottom = r + 1
    else bands.push({ top: r, bottom: r + 1, left: 0, right: width })
  })
  return bands
}

/** The columns of a region parted at blank ones, where each part can stand as a table of its own. */
function cutColumns(rows: Texts, { top, bottom, left, right }: Region): Span[] {
  const within = rows.slice(top, bottom)
  const filled = new Array<boolean>(right).fill(false)
  for (const row of within)
    row.forEach((cell, c) => {
      if (cell !== '') filled[c] = true
    })
  const spans: Span[] = []
  for (let c = left; c < right; c += 1) {
    if (!filled[c]) continue
    const last = spans[spans.length - 1]
    if (last?.right === c) last.right = c + 1
    else spans.push({ left: c, right: c + 1 })
  }
  if (spans.length < 2) return [{ left, right }]
  const parts: Span[] = []
  for (const span of spans) {
    const last = parts[parts.length - 1]
    if (last && !(standsAlone(within, span) && standsAlone(within, last))) last.right = span.right
    else parts.push({ ...span })
  }
  return parts.length < 2 ? [{ left, right }] : parts
}

/** A line of heads, names in the first column below it, and numbers in another. */
function standsAlone(rows: Texts, { left, right }: Span): boolean {
  const lines = rows.map((row) => row.slice(left, right)).filter((row) => row.some((cell) => cell !== ''))
  const head = lines.findIndex(isHead)
  if (head < 0) return false
  const body = lines.slice(head + 1).filter((row) => !isHead(row))
  const named = body.filter(([first = '']) => first !== '' && !holdsData(first))
  return named.length >= 0.5 * body.length && body.some((row) => row.slice(1).some(holdsNumber))
}

/** Lines of titles alone: no heads and no numbers. */
function isTitles(rows: Texts, { top, bottom }: Region): boolean {
  return bottom - top <= 2 && !rows.slice(top, bottom).some((row) => isHead(row) || row.some(holdsData))
}

/** Rows below a blank line that belong to the tables side by side above it. */
function goesOn(rows: Texts, { top, bottom }: Region, spans: readonly Span[]): boolean {
  const within = rows.slice(top, bottom)
  const inside = (c: number) => spans.some(({ left, right }) => c >= left && c < right)
  return (
    !within.some(isHead) &&
    within.every((row) => row.every((cell, c) => cell === '' || inside(c))) &&
    within.some((row) => row.some(holdsNumber))
  )
}
