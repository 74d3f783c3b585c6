import type { Place, Prose } from '../types'

/** Where a stretch of the prose stands on the page, with its words as printed (white space folded). */
export function placeIn(prose: Prose, start: number, end: number): Place {
  const lead = /^\s*/.exec(prose.text.slice(start, end))?.[0].length ?? 0
  return {
    source: 'text',
    page: prose.pageOf(start + lead),
    row: null,
    sheet: null,
    quote: prose.text.slice(start, end).replace(/\s+/g, ' ').trim(),
    boxes: prose.boxesOf(start + lead, end),
  }
}
