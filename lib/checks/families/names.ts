/** Forms of names that were asked for before: in a long table each name is compared with every other. */
const forms = new Map<string, string>()
const splits = new Map<string, readonly string[]>()
const mostKept = 20_000

function recall<T>(kept: Map<string, T>, name: string, make: (name: string) => T): T {
  const known = kept.get(name)
  if (known !== undefined) return known
  if (kept.size >= mostKept) kept.clear()
  const made = make(name)
  kept.set(name, made)
  return made
}

/**
 * A group's or outcome's name in the form in which names are compared: lower case, one kind of dash and space, no
 * article, no closing punctuation, no bracketed remark.
 */
export function normaliseName(name: string): string {
  return recall(forms, name, makeForm)
}

function makeForm(name: string): string {
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
export function wordsOf(name: string): readonly string[] {
  return recall(splits, name, () =>
    normaliseName(name)
      .split(/[\s/]+/)
      .filter((word) => word !== ''),
  )
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
 * Leads each name to the one under which it is kept. Names of tables (`fixed`) stand as they are. A name of the text
 * that is no table's name, and is within exactly one other name or holds exactly one, is taken for that one
 * ("untreated control" for "control"), unless the two are compared with each other or with the same third group.
 */
export function canonicalNames(
  pairs: readonly (readonly [string, string])[],
  fixed: readonly (readonly [string, string])[],
): (name: string) => string {
  const normal = [...pairs, ...fixed].map(([a, b]) => [normaliseName(a), normaliseName(b)] as const)
  const kept = new Set(fixed.flat().map(normaliseName))
  const known = [...new Set(normal.flat())]
  const partners = (name: string) =>
    new Set(normal.flatMap(([a, b]) => (a === name ? [b] : b === name ? [a] : [])))
  const lead = new Map<string, string>()
  for (const name of known.filter((each) => !kept.has(each))) {
    const alike = known.filter((other) => other !== name && (isWithin(name, other) || isWithin(other, name)))
    const [only] = alike
    if (alike.length !== 1 || only === undefined || lead.has(only)) continue
    const [mine, others] = [partners(name), partners(only)]
    const apart = mine.has(only) || (!kept.has(only) && [...mine].some((partner) => others.has(partner)))
    if (!apart) lead.set(name, only)
  }
  return (name) => {
    const form = normaliseName(name)
    return lead.get(form) ?? form
  }
}
