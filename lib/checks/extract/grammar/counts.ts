import { COUNT, parseCount } from './number'

/** Nouns of which the number is the number of tests. */
const TESTS = String.raw`(?:comparisons?|tests?|contrasts?|pairs|hypothes[ei]s|p-?\s?values?|outcomes?|end-?\s?points?|measures|variables|parameters|regions?|ROIs?|transcripts|genes|probes|SNPs?|loci|voxels|vertices|proteins|metabolites|cytokines|taxa|items|subscales|scales|scores|behaviou?rs|traits|correlations?|time\s?points|markers|biomarkers|features|channels|electrodes|analyses|models|predictors|exposures|subgroups|t-?\s?tests?|depths|doses|contrasts of interest|domains|indices|criteria)`

/** What may stand between the number and the noun: 'six pairwise post hoc', 'three planned', '15 independent'. */
const KINDS = String.raw`(?:(?:pair-?\s?wise|post[\s-]?hoc|planned|possible|independent|separate|individual|multiple|primary|secondary|co-primary|different|univariate|main|key|orthogonal|such|between-group|statistical|follow-?up|simultaneous|a priori|paired|unpaired|two-sample|chi-square[d]?|χ\^?2|t|simple|resulting|candidate|measured|tested|dependent|single|bivariate|Bonferroni(?:-corrected)?|correlation|group|brain|cognitive|clinical|driving)[\s-]+){0,4}`

/** 'six pairwise comparisons', 'the 80 regions', '15 tests', 'four comparisons', 'three pairs of cements'. */
const COUNTED = new RegExp(String.raw`(?<![\d.,/<>=])\b(?<n>${COUNT})[\s-]${KINDS}(?<noun>${TESTS})\b`, 'gi')

/** 'm = 6', '(k = 6 comparisons)', 'n = 3 comparisons'. */
const EQUALS = new RegExp(
  String.raw`\bm\s?=\s?(?<n>${COUNT})|\b[knN]\s?=\s?(?<n2>${COUNT})\s(?:pair-?wise\s)?(?:comparisons|tests|contrasts)`,
  'i',
)

/** '.05/6', '0.05 / 6', '5%/3', '0.05 divided by 6', 'α/6'. */
const DIVISION = new RegExp(
  String.raw`(?<alpha>(?:0?[.,]\d+|\d+(?:\.\d+)?\s?%|α|alpha))\s?(?:\/|÷|divided by)\s?(?:the number of (?:\w+\s){0,3}\(?)?(?<n>${COUNT})(?![\d.]*\s?[A-Za-z]{0,2}\/)`,
  'i',
)
/** What no division is without. */
const DIVIDES = /[/÷]|divided by/i
/** 'divided by six', 'divided by the number of comparisons (six)', 'dividing 0.05 by 6', 'dividing α by the number of tests (n = 6)'. */
const DIVIDED = new RegExp(
  String.raw`\bdivid(?:ed|ing)\b[^.;]{0,40}?\bby\s(?:the\s(?:total\s)?number of [a-z\s-]{0,40}\(?\s?(?:[mknN]\s?=\s?)?)?(?<n>${COUNT})\b`,
  'i',
)
/** 'multiplied by six', 'multiplying each of them by six', 'multiplying by the number of comparisons (six)'. */
const MULTIPLIED = new RegExp(
  String.raw`\bmultipl(?:ied|ying|ication)\b[^.;]{0,40}?\b(?:by|with)\s(?:a factor of\s)?(?:the\s(?:total\s)?number of [a-z\s-]{0,40}\(?\s?(?:[mknN]\s?=\s?)?)?(?<n>${COUNT})\b`,
  'i',
)
/** 'number of comparisons (six)', 'number of tests, 15'. */
const NUMBER_OF = new RegExp(
  String.raw`\bnumber of (?:[a-z-]+\s){0,3}(?:comparisons|tests|contrasts|pairs|outcomes|hypotheses)\s?[,(:]\s?(?:[mknN]\s?=\s?)?(?<n>${COUNT})\b`,
  'i',
)
/** 'for these three', 'for all six', 'corrected for four'. */
const FOR_THESE = new RegExp(
  String.raw`\b(?:for|over|across|of|among) (?:these|those|all|the) (?<n>${COUNT})(?=\s?[,.;)]|$)`,
  'i',
)

/** The division by which a level is corrected, '.05/6': its numerator (null for α) and divisor. */
export function findDivision(
  text: string,
): { alpha: number | null; m: number; end: number; start: number } | null {
  if (!DIVIDES.test(text)) return null
  const match = DIVISION.exec(text)
  const m = parseCount(match?.groups?.n ?? '')
  if (!match || m === null || m < 1) return null
  const printed = match.groups?.alpha ?? ''
  const number = Number(printed.replace(',', '.').replace(/\s?%/, ''))
  const alpha = Number.isFinite(number) ? (printed.includes('%') ? number / 100 : number) : null
  // other fractions are no levels: '17/0.4', '1/2'
  if (alpha !== null && (alpha <= 0 || alpha > 0.2)) return null
  return { alpha, m, start: match.index, end: match.index + match[0].length }
}

/** Whether a level is said to have been divided by a number of tests. */
export const saysDivided = (text: string): boolean =>
  DIVIDED.test(text) && /\b(?:level|alpha|threshold|significance|error)\b|α/i.test(text)

/** Whether p-values are said to have been multiplied, and by what; `m` null where no number is given. */
export function findMultiplication(text: string): { m: number | null } | null {
  const m = parseCount(MULTIPLIED.exec(text)?.groups?.n ?? '')
  if (m !== null) return { m }
  return /\bp[\s-]?values?[^.;]{0,60}\bmultipl(?:ied|ying)\b[^.;]{0,30}\b(?:by|with)\b/i.test(text)
    ? { m: null }
    : null
}

/** The number of tests that a sentence on a correction states; null where it states none. */
export function findTestCount(text: string): number | null {
  const division = findDivision(text)
  if (division) return division.m
  for (const form of [DIVIDED, MULTIPLIED, EQUALS, NUMBER_OF]) {
    const groups = form.exec(text)?.groups
    const n = parseCount(groups?.n ?? groups?.n2 ?? '')
    if (n !== null) return n
  }
  const counted = listCounts(text)
  const after = CORRECTED_FOR.exec(text)?.groups?.n
  if (after !== undefined) return parseCount(after)
  // comparisons and tests outrank other nouns; after 'for' or 'over' outranks the rest
  const best = counted.find(({ noun }) => /compar|test|contrast|pairs|hypothes/i.test(noun)) ?? counted[0]
  if (best) return best.n
  return parseCount(FOR_THESE.exec(text)?.groups?.n ?? '')
}

/** Only what is plainly a count of tests, for sentences beside the claim. */
export function findPlainTestCount(text: string): number | null {
  return listCounts(text).find(({ noun }) => /compar|test|contrast|pairs|hypothes/i.test(noun))?.n ?? null
}

function listCounts(text: string): { n: number; noun: string }[] {
  return [...text.matchAll(COUNTED)].flatMap(({ groups }) => {
    const n = parseCount(groups?.n ?? '')
    const noun = groups?.noun ?? ''
    return n === null || n < 1 || (/^p/i.test(noun) && n < 2) ? [] : [{ n, noun }]
  })
}

/** 'All six pairs were compared, and p values were Bonferroni-corrected for three comparisons': the number it is corrected for. */
const CORRECTED_FOR = new RegExp(
  String.raw`\b(?:corrected|adjusted|correction|adjustment)\s(?:for|over|across)\s(?:the\s|all\s)?(?<n>${COUNT})[\s-]${KINDS}(?:comparisons?|tests?|contrasts?|pairs)\b`,
  'i',
)

const GROUP_NOUN = String.raw`(?:groups?|arms?|treatments?|conditions?|varieties|cultivars?|doses?|concentrations?|levels?|methods?|diets?|strains?|species|sites?|streams?|media|temperatures?|schedules?|materials?|cements?|grades?|adhesives?|amendments?|additives?|inhibitors?|cues?|warm-?ups?|categories|populations?|regimens?|interventions?|genotypes?|means|estimates|samples|locations?|habitats?|seasons?|products?|brands?|formulations?|protocols?|programmes?|programs?|classes|cohorts?|quartiles|tertiles|quintiles|stations?|plots|coatings?|stages?|lines|isolates|breeds|stocks|substrates?|types|settings?|devices?|techniques?|schools?|clinics?|centres?|centers?|designs?)`

/** 'four groups', 'the four amendments', 'three setting methods', 'four-arm', 'k = 4', 'family of 4 estimates'. */
const GROUPS = new RegExp(
  String.raw`(?<![\d.,/<>=])\b(?<n>${COUNT})[\s-](?:[a-z-]+[\s-]){0,2}?${GROUP_NOUN}\b(?!\s?(?:of\s)?(?:comparisons|tests|per\b))|\bk\s?=\s?(?<n2>\d+)(?!\d|\.)`,
  'gi',
)
/** 'between the four N', 'of the five N', 'all pairs of the six N'. */
const OF_THE = new RegExp(
  String.raw`\b(?:between|among|of|on|across|for)\s(?:the|all)\s(?<n>${COUNT})\s(?!${KINDS}${TESTS}\b|(?:questions|experiments|studies|trials|tables|figures|parts|aims|days|weeks|months|years|times|families|panels|authors|operators)\b)[a-z-]+(?:\s[a-z-]+)?s\b`,
  'gi',
)

const ENDS_IN_TESTS = new RegExp(`${TESTS}$`, 'i')

/** The number of groups that a sentence states, 2 to 60; null where it states none. */
export function findGroupCount(text: string): number | null {
  for (const form of [GROUPS, OF_THE])
    for (const match of text.matchAll(form)) {
      const n = parseCount(match.groups?.n ?? match.groups?.n2 ?? '')
      if (n !== null && n >= 2 && n <= 60 && !ENDS_IN_TESTS.test(match[0].replace(/doses$/, ''))) return n
    }
  return null
}
