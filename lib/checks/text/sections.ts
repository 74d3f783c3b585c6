import type { Prose, SectionKind } from '../types'
import { isFigureCaption } from './captions'
import { depthOf, kindOfHeading, readRunIn, stripNumber } from './headings'
import { styleOf, type Paragraph } from './paragraphs'

/** A paragraph as the sections see it: where it starts, how long it is, what heading it is or begins with. */
export type Mark = {
  at: number
  length: number
  paragraph: Paragraph['kind']
  head: Head | null
  figure: boolean
  sentences: number
  references: boolean
}

type Head = { text: string; kind: SectionKind | null; depth: number; style: string; runIn: boolean }

export function toMark(part: Paragraph, text: string, at: number): Mark {
  const run = readRunIn(text)
  const common = {
    at,
    length: text.length,
    paragraph: part.kind,
    figure: isFigureCaption(text),
    sentences: text.split(/[.!?] (?=\p{Lu})/u).length,
    references: opensReferences(text),
  }
  if (run) return { ...common, head: { text: run.heading, kind: run.kind, depth: 1, style: '', runIn: true } }
  if (part.kind !== 'heading') return { ...common, head: null }
  const kind = kindOfHeading(text)
  return { ...common, head: { text, kind, depth: depthOf(text), style: styleOf(part), runIn: false } }
}

/**
 * Sections from the headings, covering the text without gaps. What stands before the first heading is the
 * title; a long paragraph there is the abstract. A heading that tells nothing belongs to the section it
 * stands in, save after the introduction, where a heading of the first rank opens a part of its own.
 */
export function findSections(marks: readonly Mark[], length: number): Prose['sections'] {
  if (length === 0) return []
  const ranks = new Set(
    marks.flatMap(({ head }) => (head && isMain(head) && head.depth <= 1 ? [head.style] : [])),
  )
  const opening = findOpening(marks)
  const sections: Prose['sections'] = [{ kind: 'title', heading: '', start: 0, end: 0 }]
  for (const mark of marks) {
    const current = sections.at(-1)
    if (!current) break
    current.end = mark.at
    const next = turnAt(mark, current.kind, opening, ranks)
    if (next) sections.push({ ...next, start: mark.at, end: mark.at })
  }
  const last = sections.at(-1)
  if (last) last.end = length
  const covering = sections.filter((section) => section.end > section.start)
  const only = covering.length === 1 ? covering[0] : undefined
  if (only?.kind === 'title') only.kind = 'other'
  return covering
}

function turnAt(
  mark: Mark,
  current: SectionKind,
  opening: number | null,
  ranks: ReadonlySet<string>,
): { kind: SectionKind; heading: string } | null {
  const { head } = mark
  if (mark.at === opening) return { kind: 'abstract', heading: '' }
  if (head && (head.kind !== null || current !== 'title'))
    return { kind: nextKind(head, current, ranks), heading: stripNumber(head.text) }
  if (mark.references && current !== 'references') return { kind: 'references', heading: '' }
  return current === 'references' && mark.figure ? { kind: 'other', heading: '' } : null
}

function isMain(head: Head): boolean {
  return head.kind !== null && head.kind !== 'abstract' && head.kind !== 'other' && !head.runIn
}

function nextKind(head: Head, current: SectionKind, ranks: ReadonlySet<string>): SectionKind {
  if (head.kind !== null) return head.kind
  const first = head.depth === 1 || (head.depth === 0 && ranks.has(head.style))
  return current === 'introduction' && first ? 'other' : current
}

/** Offset of an abstract that has no heading: the first long paragraph before any heading that tells. */
function findOpening(marks: readonly Mark[]): number | null {
  if (marks.some(({ head }) => head?.kind === 'abstract')) return null
  for (const mark of marks) {
    if (mark.head?.kind && mark.head.kind !== 'other') return null
    if (mark.paragraph !== 'heading' && mark.sentences >= 2 && mark.length > 150 && mark.at > 0)
      return mark.at
  }
  return null
}

// the first entry of a numbered list of references: "1. Name A, Name B. Title. Journal 2004; 3(2): 1–9"
const firstEntry = /^\[?1[\].]{1,2} ?\p{Lu}[\p{L}’'-]+,? (?:\p{Lu}|and )/u

/** A list of references without a heading. */
function opensReferences(text: string): boolean {
  if (!firstEntry.test(text)) return false
  const years = /\b(?:19|20)\d\d\b/.test(text)
  return years && /\bdoi\b|\d\(\d|\d ?[:;] ?\d|pp?\. ?\d/i.test(text)
}
