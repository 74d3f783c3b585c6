import type { Prose, SectionKind } from '../types'
import { fold } from './grammar/fold'

/** One sentence of the prose: folded text, where it begins, and what surrounds it. */
export type Sentence = {
  text: string
  start: number
  section: SectionKind
  heading: string
  /** The paragraph is the caption of a figure or table, or a note below one. */
  caption: boolean
  /** Running number of the paragraph it stands in. */
  paragraph: number
}

/** Words before a full stop that does not end a sentence: 'vs.', 'Fig. 2', 'et al.', 'approx.', 'd.f.'. */
const ABBREVIATION =
  /(?:\b(?:vs|v|e\.g|i\.e|cf|al|approx|ca|no|nos|fig|figs|tab|eq|eqs|ref|refs|resp|dr|prof|st|spp?|subsp|var|cv|pp?|vol|ed|eds|adj|corr|unadj|unc|max|min|incl|excl|exp|expt|sec|sect|suppl|bonf|sig|asymp|d\.f|df|n\.s|a\.m|p\.m|s\.d|s\.e|s\.e\.m|s\.d|i\.v|i\.p|et)|\b[A-Z]\.\s?[A-Z])\.$/i

/** A paragraph that is a caption: 'Figure 2. …', 'Fig 3: …', 'Table S1 …', 'TABLE II. …'. */
const CAPTION =
  /^\s*(?:supplement\w*\s+|extended data\s+)?(?:fig(?:ure)?s?|table|tab)\.?\s*(?:S?\d+|[IVX]+)\b\s*[.:|)–-]?\s*\D/i

/** A note below a table or figure: 'Note. …', '* p < 0.05 …', 'Values are means …', 'a,b Means with …'. */
const NOTE =
  /^\s*(?:notes?[.:]\s|[*†‡#§]{1,4}\s?,?\s?[pP]|(?:values|data|results|means)\s+(?:are|is|represent|with|in)\b.{0,60}(?:mean|±|SE|SD|letter|superscript)|[a-d](?:[,–-]\s?[a-d])*\s*(?:means?|values?)\s+(?:with|in|followed)\b)/i

/** Splits the prose into sentences; paragraphs and headings always end one. Offsets are those of `prose.text`. */
export function splitSentences(prose: Prose): Sentence[] {
  const text = fold(prose.text)
  const sentences: Sentence[] = []
  let paragraph = 0
  for (const { start, end } of findParagraphs(text)) {
    const body = text.slice(start, end)
    const section = sectionAt(prose, start)
    const caption = CAPTION.test(body) || NOTE.test(body)
    for (const [from, to] of cutSentences(body))
      sentences.push({ text: body.slice(from, to), start: start + from, ...section, caption, paragraph })
    paragraph += 1
  }
  return sentences
}

/** The sentences of one loose text, such as a table's caption and notes. */
export function cutText(text: string): string[] {
  const folded = fold(text)
  return cutSentences(folded).map(([from, to]) => folded.slice(from, to))
}

function findParagraphs(text: string): { start: number; end: number }[] {
  const found: { start: number; end: number }[] = []
  let start = 0
  // paragraphs stand apart by an empty line
  for (const gap of text.matchAll(/\n\s*\n/g)) {
    found.push({ start, end: gap.index })
    start = gap.index + gap[0].length
  }
  found.push({ start, end: text.length })
  return found.filter(({ start: from, end: to }) => text.slice(from, to).trim() !== '')
}

function sectionAt(prose: Prose, offset: number): { section: SectionKind; heading: string } {
  const within = prose.sections.filter((section) => section.start <= offset && offset < section.end)
  const inner = within[within.length - 1]
  return inner ? { section: inner.kind, heading: inner.heading } : { section: 'other', heading: '' }
}

function cutSentences(body: string): [number, number][] {
  const cuts: [number, number][] = []
  let from = 0
  // a full stop (and closing brackets), white space, then what can begin a sentence
  for (const match of body.matchAll(/[.!?]['")\]]*\s+(?=['"(\[]?[A-ZÀ-ÝΑ-Ω]|-?\d|[a-z]+[\s-]|[*†‡#§])/g)) {
    const stop = match.index + 1
    if (!endsSentence(body, from, stop, match[0].length)) continue
    cuts.push([from, match.index + match[0].trimEnd().length])
    from = match.index + match[0].length
  }
  if (body.slice(from).trim() !== '') cuts.push([from, body.length])
  return cuts.flatMap((cut) => chop(body, cut))
}

/** Longest stretch that is read as one sentence; lists and console output know no full stops. */
const LONGEST = 900

/** Cuts an endless sentence after a bracket, semicolon, comma or blank, whichever comes last before the limit. */
function chop(body: string, [from, to]: [number, number]): [number, number][] {
  const pieces: [number, number][] = []
  let start = from
  while (to - start > LONGEST) {
    const stretch = body.slice(start + LONGEST / 2, start + LONGEST)
    const at = [') ', '; ', ', ', ' ']
      .map((mark) => stretch.lastIndexOf(mark) + mark.length)
      .find((i) => i > 2)
    const end = start + LONGEST / 2 + (at ?? LONGEST / 2)
    pieces.push([start, end])
    start = end
  }
  return [...pieces, [start, to]]
}

function endsSentence(body: string, from: number, stop: number, width: number): boolean {
  if (ABBREVIATION.test(body.slice(from, stop))) return false
  const next = body.slice(stop + width - 1, stop + width + 1)
  // a lower-case beginning ends a sentence only after a closing bracket or a word, as in '… (p = .03). p-values'
  if (/^[a-z]/.test(next) && !/^p[\s-]/i.test(next)) return false
  if (/^-?\d/.test(next)) return /[a-z)\]]\.$/.test(body.slice(0, stop))
  return true
}
