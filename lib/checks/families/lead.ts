import type { ReadReport } from '../types'
import type { Comparison } from './comparison'

/** The results outrank tables, tables the rest of the text, the manuscript its results file. */
function rank({ place, section }: ReadReport): number {
  if (place.source === 'results-table') return 3
  if (place.source === 'pdf-table') return 1
  return section === 'results' ? 0 : 2
}

/** The report by which a comparison is quoted; null for none. */
export function leadOf({ items }: Pick<Comparison, 'items'>): ReadReport | null {
  const sorted = items.map(({ report }) => report).sort((a, b) => rank(a) - rank(b) || a.offset - b.offset)
  return sorted[0] ?? null
}
