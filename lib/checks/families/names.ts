/**
 * A group's or outcome's name in the form in which names are compared: lower case, one kind of dash and space, no
 * article, no closing punctuation, no bracketed remark.
 */
export function normaliseName(name: string): string {
  return (
    name
      .normalize('NFKC')
      .toLowerCase()
      .replace(/[‐‑‒–—−]/g, '-')
      // a bracketed remark behind a name: "control (n = 12)"
      .replace(/\s*\([^)]*\)\s*$/, '')
      // articles and nouns that say only that it is a group: "the control group"
      .replace(/\b(?:the|an?|group|groups|condition|arm)\b/g, ' ')
      .replace(/[“”"'’*†‡.,;:]+/g, ' ')
      .replace(/\s+/g, ' ')
      .trim()
  )
}

/** The words of a name; signs such as "+" and "-20" are kept, as they tell names apart. */
export function wordsOf(name: string): string[] {
  return normaliseName(name)
    .split(/[\s/]+/)
    .filter((word) => word !== '')
}

/** Plural and hyphen do not tell two names apart; in the plural the name stays itself. */
function isSameWord(a: string, b: string): boolean {
  return a === b || `${a}s` === b || a === `${b}s`
}

/** Every word of the shorter name is in the longer one. */
export function isWithin(short: string, long: string): boolean {
  const inside = wordsOf(short)
  const outside = wordsOf(long)
  return inside.length > 0 && inside.every((word) => outside.some((other) => isSameWord(word, other)))
}

/** Whether two names can stand for one thing: equal, or one holds every word of the other. */
export function isSameName(a: string, b: string): boolean {
  return normaliseName(a) === normaliseName(b) || isWithin(a, b) || isWithin(b, a)
}

/**
 * Leads each name to the one under which it is kept. Exact forms win; else a name that is within exactly one
 * other name, or holds exactly one, is taken for that one ("untreated control" for "control").
 */
export function canonicalNames(names: readonly string[]): (name: string) => string {
  const counts = new Map<string, number>()
  for (const name of names) {
    const normal = normaliseName(name)
    counts.set(normal, (counts.get(normal) ?? 0) + 1)
  }
  const known = [...counts.keys()]
  const lead = new Map<string, string>()
  for (const name of known) {
    const alike = known.filter((other) => other !== name && (isWithin(name, other) || isWithin(other, name)))
    const [only] = alike
    const often = (counts.get(only ?? '') ?? 0) > (counts.get(name) ?? 0)
    if (alike.length === 1 && only !== undefined && often) lead.set(name, only)
  }
  return (name) => {
    const normal = normaliseName(name)
    return lead.get(normal) ?? normal
  }
}
