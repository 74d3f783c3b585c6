/** A name of a group in running text, as short as what follows allows. */
const NAME = String.raw`[A-Za-zÀ-ÿ0-9+−-][^,;:()=<>]*?`

/** Words before which a name ends: verbs, prepositions of the outcome, what begins something else. */
const END = String.raw`(?=\s*(?:[,;:(]|\.?$|\b(?:was|were|is|are|did|do|does|had|has|in|on|for|at|after|by|with respect|could|differed|differ|differs|remained|reached|exceeded|showed|when|yielded|gave|the|a|an|p|P|adjusted|corrected|whereas|while|but|only|and (?:did|was|were|had|showed))\b))`

/** Finite verbs of results; what comes from them on is no part of a name. */
const VERB =
  /\s(?:was|were|is|are|had|has|have|did|does|do|gave|gives|showed|shows|grew|led|made|got|took|lost|won|kept|held|rose|fell|increased|decreased|reduced|raised|lowered|improved|enhanced|impaired|affected|performed|scored|lasted|reached|produced|yielded|differed|remained|survived|responded|stretched|reported|required|needed|spent|consumed|accumulated|recovered|could|can|may|also|did not)\b.*$/i

/** What reports the result and is no part of it: 'Post hoc tests showed that', 'We found that', 'and', 'whereas'. */
const PREAMBLE =
  /^.*\b(?:showed|revealed|indicated|found|confirmed|suggested|demonstrated|established|disclosed)\b(?:\s(?:that|a|an|the|no))?\s|^[\s,;.)]*(?:(?:and|but|whereas|while|or|nor|however|moreover|likewise|also|further|furthermore|similarly|thus|again|finally|only)\b,?\s?)+/i

/** What may stand before a name and is no part of it. */
const LEAD =
  /^(?:(?:the|a|an|that|those|both|between|of|for|with|under|in|on|at|after|from|by|than|to|as|and|mean|means|value|values|level|levels|difference|differences|comparison|comparisons|pairwise|only|also|again|here|observed|found|group|groups|patients|participants|animals|mice|rats|plants|plots|samples|significant|significantly|were|was|emerged|pair)\s+)+/i

/** What may follow a name and is no part of it. */
const TRAIL =
  /(?:\s+(?:only|respectively|too|also|as well|significantly|clearly|group|groups|condition|conditions|treatment|treatments|arm|arms|animals|mice|rats|plots|plants|patients|participants))+$/i

/** Forms in which two groups are named, surest first, each with the text it is for. */
const FORMS: readonly RegExp[] = [
  // 'between A and B', 'between the A group and the B group'
  new RegExp(String.raw`\bbetween\s+(?<a>${NAME})\s+and\s+(?<b>${NAME})${END}`, 'i'),
  // 'comparison of A with B', 'contrast of A and B'
  new RegExp(
    String.raw`\b(?:comparison|contrast)\s+of\s+(?<a>${NAME})\s+(?:with|and|to|against|versus)\s+(?<b>${NAME})${END}`,
    'i',
  ),
  // 'Compared with B, A increased …', 'Relative to B, A …'
  new RegExp(
    String.raw`^(?:as\s)?(?:compared\s(?:with|to)|relative\sto|in\scomparison\s(?:with|to)|unlike)\s+(?<b>${NAME}),\s*(?<a>${NAME})\s(?=[a-z]+(?:ed|s|t|w|ve)\b)`,
    'i',
  ),
  // 'A vs B', 'A versus B', 'A against B', 'A … compared with B', 'A … relative to B'
  new RegExp(
    String.raw`(?<a>${NAME})\s+(?:vs\.?|versus|v\.|against|(?:as\s|when\s)?compared\s(?:with|to)|relative\sto|in\scomparison\s(?:with|to))\s+(?<b>${NAME})${END}`,
    'i',
  ),
  // 'higher under A than under B', 'slower with A than with B'
  new RegExp(
    String.raw`\b(?:under|with|in|for|at|after|on|among|of|by|from)\s+(?<a>${NAME})\s+than\s+(?:that\s+|those\s+)?(?:under|with|in|for|at|after|on|among|of|by|from)\s+(?<b>${NAME})${END}`,
    'i',
  ),
  // 'A and B did not differ', 'A and B could not be told apart', 'A and B differed'
  new RegExp(
    String.raw`^(?<a>${NAME})\s+and\s+(?<b>${NAME})\s+(?:did|do|differed|differ|were|could|cannot|gave|showed|had|are)\b`,
    'i',
  ),
  // 'A differed from B', 'A did not differ from B', 'A was different from B', 'A could not be told from B'
  new RegExp(
    String.raw`(?<a>${NAME})\s+(?:did\s+not\s+differ|differed|differs|differ|(?:was|were)\s+(?:not\s+)?(?:significantly\s+)?different|(?:could not be|was not|were not)\s(?:told|distinguished|distinguishable))\s+(?:\w+ly\s+)?from\s+(?:that\s(?:of|for|in)\s)?(?<b>${NAME})${END}`,
    'i',
  ),
  // 'The mean for A exceeded that for B', 'A outyielded B'
  new RegExp(
    String.raw`(?<a>${NAME})\s+(?:exceeded|surpassed|outperformed|out\w+ed|outgrew|equalled|matched|beat)\s+(?:that\s+|those\s+)?(?:(?:for|of|in|with|under|after)\s+)?(?<b>${NAME})${END}`,
    'i',
  ),
  // 'A was higher than B', 'A had more pain than those in B', 'C30 held better than A10'
  new RegExp(
    String.raw`(?<a>${NAME})(?<!\bthe|\ban)\s+(?:was|were|had|gave|showed|grew|is|are|did|held|kept|rose|took|lost|[a-z]+ed)\b[^,;:]*?\bthan\s+(?:(?:that|those)\s(?:of|for|in|with|under|from)\s|did\s)?(?<b>${NAME})${END}`,
    'i',
  ),
  // 'the comparison A–B', 'Significant were A–B'
  /\b(?:comparisons?|contrasts?|pairs?|were|was|for|and)\s(?<a>[A-Z][\w.+]*)\s?[–-]\s?(?<b>[A-Z][\w.+]*)\s*(?:$|[,;(]|\b(?:was|were|did|is)\b)/,
]

/** The two groups that a clause compares, in its own words; null where it names no pair. */
export function findPair(clause: string): [string, string] | null {
  // means and deviations in brackets, '(M = 4.1, SD = 1.0)', stand in the way
  const text = clause
    .replace(/\([^()]*[=±<>][^()]*\)/g, ' ')
    .replace(/\s+/g, ' ')
    .replace(/[\s(,;]+$/, '')
    .trim()
  const bare = text
    .replace(/^[\s,;.)]+/, '')
    .replace(PREAMBLE, '')
    .trim()
  for (const form of FORMS) {
    const match = form.exec(bare) ?? form.exec(text)
    const a = cleanName(match?.groups?.a ?? '', true)
    const b = cleanName(match?.groups?.b ?? '', false)
    if (isName(a) && isName(b) && a.toLowerCase() !== b.toLowerCase()) return dropShared(a, b)
  }
  return null
}

/** '… and group C', ', but not from C', 'or C': a further group against the first of the pair before. */
export function findFurther(clause: string): string | null {
  // a conjunction, perhaps a preposition, and nothing but a name up to the bracket
  const match =
    /^[\s,;)]*(?:and|or|nor|but not|but|as well as|,)?\s*(?:also\s|not\s)?(?:(?:than|from|to|with|in|under|for|at|that)\s+)*(?<name>[A-Za-z0-9+−-][^,;:()=<>]{0,40}?)[\s(,]*$/i.exec(
      clause,
    )
  const raw = match?.groups?.name ?? ''
  const name = cleanName(raw, false)
  return isName(name) && !VERB.test(` ${raw} `) && !/\band\b/.test(name) ? name : null
}

/** `first`: the name before the comparing word, of which what follows its last preposition is kept. */
function cleanName(name: string, first: boolean): string {
  let text = name.trim().replace(VERB, '')
  // of a long stretch only what follows the last preposition can be the name: 'The peel force of D40'
  const cut = /^.*\b(?:between|for|of|under|with|that|both|after)\s+(?:the\s+)?(.+)$/i.exec(text)
  if (first && cut?.[1] && !/^(?:control|group|site)/i.test(text)) text = cut[1]
  const further = /^.*\bin\s+(?:the\s+)?(.+)$/i.exec(text)
  if (first && further?.[1] && text.split(' ').length > 3) text = further[1]
  return text
    .replace(LEAD, '')
    .replace(TRAIL, '')
    .replace(/[.,;:]+$/, '')
    .trim()
}

/** Words that both names begin or end with say nothing: 'snails from site 1', 'snails from site 3'. */
function dropShared(a: string, b: string): [string, string] {
  const [left, right] = [a.split(' '), b.split(' ')]
  let head = 0
  while (
    head < Math.min(left.length, right.length) - 1 &&
    left[head]?.toLowerCase() === right[head]?.toLowerCase()
  )
    head += 1
  // a bare number or letter keeps the noun before it
  if (
    head > 0 &&
    [left[head], right[head]].every((word) => /^\w{1,2}$/.test(word ?? '')) &&
    left.length === head + 1
  )
    head -= 1
  let tail = 0
  while (
    tail < Math.min(left.length, right.length) - head - 1 &&
    left[left.length - 1 - tail]?.toLowerCase() === right[right.length - 1 - tail]?.toLowerCase()
  )
    tail += 1
  const [x, y] = [left, right].map((words) => words.slice(head, words.length - tail).join(' '))
  return x &&
    y &&
    !/^(?:low|high|no|with|without|more|less)$/i.test(x) &&
    !/^(?:low|high|no|with|without|more|less)$/i.test(y)
    ? [x, y]
    : [a, b]
}

/** Up to six words, and not a pronoun, a count or a phrase of time. */
function isName(name: string): boolean {
  return (
    name.length > 0 &&
    !/^(?:a|an|the)$/.test(name) &&
    name.split(' ').length <= 6 &&
    !/^(?:it|they|them|this|these|those|each other|one another|any|all|none|other|others|each|every|no|groups?|treatments?|conditions?|zero|chance|expected|before|after|we|two|three|four|five|six|tests?|post hoc tests?|results?|effects?|differences?|the rest|either|neither|which|who|pre|post|there)$/i.test(
      name,
    )
  )
}
