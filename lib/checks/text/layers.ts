import type { Frame, Word } from './words'

/**
 * Removes a hidden copy of the text: a page of an earlier version placed as a picture brings its own text
 * with it, in fonts of its own, over the page's text. Words of a font go where a good part of them covers
 * words in fonts that are used on more pages.
 */
export function dropHiddenLayers(frames: readonly Frame[]): Frame[] {
  const spread = countPages(frames)
  return frames.map((frame) => {
    const hidden = findHiddenFonts(frame, spread)
    if (hidden.size === 0) return frame
    return { ...frame, words: frame.words.filter((word) => !hidden.has(word.font)) }
  })
}

function countPages(frames: readonly Frame[]): Map<string, number> {
  const pages = new Map<string, number>()
  for (const frame of frames)
    for (const font of new Set(frame.words.map((word) => word.font)))
      pages.set(font, (pages.get(font) ?? 0) + 1)
  return pages
}

function findHiddenFonts(frame: Frame, spread: ReadonlyMap<string, number>): Set<string> {
  const long = frame.words.filter((word) => word.chars.length >= 3).sort((a, b) => b.v - a.v)
  const covering = new Map<string, number>()
  for (const [index, word] of long.entries()) {
    for (let at = index + 1; at < long.length; at++) {
      const other = long[at]
      if (!other || word.v - other.v > 0.6 * word.size) break
      if (!covers(word, other)) continue
      const rarer = isRarer(word, other, spread) ? word.font : other.font
      covering.set(rarer, (covering.get(rarer) ?? 0) + 1)
    }
  }
  const total = new Map<string, number>()
  for (const word of long) total.set(word.font, (total.get(word.font) ?? 0) + 1)
  const hidden = new Set<string>()
  for (const [font, count] of covering)
    if (count >= 6 && count >= 0.2 * (total.get(font) ?? 0)) hidden.add(font)
  return hidden.size > 0 ? addCompanions(frame, hidden, spread) : hidden
}

/** Fonts that are drawn only among the hidden text, on no more pages than it. */
function addCompanions(frame: Frame, hidden: Set<string>, spread: ReadonlyMap<string, number>): Set<string> {
  const pages = Math.max(...[...hidden].map((font) => spread.get(font) ?? 0))
  const ranges = new Map<string, [first: number, last: number]>()
  for (const { font, order } of frame.words) {
    const [first, last] = ranges.get(font) ?? [order, order]
    ranges.set(font, [Math.min(first, order), Math.max(last, order)])
  }
  const spans = [...hidden].flatMap((font) => ranges.get(font) ?? [])
  const [from, to] = [Math.min(...spans) - 8, Math.max(...spans) + 8]
  const companions = [...ranges].filter(
    ([font, [first, last]]) => first >= from && last <= to && (spread.get(font) ?? 0) <= pages,
  )
  return new Set([...hidden, ...companions.map(([font]) => font)])
}

function covers(a: Word, b: Word): boolean {
  if (a.font === b.font) return false
  const ratio = a.size / b.size
  if (ratio < 0.8 || ratio > 1.25) return false
  return Math.min(a.u1, b.u1) - Math.max(a.u0, b.u0) > 0.4 * Math.min(a.u1 - a.u0, b.u1 - b.u0)
}

function isRarer(a: Word, b: Word, spread: ReadonlyMap<string, number>): boolean {
  const [pagesA, pagesB] = [spread.get(a.font) ?? 0, spread.get(b.font) ?? 0]
  return pagesA === pagesB ? a.order > b.order : pagesA < pagesB
}
