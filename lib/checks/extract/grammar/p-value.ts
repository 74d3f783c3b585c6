import type { Relation, Scale } from '../../vocabulary'
import { parseNumber, RELATION_SIGN, UNSIGNED } from './number'

/** A p-value as it stands in a sentence; `start` and `end` are offsets into the sentence. */
export type PrintedP = {
  start: number
  end: number
  relation: Relation
  value: number
  decimals: number
  /** What the words directly at the value say. */
  scale: Scale
  /** 'trend', 'interaction' … where the name says what the test is of. */
  of: string | null
  oneSided: boolean
  /** 'ps > .20', 'all p < .05', 'both P<.001': stands for several tests. */
  plural: boolean
  /** Position in a list 'p = .01, .02 and .04', else null. */
  item: number | null
  /** How many values the list has; 1 where there is none. */
  items: number
  /** Only 'n.s.' stands for the value. */
  markOnly: boolean
}

/** A tag on the letter: 'p_adj', 'p(FDR)', 'padj', 'pFWE-corr', 'p_bonf', 'P-trend', 'p uncorrected', 'p_B'. */
const TAGS = [
  'adjusted',
  'adj',
  'corrected',
  'corr',
  'cor',
  'FDR(?:[- ]?corr(?:ected)?)?',
  'FWER?(?:[- ]?corr(?:ected)?)?',
  'Bonferroni',
  'bonf',
  'Holm',
  'Hochberg',
  'Hommel',
  'Tukey',
  'Dunnett',
  'Scheff[eé]',
  '[SŠ]id[aá]k',
  'HSD',
  'BH',
  'BY',
  'B',
  'H',
  'raw',
  'unadjusted',
  'unadj',
  'uncorrected',
  'uncorr',
  'unc',
  'nominal',
  'trend',
  'interaction',
  'int',
  'inter',
  'heterogeneity',
  'het',
  'difference',
  'diff',
  'perm',
  'exact',
  'values?',
  '(?:one|two|1|2)[- ](?:tailed|sided)',
  'c',
] as const
const TAG = String.raw`(?:[_\s-]?[({]?(?:${TAGS.join('|')})\.?[)}]?)`

/** 'p', 'P', 'ps', "p's", 'p-value', 'P values', 'p-val', 'p-level', 'p value for trend', 'q', 'q-value', 'FDR', 'Sig. (2-tailed)', 'Pr(>F)', 'Prob > F'. */
const NAME = String.raw`(?:[pP](?<plural>s|'s)?(?:[-\s]?(?<word>[vV]al(?:ues?)?\b|[lL]evels?))?(?<tag>${TAG}{0,2})|[qQ](?:[-\s]?(?<qword>[vV]alues?))?(?<qtag>_?[({]?FDR[)}]?)?|(?<fdr>FDR)|[sS]ig\.?(?:\s?\((?:1|2|one|two)-(?:tailed|sided)\))?|Pr\s?\(>\s?(?:F|\|?[tz]\|?|Chisq|ChiSq)\)|Prob(?:\s?>\s?(?:F|\|?[tz]\|?))?(?=\s?[=<]))`

/** 'for trend', 'for the interaction', '(two-sided)', '(adjusted)', "(Bonferroni-corrected)" between name and relation. */
const BETWEEN = String.raw`(?:\s+for\s+(?<of>(?:the\s+|group\s+|linear\s+)?[a-z]+(?:\s×\s[a-z]+)?)|\s?\((?<aside>[A-Za-z][A-Za-z\s'-]{2,40})\))?`

/** 'of', 'was', 'equal to or less than', 'is below', 'of less than', 'ranged from', ':' … and the signs. */
const RELATION_WORDS = String.raw`(?:(?:of|was|were|is|are|being|equals?|equal\sto)\s+)?(?:(?:less|lower|smaller)\s+than(?:\s+or\s+equal\s+to)?|equal\s+to\s+or\s+less\s+than|below|under|(?:greater|larger|higher)\s+than|above|exceeding|at\s+least|at\s+most)|(?:rang(?:ed|ing|e)|varied|var(?:y|ying))\s(?:from|between)|between|of|was|were|is|are|equals`

const RELATION = String.raw`(?<relation>(?:(?:of|was|were|is|are)\s+)?${RELATION_SIGN}|${RELATION_WORDS}|[:,])`

const NUMBER = String.raw`(?<number>${UNSIGNED})`

/** p = .032, 'P<.001', 'p-value of 0.03', '(p 0.03)', 'p_adj = .04', 'ps > .20', 'p = n.s.' */
const P_VALUE = new RegExp(
  String.raw`(?<![A-Za-z0-9_.^/-])(?<![^A-Za-z]–)${NAME}${BETWEEN}(?:\s*${RELATION}\s*|\s+)(?:${NUMBER}|(?<ns>n\.?s\.?)(?![a-z]))`,
  'g',
)

/** Further values of a list or the end of a range: ', .02 and .04', ' and 0.026', '–.04', ' to .04', ', < .001'. */
const NEXT = new RegExp(
  String.raw`^(?<join>\s*(?:,\s*(?:and|or|&)?|;|and|or|&|[-–]|to)\s*)(?:p\s*)?(?<relation>${RELATION_SIGN})?\s*(?<number>${UNSIGNED})(?![\d.,]*[\d%]|\s*[A-Za-zμ°%]{1,4}\/)`,
)

/** Units that make 'P = 40 kPa', 't = 30 s', 'F = 2.6 kN', 'r = 25 mm' a quantity. */
const UNIT =
  /^\s?(?:°\s?[CFK]?|[%‰]|(?:[kMGmμunhc]?(?:Pa|bar|Hz|eV|mol|Ohm|Ω|Gy|Sv)|[kMGmμun]?[NWVAJKCTgmLlsMB]|[kcmμun]?m|min|mins|minutes?|h|hrs?|hours?|sec|seconds?|days?|d|weeks?|wk|months?|years?|yr|ha|atm|psi|mmHg|mm\s?Hg|ppm|ppb|dB|rpm|kcal|cal|IU|U|Da|kDa|bp|kb|t|rad|deg|degrees|units?|points?|px|mg|kg|ng|pg|ml|mL|dL|cm|mm|km|nm|lb|inch(?:es)?|ft)(?![A-Za-z]))(?!\s*[=<>(])/

/** Whether a unit follows the number that ends at `end`: then it is a quantity and no statistic. */
export function followedByUnit(sentence: string, end: number): boolean {
  return UNIT.test(sentence.slice(end, end + 24))
}

/** Partial eta squared and its kin, 'ηp2', 'η^2_p', whose letter p is none. */
const EFFECT_SIZE = /(?:[ηωε]|eta|omega|epsilon)[\s²2^_{}-]*$/i

const ADJUSTED =
  /adj|corr(?!el)|FDR|FWE|bonf|holm|hochberg|hommel|tukey|dunnett|scheff|[sš]id[aá]k|^[_\s(-]*(?:BH|BY|B|H|HSD|c)\b|HSD|q-?val|multiplicity/i
const RAW = /(?<![A-Za-z])(?:raw|nominal|unc|crude|unadj\w*|uncorr?\w*|un-?adjusted|un-?corrected)/i

/** Words before the letter: 'adjusted P', 'Bonferroni-corrected p', 'uncorrected p', 'one-sided P', 'all ps', 'both'. */
const BEFORE =
  /((?:\b(?:all|both|every|each|other|adjusted|unadjusted|corrected|uncorrected|nominal|raw|crude|exact|asymptotic|permutation|permuted|multiplicity|adj\.?|corr\.?|FDR|FWER?|family-?wise|BH|Bonferroni|Holm|Hochberg|Hommel|Tukey|Dunnett|Scheff[eé]|[SŠ]id[aá]k|Benjamini|Bonf\.?|Monte Carlo|(?:one|two|1|2)-?(?:sided|tailed)|[SŠ]id[aá]k|post-?hoc|unc\.?)(?:'s)?[\s-]*)+)\(?$/i

/** Every p-value printed in one sentence (folded text), thresholds and legends among them. */
export function findPValues(sentence: string): PrintedP[] {
  const found: PrintedP[] = []
  for (const match of sentence.matchAll(P_VALUE)) {
    const printed = toPrinted(sentence, match)
    if (printed.length > 0 && match.index >= (found[found.length - 1]?.end ?? 0)) found.push(...printed)
  }
  return found
}

function toPrinted(sentence: string, match: RegExpExecArray): PrintedP[] {
  const {
    plural,
    word,
    tag = '',
    qword,
    fdr,
    of = null,
    aside = '',
    relation,
    number,
    ns,
  } = match.groups ?? {}
  const lead = sentence.slice(0, match.index)
  if (EFFECT_SIZE.test(lead)) return []
  const isQ = /^q/i.test(match[0])
  const named = word !== undefined || qword !== undefined
  const before = BEFORE.exec(lead.slice(-60))?.[1] ?? ''
  const words = `${before} ${tag} ${aside}`
  const base = {
    start: match.index,
    end: match.index + match[0].length,
    scale: scaleOf(words, isQ || fdr !== undefined),
    of: of ?? ofTag(tag),
    oneSided: /(?:one|1)[- ]?(?:sided|tailed)/i.test(words),
    plural: plural !== undefined || /s$/i.test(word ?? qword ?? '') || /\b(?:all|both|other)\b/i.test(before),
    item: null,
    items: 1,
  }
  if (ns !== undefined) {
    // 'p = n.s.', but not the start of a word
    if (relation === undefined || !/^[=:]?$/.test(relation.trim())) return []
    return [{ ...base, relation: '>', value: Number.NaN, decimals: 2, markOnly: true }]
  }
  const parsed = number === undefined ? null : parseNumber(number, true)
  if (number === undefined || !parsed || !isPlausible(sentence, base.end, parsed.value, number)) return []
  // without a sign the letter alone may mean anything: '(p 0.03)' is a value, 'appendix p 13' is a page
  if (relation === undefined && !(/^\D?0?[.,]\d/.test(number) && (named || /[(,;]\s*$/.test(lead)))) return []
  // 'p: 0.03' and 'P value, .03' need the decimals; a bare comma needs the word
  if (relation === ':' && !/[.,]\d/.test(number)) return []
  if (relation === ',' && !(named && /^0?\.\d/.test(number))) return []
  // verbs and 'of' speak of a p-value only after the word or after the letter p itself
  if (relation !== undefined && /^[a-z]/i.test(relation) && !named && (isQ || !/[.,]\d/.test(number)))
    return []
  // the studentised range is a statistic
  if (isQ && parsed.value > 1) return []
  if (fdr !== undefined && !/^[=<]/.test((relation ?? '').trim())) return []
  const first: PrintedP = {
    ...base,
    relation: toRelation(relation ?? '='),
    value: parsed.value,
    decimals: parsed.decimals,
    markOnly: false,
  }
  return [first, ...listOn(sentence, first, /^(?:rang|var|between)/i.test(relation ?? ''))].map(
    (p, i, all) => (all.length > 1 ? { ...p, item: i, items: all.length } : p),
  )
}

/** A value, not a quantity or a year: up to 1, or above it with decimals as a product that nobody capped. */
function isPlausible(sentence: string, end: number, value: number, printed: string): boolean {
  if (/^(?:[.,]\d|\d)/.test(sentence.slice(end, end + 2))) return false
  if (followedByUnit(sentence, end)) return false
  return value <= 1 || (value < 100 && /\.\d{2,}$/.test(printed))
}

/** The values that follow in a list or a range. */
function listOn(sentence: string, first: PrintedP, spread: boolean): PrintedP[] {
  const items: PrintedP[] = []
  let end = first.end
  // 'respectively' after the list, or before it
  const rest = sentence.slice(end)
  const respectively =
    /\brespectively\b/i.test(rest.slice(0, 160)) || /\brespectively\b/i.test(sentence.slice(0, first.start))
  for (;;) {
    const next = NEXT.exec(sentence.slice(end))
    const number = next?.groups?.number
    const parsed = number === undefined ? null : parseNumber(number, true)
    if (!next || number === undefined || !parsed || parsed.value > 1 || !/[.,]\d|e-|10/.test(number)) break
    const range = /^\s*(?:[-–]|to)\s*$/.test(next.groups?.join ?? '') || (spread && items.length === 0)
    if (!range && !first.plural && !respectively) break
    if (range && parsed.value === first.value) break
    const start = end + next[0].length - number.length
    if (
      followedByUnit(sentence, end + next[0].length) ||
      /^\s*[=<>]/.test(sentence.slice(end + next[0].length))
    )
      break
    end += next[0].length
    const relation = next.groups?.relation
    items.push({
      ...first,
      start,
      end,
      ...parsed,
      relation: relation === undefined ? first.relation : toRelation(relation),
    })
    if (range) break
  }
  // a list that 'respectively' does not close directly is none: 'p = .03 and 0.5 mm, respectively'
  if (
    !first.plural &&
    items.length > 0 &&
    !/^[\s)\],.;]*(?:respectively|for\b|$)|^[)\]]/i.test(sentence.slice(end))
  ) {
    const range = NEXT.exec(sentence.slice(first.end))
    return range && /^\s*(?:[-–]|to)\s*$/.test(range.groups?.join ?? '') ? items.slice(0, 1) : []
  }
  return items
}

function scaleOf(words: string, isQ: boolean): Scale {
  if (RAW.test(words)) return 'raw'
  return isQ || ADJUSTED.test(words) ? 'adjusted' : 'unknown'
}

function ofTag(tag: string): string | null {
  if (/trend/i.test(tag)) return 'trend'
  return /inter?(?:action)?\b/i.test(tag) ? 'interaction' : /het/i.test(tag) ? 'heterogeneity' : null
}

/** The relation of a sign or a phrase: '=<' is '<=', 'less than' is '<', '≈' and 'of' are '='. */
export function toRelation(printed: string): Relation {
  const text = printed.replace(/\s+/g, ' ').trim().toLowerCase().replace('&lt;', '<').replace('&gt;', '>')
  if (/≤|<\s?=|=\s?<|or equal|equal to or less|at most/.test(text)) return '<='
  if (/≥|>\s?=|=\s?>|at least/.test(text)) return '>='
  if (/[<≪]|less|lower|smaller|below|under/.test(text)) return '<'
  return /[>≫]|greater|larger|higher|above|exceed/.test(text) ? '>' : '='
}
