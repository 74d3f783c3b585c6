/** A name as the manuscript's tables give it, ready to be looked for in sentences. */
export type KnownName = { name: string; pattern: RegExp }

/** Prepares names for `findKnown`: longest first, so that 'Biochar + compost' is seen before 'Biochar'. */
export function prepareNames(names: Iterable<string>): KnownName[] {
  const unique = new Map([...names].map((name) => [name.trim().toLowerCase(), name.trim()] as const))
  return [...unique.values()]
    .filter((name) => name.length >= 1 && name.length <= 60 && /[A-Za-z0-9]/.test(name))
    .sort((a, b) => b.length - a.length)
    .map((name) => ({ name, pattern: toPattern(name) }))
}

function toPattern(name: string): RegExp {
  const body = name
    .replace(/[.*+?^${}()|[\]\\/]/g, '\\$&')
    .replace(/(?<=[A-Za-z0-9)°])[\s_–−-]+/g, '[\\s_–-]*')
    .replace(/^−/, '-')
  // single letters and numbers count only as printed, words in either case
  return new RegExp(
    String.raw`(?<![A-Za-z0-9.]|(?<![A-Za-z0-9)]\s?)-)${body}(?:'s|s)?(?![A-Za-z0-9]|\.\d)`,
    name.length <= 2 ? 'g' : 'gi',
  )
}

/** The known names in a clause in the order of their mention, each once; overlapping shorter names do not count. */
export function findKnown(clause: string, known: readonly KnownName[]): string[] {
  const taken: { start: number; end: number; name: string }[] = []
  for (const { name, pattern } of known)
    for (const match of clause.matchAll(pattern)) {
      const start = match.index
      const end = start + match[0].length
      if (!taken.some((other) => start < other.end && other.start < end)) taken.push({ start, end, name })
    }
  return [...new Set(taken.sort((a, b) => a.start - b.start).map(({ name }) => name))]
}

/** A pair in one table cell: 'A vs B', 'A - B', 'A–B', 'A:B', 'A/B', 'A versus B', 'A v B', 'B-A', 'A vs. B', 'A & B', 'A × B' is none. */
export function splitPair(cell: string): [string, string] | null {
  const text = cell.trim().replace(/\s+/g, ' ')
  for (const separator of [
    /\s(?:vs\.?|versus|v\.?|against|compared (?:with|to)|minus)\s/i,
    /\s[-−–—:/|~]\s/,
    /\s?[–—:]\s?/,
    /\s(?:and|&|to|from)\s/,
    /(?<=\w)\/(?=\w)/,
    /(?<=\w)\s?[-−]\s?(?=\w)/,
    /_vs_|\.vs\.|(?<=[a-z0-9])_(?=[a-z0-9])/i,
  ]) {
    const parts = text.split(separator)
    const [a = '', b = ''] = parts
    if (parts.length === 2 && a.trim() !== '' && b.trim() !== '') return [a.trim(), b.trim()]
  }
  return null
}
