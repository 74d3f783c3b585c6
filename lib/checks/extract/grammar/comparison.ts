/** A name of a group in running text: up to six words, no verbs of the sentence around it. */
const NAME = String.raw`[A-Za-zÀ-ÿ0-9+−-][^,;:()=<>]*?`

/** Words before which a name ends: verbs, prepositions of the outcome, brackets. */
const END = String.raw`(?=\s*(?:[,;:(]|\.?$|\b(?:was|were|is|are|did|do|does|had|has|in|on|for|at|after|by|with respect|could|differed|differ|differs|remained|reached|exceeded|showed|when|did|and did|\[)\b))`

/** What may stand before a name and is no part of it. */
const LEAD =
  /^(?:(?:the|a|an|that|those|both|between|of|for|with|under|in|on|at|after|from|by|than|to|as|and|mean|means|value|values|level|levels|difference|differences|comparison|comparisons|pairwise|only|also|again|here|observed|found|group|groups|patients|participants|animals)\s+)+/i

/** What may follow a name and is no part of it. */
const TRAIL =
  /(?:\s+(?:was|were|is|are|did|had|has|only|alone too|respectively|too|also|as well|group|groups|condition|conditions|treatment|treatments|arm|arms))+$/i

/** 'control vs biochar', 'A versus B', 'A v. B', 'A compared with B', 'A relative to B'. */
const VERSUS = new RegExp(
  String.raw`(?<a>${NAME})\s+(?:vs\.?|versus|v\.|against|(?:as\s)?compared\s(?:with|to)|relative\sto|in\scomparison\s(?:with|to))\s+(?<b>${NAME})${END}`,
  'i',
)
/** 'between A and B', 'between the A group and the B group'. */
const BETWEEN = new RegExp(String.raw`\bbetween\s+(?<a>${NAME})\s+and\s+(?<b>${NAME})${END}`, 'i')
/** 'A differed from B', 'A did not differ from B', 'A was different from B', 'A exceeded (that for) B'. */
const FROM = new RegExp(
  String.raw`(?<a>${NAME})\s+(?:did\s+not\s+differ|differed|differs|differ|(?:was|were)\s+(?:not\s+)?(?:significantly\s+)?different|(?:could not be|was not|were not)\s(?:told|distinguished|distinguishable))\s+(?:\w+ly\s+)?from\s+(?<b>${NAME})${END}`,
  'i',
)
/** 'higher under Compost than under Control', 'A was higher than B', 'slower with no cue than with peripheral cue'. */
const THAN_PHRASE = new RegExp(
  String.raw`\b(?:under|with|in|for|at|after|on|among|of|by|from)\s+(?<a>${NAME})\s+than\s+(?:that\s+|those\s+)?(?:under|with|in|for|at|after|on|among|of|by|from)\s+(?<b>${NAME})${END}`,
  'i',
)
const THAN = new RegExp(
  String.raw`(?<a>${NAME})\s+(?:was|were|had|gave|showed|produced|yielded|grew|performed|scored|is|are|did|lasted|reached|[a-z]+ed)\b[^,;:()]*?\bthan\s+(?:that\s(?:of|for|in|with|under)\s|those\s(?:of|for|in|with|under)\s)?(?<b>${NAME})${END}`,
  'i',
)
/** 'The mean for A exceeded that for B', 'A outyielded B'. */
const EXCEEDED = new RegExp(
  String.raw`(?<a>${NAME})\s+(?:exceeded|surpassed|outperformed|outyielded|outgrew|equalled|matched|beat)\s+(?:that\s+|those\s+)?(?:(?:for|of|in|with|under)\s+)?(?<b>${NAME})${END}`,
  'i',
)
/** 'A and B did not differ', 'A and B differed', 'A and B could not be told apart', 'A and B were similar'. */
const BOTH = new RegExp(
  String.raw`^(?<a>${NAME})\s+and\s+(?<b>${NAME})\s+(?:did|do|differed|differ|were|could|cannot|gave|showed|had|are)\b`,
  'i',
)

/**
 * The two groups that a clause compares, in its own words; null where it names no pair. Known names are looked
 * for first (see `findKnown`), this is for texts whose tables name no groups.
 */
export function findPair(clause: string): [string, string] | null {
  const text = clause.trim().replace(/\s+/g, ' ')
  for (const form of [BETWEEN, VERSUS, THAN_PHRASE, BOTH, FROM, EXCEEDED, THAN]) {
    const match = form.exec(text)
    const a = clean(match?.groups?.a ?? '')
    const b = clean(match?.groups?.b ?? '')
    if (isName(a) && isName(b) && a.toLowerCase() !== b.toLowerCase()) return [a, b]
  }
  return null
}

function clean(name: string): string {
  let text = name.trim()
  // of a long stretch only what follows the last preposition or comma can be the name
  const cut = /.*\b(?:between|for|of|under|with|that|in|both)\s+(?:the\s+)?(.+)$/i.exec(text)
  if (cut?.[1] && text.split(' ').length > 4) text = cut[1]
  return text
    .replace(LEAD, '')
    .replace(TRAIL, '')
    .replace(/[.,;:]+$/, '')
    .trim()
}

/** Up to six words, and not a pronoun or a count. */
function isName(name: string): boolean {
  return (
    name.length > 0 &&
    name.split(' ').length <= 6 &&
    !/^(?:it|they|them|this|these|those|each other|one another|any|all|none|other|others|others?|each|every|no|groups?|treatments?|conditions?|zero|chance|expected|before|after|baseline|we|two|three|four)$/i.test(
      name,
    )
  )
}

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
