import type { Names } from '../names'
import { findKnown } from './comparison'

/** 'differed in accuracy', 'no difference was found for braking distance', 'effect on yield', 'correlated with colony size'. */
const FORMS: readonly RegExp[] = [
  // 'effect of temperature on growth'
  /\beffects?\sof\s[^.;()]{2,60}?\son\s(?:the\s)?(?<name>[A-Za-z][\w\s-]{2,40}?)(?=\s*(?:[,;(]|$|\b(?:between|among|was|were|did|when|after|with|under|than|by|at|compared)\b))/i,
  /\b(?:differ\w*|differences?|effects?|change\w*|improve\w*|increase\w*|reduction|decrease\w*)\b[^.;()]{0,60}?\b(?:in|for|on|of)\s(?:the\s)?(?<name>(?!(?:the\s)?(?:mean|means|groups?|treatments?)\b)[A-Za-z][\w\s-]{2,40}?)(?=\s*(?:[,;(]|$|\b(?:between|among|was|were|did|when|after|with|under|than|by|at|compared|versus|vs)\b))/i,
  // 'Grip strength was higher', 'Fanning was correlated with colony size', 'For lane keeping the difference'
  /^[\s,;)]*(?:and\s|but\s|whereas\s|while\s)?(?:for|in|on)\s(?:the\s)?(?<name>[a-z][\w\s-]{2,30}?)\s(?=the|there|no\b|groups?\b|differences?\b)/i,
  /^[\s,;)]*(?:and\s|but\s|whereas\s|while\s)?(?<name>[A-Z]?[a-z][\w-]*(?:\s[a-z][\w-]*){0,3}?)\s(?:was|were|is|are)\s(?:not\s)?(?:also\s)?(?:significantly\s)?(?:positively\s|negatively\s)?(?:higher|lower|greater|smaller|larger|longer|shorter|better|worse|correlated|associated|related|increased|reduced|decreased|raised|faster|slower)/i,
]

/** The outcome that a clause speaks of: a name known from the tables, else by its grammar; null where none is told. */
export function findOutcome(clause: string, sentence: string, names: Names): string | null {
  const [known] = findKnown(clause, names.outcomes)
  if (known) return known
  const [only, second] = findKnown(sentence, names.outcomes)
  if (only && !second) return only
  for (const form of FORMS) {
    const name = form
      .exec(clause.trim())
      ?.groups?.name?.replace(/^(?:mean|median|average|total)\s/i, '')
      .trim()
    if (
      name &&
      !/\b(?:vs|versus|against|than|between)\b/i.test(name) &&
      !/^(?:it|they|there|this|that|these|those|none|each|all|both|we|groups?|treatments?|differences?|means?)$/i.test(
        name,
      ) &&
      findKnown(name, names.groups).length === 0
    )
      return name
  }
  return null
}
