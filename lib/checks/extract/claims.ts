import type { LaidOut, Place, Reading, ReadClaim, SectionKind } from '../types'
import type { ClaimedProcedure } from '../vocabulary'
import { isCitedWork } from './grammar/cited-work'
import {
  findErrorRate,
  findScope,
  isOwnUse,
  saysCorrected,
  saysPCorrected,
  saysUncorrected,
} from './grammar/correction'
import {
  findDivision,
  findGroupCount,
  findMultiplication,
  findPlainTestCount,
  findTestCount,
  saysDivided,
} from './grammar/counts'
import { findAlpha, findThreshold } from './grammar/level'
import { findProcedures } from './grammar/procedure'
import { cutText, type Sentence } from './sentences'
import { placeIn } from './places'

/** Named adjustments beside which Dunn's name means the test statistic, and 'FDR' the rate. */
const ADJUSTMENTS = new Set<ClaimedProcedure>([
  'bonferroni',
  'holm',
  'sidak',
  'holm-sidak',
  'hochberg',
  'hommel',
  'bh',
  'by',
  'bky',
  'storey',
  'fdr',
])
const FDR_PROCEDURES = new Set<ClaimedProcedure>(['bh', 'by', 'bky', 'storey'])

/** A line of a list of references: '12. Holm S. … 1979; 6(2): 65–70', and lists of keywords. */
const NO_PROSE =
  /\b(?:19|20)\d\d\b[^.]{0,12};\s?\d+|\b\d+\s?\(\d+\)\s?:\s?\d+|\bdoi\b|^\s*\[\d+\]|^\s*key\s?words?\b/i

/** What the authors say they corrected, from text, captions and notes; one claim for each sentence and procedure. */
export function findClaims(laidOut: LaidOut, sentences: readonly Sentence[]): ReadClaim[] {
  const claims: ReadClaim[] = []
  sentences.forEach((sentence, i) => {
    if (NO_PROSE.test(sentence.text)) return
    const listBeside = () =>
      [sentences[i - 1], sentences[i + 1]]
        .filter(
          (other): other is Sentence =>
            other?.paragraph === sentence.paragraph && findProcedures(other.text).length === 0,
        )
        .map(({ text }) => text)
    claims.push(
      ...claimsOf(sentence.text, sentence.section, listBeside).map((claim) => ({
        ...claim,
        id: '',
        offset: sentence.start,
        section: sentence.section,
        place: placeIn(laidOut.prose, sentence.start, sentence.start + sentence.text.length),
      })),
    )
  })
  for (const table of laidOut.tables)
    for (const text of [table.caption, table.notes].flatMap(cutText)) {
      const place: Place = {
        source: 'pdf-table',
        page: table.page,
        row: null,
        sheet: null,
        quote: text.trim(),
        boxes: [],
      }
      claims.push(
        ...claimsOf(text, 'results', () => []).map((claim) => ({
          ...claim,
          id: '',
          offset: table.offset,
          section: 'results' as const,
          place,
        })),
      )
    }
  // Dunn's test with a named adjustment anywhere: his name is that of the statistic everywhere
  const adjusted = claims.some(
    ({ procedure, sentence }) =>
      ADJUSTMENTS.has(procedure) && /\bDunn(?!et|\S*\s?[-–]\s?(?:Š|S[iı]d|Bonf))/.test(sentence),
  )
  return claims
    .filter(({ procedure }) => procedure !== 'dunn' || !adjusted)
    .map((claim, i) => ({ ...claim, id: `c${i + 1}` }))
}

type Bare = Omit<ReadClaim, 'id' | 'offset' | 'section' | 'place'>

/**
 * The claims of one sentence (folded). `listBeside` gives the sentences before and after it in its paragraph; it is
 * asked only where there is a claim.
 */
export function claimsOf(text: string, section: SectionKind, listBeside: () => readonly string[]): Bare[] {
  if (isCitedWork(text, section)) return []
  const procedures = findClaimed(text, section)
  if (procedures.length === 0) return []
  const beside = listBeside()
  const groups = first([text, ...beside], findGroupCount)
  const alpha = findAlpha(text)
  return procedures.map((procedure) => {
    const m = procedure === 'none' ? null : countTests(text, beside)
    const threshold = procedure === 'none' ? null : findThreshold(text)
    return {
      procedure,
      m,
      alpha,
      threshold,
      groups,
      sentence: text.trim(),
      scope: findScope(text, procedure),
      errorRate: findErrorRate(text),
    }
  })
}

function findClaimed(text: string, section: SectionKind): ClaimedProcedure[] {
  if (saysUncorrected(text) && section !== 'introduction' && section !== 'references') return ['none']
  const mentions = findProcedures(text)
  const own = mentions
    .filter(({ start, end }) => isOwnUse(text, start, end, section))
    .map(({ procedure }) => procedure)
    .filter((procedure, _, all) => procedure !== 'dunn' || !all.some((other) => ADJUSTMENTS.has(other)))
    .filter((procedure, _, all) => procedure !== 'fdr' || !all.some((other) => FDR_PROCEDURES.has(other)))
    .filter((procedure) => procedure !== 'fdr' || CONTROLS_FDR.test(text))
  const unique = [...new Set(own)]
  if (unique.length > 0) return unique
  if (mentions.some(({ procedure }) => procedure !== 'fdr')) return []
  if (section === 'introduction' || section === 'references') return []
  if (!isOwnUse(text, 0, 0, section)) return []
  // the arithmetic names the procedure where no name does: .05/6, values times six
  if (
    (findDivision(text) || saysDivided(text)) &&
    /\b(?:level|alpha|threshold|significan|correct|adjust)|α|\b[pP]\b/i.test(text)
  )
    return ['bonferroni']
  if (/\b[pP][\s-]?values?\b|\b[pP]s\b/.test(text) && findMultiplication(text)) return ['bonferroni']
  if (!saysCorrected(text) && !saysPCorrected(text)) return []
  return [isQuotient(text) ? 'bonferroni' : 'unspecified']
}

/** 'controlled', 'corrected', 'at a rate of', 'q < .05 was': the rate is held, not merely named. */
const CONTROLS_FDR =
  /control|correct|adjust|procedure|method|threshold|\bat (?:a|an|the)?\s?(?:\w+\s){0,4}|<|≤|below|rate of|significan|apply|applied|used/i

/** 'P < 0.0125 after correction for four tests': the level is a quotient of the usual one. */
function isQuotient(text: string): boolean {
  const level = findThreshold(text)
  const m = findTestCount(text)
  if (level === null || m === null || m < 2) return false
  return [0.05, 0.01, 0.1].some((alpha) => Math.abs(alpha / m - level) / level < 0.02)
}

function countTests(text: string, beside: readonly string[]): number | null {
  return findTestCount(text) ?? first(beside, findPlainTestCount)
}

function first<T>(texts: readonly string[], find: (text: string) => T | null): T | null {
  for (const text of texts) {
    const found = find(text)
    if (found !== null) return found
  }
  return null
}

/** The general level of significance and where it stands, else the house's with no quote. */
export function findGeneralAlpha(
  laidOut: LaidOut,
  sentences: readonly Sentence[],
  fallback: number,
): Reading['alpha'] {
  const stated = sentences
    .filter(
      ({ text, section }) => section !== 'references' && section !== 'introduction' && !NO_PROSE.test(text),
    )
    .filter(({ text }) =>
      /signific|alpha|α|level|error|threshold|\b[pPq][\s-]?(?:values?)?\s?[<≤]|below|compared with/i.test(
        text,
      ),
    )
    .map((sentence) => ({ sentence, value: findAlpha(sentence.text) }))
    .filter((found): found is { sentence: Sentence; value: number } => found.value !== null)
    .map((found) => ({ ...found, weight: weigh(found.sentence) }))
    .filter(({ weight }) => weight > 0)
    .sort((a, b) => b.weight - a.weight || a.sentence.start - b.sentence.start)
  const best = stated[0]
  if (!best) return { value: fallback, quote: null, page: null }
  const { text, start } = best.sentence
  return { value: best.value, quote: text.trim().replace(/\s+/g, ' '), page: laidOut.prose.pageOf(start) }
}

/** How plainly a sentence states the general level. */
function weigh({ text, section, caption }: Sentence): number {
  if (/sample[\s-]size|\bpower\b|to detect\b/i.test(text)) return section === 'methods' ? 0.5 : 0
  if (caption) return 0.4
  const plain =
    /\b(?:set|considered|regarded|accepted|taken|defined|significance level|level of significance|called|declared|judged|deemed|required|refer)\b|\bα\s?=|\balpha\b|compared with/i.test(
      text,
    )
      ? 2
      : 0
  const corrected = findDivision(text) ? -0.5 : 0
  return (
    plain +
    corrected +
    (section === 'methods' ? 1 : section === 'results' ? 0.3 : section === 'discussion' ? -1.5 : 0)
  )
}
