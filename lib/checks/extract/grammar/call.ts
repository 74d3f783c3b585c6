import type { Call } from '../../vocabulary'

/** A call of significance in words, and how much it says: 'strong' names significance or a difference. */
export type WordedCall = { call: Call; strength: 'strong' | 'weak' } | null

const EFFECT = String.raw`(?:significan\w*|differ\w*|effects?|affect\w*|chang\w*|associat\w*|correlat\w*|relat(?:ed|ion\w*)|interact\w*|influenc\w*|distinguish\w*|told apart|told from|separat\w*|improv\w*|increas\w*|reduc\w*|decreas\w*|rais\w*|lower\w*|higher|greater|better|worse|exceed\w*|predict\w*|evidence|surviv\w*|reach\w*|advantage|benefit\w*|var(?:y|ied)|deviat\w*|depart\w*|support\w*|detect\w*|stand out|discern\w*|attain\w*|hold|held|remain\w*|withst\w+|pass\w*|sustain\w*|confirm\w*)`

/** 'no significant difference', 'did not differ', 'nor was there', 'failed to reach', 'cannot be told apart', "didn't differ". */
const DENIED = new RegExp(
  String.raw`(?:\b(?:no|not|nor|neither|never|none|nothing|hardly|cannot|could not|failed|fails|failing|lack(?:ed|s|ing)?|absence|without)\b|n't\b)(?!\s(?:only|just|merely|all)\b)(?:(?!\bbut\b)[^.;]){0,90}?\b${EFFECT}`,
  'i',
)

/** 'nonsignificant', 'not significant', 'n.s.', 'were similar', 'indistinguishable', 'no longer significant', 'unaffected'. */
const DENIED_PLAINLY =
  /\b(?:non|in|un)-?significan|\bn\.s\.|[(,;]\s?ns\b|\b(?:similar|comparable|indistinguishable|unchanged|unaffected|alike|equivalent|the same(?!\s(?:direction|pattern|trend|order|sign|way|was true|held))|equal)\b|\bfar from significan|\b(?:unrelated|uncorrelated|unassociated|independent of|no different)\b/i

/** The verb is left out: 'but not in lactic acid', ', whereas B was not', 'B did not (', 'not in C', 'nor in D'. */
const ELLIPTIC =
  /\b(?:but|and)\s+not\b(?!\sonly)|^[\s,;)]*not\b(?!\sonly)|\b(?:was|were|did|is|are|does|do|had|has)\s+not\s*(?:[,(;:]|$)|^[\s,;)]*n?or\b|\bexcept\b[^.;]{0,40}$/i

/** Neither one nor the other: 'marginally significant', 'a trend towards', 'tended to be higher', 'numerically'. */
const HEDGED =
  /\b(?:marginal\w*|borderline|trend(?:ed|s|ing)?\s(?:to|for|towards?|in)|a trend\b|tend(?:ed|s|ency)\b|approach\w*|numerical\w*|nominally|almost|nearly|close to|just (?:missed|failed)|suggestive)/i

/** 'significant', 'significantly', 'differed': not the noun 'difference' alone. */
const STRONG = /\bsignifican\w*|\bdiffer(?:ed|s)\b|\bdiffer\b|\bdistinct\b|\bdifferent\b/i

/** Direction or relation in plain words: 'higher than', 'exceeded', 'raised', 'was correlated with', 'an effect of'. */
const WEAK =
  /\b(?:higher|lower|greater|smaller|larger|longer|shorter|faster|slower|heavier|lighter|better|worse|more|less|fewer|stronger|weaker|thicker|earlier|later|richer|poorer|warmer|exceed\w*|out-?(?:yield|perform|grew|weigh|number|score|last|stripp)\w*|increas\w*|decreas\w*|reduc\w*|rais\w*|improv\w*|lower(?:ed|s)|enhanc\w*|impair\w*|affect(?:ed|s)|influenc(?:ed|es)|associated|correlat\w*|predict(?:ed|s)|effects?(?!\ssizes?)|superior|inferior|interact(?:ed|ion)\w*|relationship|varied|dropped|rose|fell|gain(?:ed)?|deviat\w*|depart\w*|(?<!\b(?:mean|adjusted|estimated|squares|absolute|percentage|percent|risk|standardi[sz]ed|median|rate)\s)differences?(?!\s?(?:[=:(\d−-]|of\s\d))|benefit(?:ed)?|surpass\w*|same (?:direction|pattern)|\w{2,}er\b[^,;()]{0,30}\bthan|further|delay\w*|shorten\w*|prolong\w*|promot\w*|inhibit\w*|suppress\w*|stimulat\w*)\b/i

/** Names of groups that begin with 'no', 'and no warm-up', 'with no cue': not a negation. */
const NAMED_NO =
  /\b(and|than|with|under|for|vs\.?|versus|from|to|between|over|or|in|of|by|after)\s+no\s+(?!(?:\w+\s)?(?:signific|differ|effect|chang|evidence|statist|associat|correlat|interact|other|such|detect|clear|main|further))/gi

/** What the words of one clause call it; null when they say nothing or hedge. `names` are groups whose own words do not count. */
export function findCall(clause: string, names: readonly string[] = []): WordedCall {
  const words = hideNames(clause, names).replace(NAMED_NO, '$1 ')
  // what stands after the last 'but', 'whereas' or semicolon is nearer, if it says anything
  const pieces = words.split(/;|\b(?=(?:but|whereas|while|although|however|yet)\b)/i)
  for (const piece of pieces.reverse()) {
    const call = callOf(piece)
    if (call !== 'silent') return call
  }
  return null
}

function callOf(piece: string): WordedCall | 'silent' {
  if (DENIED.test(piece) || DENIED_PLAINLY.test(piece) || ELLIPTIC.test(piece))
    return { call: 'not significant', strength: 'strong' }
  if (HEDGED.test(piece)) return null
  if (STRONG.test(piece)) return { call: 'significant', strength: 'strong' }
  return WEAK.test(piece) ? { call: 'significant', strength: 'weak' } : 'silent'
}

/** Group names replaced by a letter, longest first, so that 'no support' or 'higher load' says nothing. */
function hideNames(clause: string, names: readonly string[]): string {
  return names
    .filter(
      (name) =>
        name.length > 2 &&
        /\b(?:no|non|not|without|high|low|higher|lower|more|less|same|equal|different|similar|long|short|early|late)/i.test(
          name,
        ),
    )
    .reduce(
      (text, name) => text.replace(new RegExp(name.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'), 'gi'), 'X'),
      clause,
    )
}
