import type { LaidOut, SectionKind } from '../types'
import type { Remarks } from './comparison'

export type Sentence = { text: string; offset: number; section: SectionKind }

const foreign = new Set<SectionKind>(['introduction', 'references', 'title'])

/** The manuscript's own sentences with their offsets; introduction and references are left out. */
export function listSentences({ prose }: LaidOut): Sentence[] {
  const sentences: Sentence[] = []
  // a sentence ends at a stop, a space and a capital or a figure; "p. 05", "vs. b" do not end one
  const ends = /[.!?]\s+(?=["“(]?[A-ZÀ-Þ])|\n\n/g
  let start = 0
  for (const match of prose.text.matchAll(ends)) {
    sentences.push({ text: prose.text.slice(start, match.index + 1).trim(), offset: start, section: 'other' })
    start = match.index + match[0].length
  }
  sentences.push({ text: prose.text.slice(start).trim(), offset: start, section: 'other' })
  return sentences
    .map((sentence) => ({ ...sentence, section: sectionAt(prose, sentence.offset) }))
    .filter(({ text, section }) => text !== '' && !foreign.has(section))
}

function sectionAt(prose: LaidOut['prose'], offset: number): SectionKind {
  return prose.sections.find(({ start, end }) => start <= offset && offset < end)?.kind ?? 'other'
}

/** "one-sided", "one tailed", "1-sided" */
const oneSided = /\b(?:one|single|1)[-\s]?(?:sided|tailed)\b/i
/** "Greenhouse–Geisser", "Huynh-Feldt", "departures from sphericity" */
const sphericity = /greenhouse|geisser|huynh|feldt|spheric/i
/** "Welch", "unequal variances", "Satterthwaite", "Kenward–Roger" */
const welch = /welch|satterthwaite|kenward|unequal variance/i
/** "repeated-measures ANOVA", "within-subjects factor" */
const repeated = /\brepeated[-\s]measures?\b|\bwithin[-\s](?:subjects?|participants?)\b/i
/** "Fisher's exact test", "Yates", "continuity correction", "permutation test" */
const exact = /\bexact\b|\byates\b|\bcontinuity\b|\bpermutation\b|\bbootstrap/i
/** "exploratory", "hypothesis-generating", "nominal p-values", "nominally significant", "descriptive only" */
const exploratory =
  /\bexploratory\b|hypothesis[-\s]generating|\bnominal(?:ly)?\s+(?:p\b|significan|level)|\bp[-\s]?values?\s+(?:are|were)\s+(?:\w+\s+)?nominal\b|\bdescriptive(?:ly)?\s+(?:only|p\b|purposes)/i
/** "co-primary", "both endpoints had to be significant", "success required all" */
const coPrimary =
  /\bco-?primary\b|\b(?:both|all)\b[^.]{0,60}\b(?:must|had to|were required to|have to)\b[^.]{0,40}\b(?:significant|succeed|be met|reach)|\bintersection[-\s]union\b/i
/** "hierarchical testing", "fixed-sequence", "gatekeeping", "in the prespecified order", "only if the preceding" */
const ordered =
  /\bhierarchical(?:ly)?\b[^.]{0,60}\b(?:test|order|procedure|sequence|closed)|\bfixed[-\s]sequence\b|\bgate-?keep|\b(?:pre-?specified|pre-?defined|fixed|stated|given|following)\s+(?:order|sequence)\b|\btest(?:ed|ing)\b[^.]{0,80}\b(?:only if|until|stopp)/i
/** "all pairs", "all pairwise comparisons", "compared with each other", "every pair" */
const allCompared =
  /\ball\s+(?:possible\s+|of\s+the\s+)?(?:\w+\s+)?(?:pairs|pairwise|pair-wise)\b|\b(?:all|every|each)\b[^.]{0,60}\bcompared\s+(?:with|to|against)\s+(?:each|one an)\s?other\b|\bevery\s+(?:possible\s+)?pair\b|\bpairwise\s+comparisons?\s+(?:between|of|among)\s+all\b/i
/** "family-wise error", "experimentwise error rate", "overall error at 5%", "any false positive" */
const familyWise =
  /\b(?:family|experiment|study)[-\s]?wise\b|\boverall\s+(?:type[-\s]?(?:I|1)\s+)?(?:error|significance level|alpha)|\b(?:any|at least one)\s+(?:false[-\s]positive|type[-\s]?(?:I|1) error)/i

/** What the manuscript's own words say beside its claims of a correction. */
export function readRemarks(laidOut: LaidOut): Remarks {
  const sentences = listSentences(laidOut)
  const find = (pattern: RegExp) => sentences.find(({ text }) => pattern.test(text)) ?? null
  const place = (pattern: RegExp) => {
    const found = find(pattern)
    return found && { sentence: found.text, offset: found.offset }
  }
  return {
    text: sentences.map(({ text }) => text).join(' '),
    tables: laidOut.tables,
    oneSided: find(oneSided) !== null,
    sphericity: find(sphericity) !== null,
    welch: find(welch) !== null,
    repeated: find(repeated) !== null,
    exact: find(exact) !== null,
    exploratory: find(exploratory) !== null,
    coPrimary: find(coPrimary) !== null,
    order: place(ordered),
    allCompared: find(allCompared)?.text ?? null,
    familyWise: place(familyWise),
  }
}

export function saysExploratory(text: string): boolean {
  return exploratory.test(text)
}

export function isAllCompared(text: string): boolean {
  return allCompared.test(text)
}
