import { SEVERITIES, type Severity } from '@/lib/checks/vocabulary'
import type { Verdict } from '@/lib/rules/words'
import { escapeMarkdown } from './escape-markdown'

/** A point that the reviewer kept. */
export type LetterPoint = {
  severity: Severity
  familyLabel: string
  says: string
  asks: string
  quote: string
  page: number | null
  row: number | null
  sheet: string | null
  cites: readonly string[]
}

export type LetterComment = { body: string; targetLabel: string; page: number | null }

export type Letter = {
  house: string
  reference: string | null
  title: string
  round: number
  verdict: Verdict
  greeting: string
  closing: string
  answerDays: number
  /** In the order of the reviewer; the letter puts them by severity. */
  points: readonly LetterPoint[]
  comments: readonly LetterComment[]
  /** What a key of published guidance stands for, or null where it is not known. */
  cite: (key: string) => string | null
}

const verdicts: Record<Verdict, string> = {
  sound: 'Sound. We have no objection to how the manuscript handles multiple comparisons.',
  'sound after changes':
    'Sound after changes. We have no objection to how the manuscript handles multiple comparisons once the points below are dealt with.',
  'not supported':
    'Not supported. As they are printed, the numbers do not bear out every conclusion drawn from them; the points below say which ones, and what would help.',
  'cannot be judged from what is given':
    'Cannot be judged from what is given. What is printed does not let us tell whether the conclusions hold; the points below say what is needed.',
}

const sections: Record<Severity, { heading: string; lead: string }> = {
  major: {
    heading: 'Points on which a conclusion depends',
    lead: 'With these, a conclusion may change or cannot be judged yet.',
  },
  minor: {
    heading: 'Points to be put right',
    lead: 'These call for a change; no conclusion depends on them.',
  },
  question: { heading: 'Questions', lead: 'Your answer is needed before we can judge.' },
  note: { heading: 'Notes', lead: 'For your information; nothing has to be done.' },
}

/**
 * The letter to the authors as Markdown, for the reviewer to edit. It names nobody: who the authors and the
 * reviewer are is for the house rules to say.
 */
export function composeLetter(letter: Letter): string {
  return (
    [
      'Dear authors,',
      escapeMarkdown(letter.greeting),
      aboutLine(letter),
      `**Verdict: ${verdicts[letter.verdict].replace('.', '.**')}`,
      ...pointSections(letter),
      ...commentSection(letter.comments),
      ...endSection(letter),
    ].join('\n\n') + '\n'
  )
}

function aboutLine({ reference, title, round }: Letter): string {
  const revision = round > 1 ? `, revision ${round - 1}` : ''
  const name = title === '' ? 'Your manuscript' : `“${escapeMarkdown(title)}”`
  return `Manuscript: ${name}${reference === null ? '' : ` (${reference}${revision})`}`
}

function pointSections({ points, cite }: Letter): string[] {
  if (points.length === 0) return ['There is no point that we ask you to deal with.']
  let number = 0
  return SEVERITIES.flatMap((severity) => {
    const chosen = points.filter((point) => point.severity === severity)
    if (chosen.length === 0) return []
    const { heading, lead } = sections[severity]
    const items = chosen.flatMap((point) => {
      number += 1
      return pointParagraphs(point, number, cite)
    })
    return [`## ${heading}`, lead, ...items]
  })
}

function pointParagraphs(point: LetterPoint, number: number, cite: Letter['cite']): string[] {
  const place = placeOf(point)
  const heading = [escapeMarkdown(point.familyLabel), place].filter((part) => part !== '').join(', ')
  const cited = point.cites.map(cite).filter((text) => text !== null)
  return [
    `### Point ${number}${heading === '' ? '' : `: ${heading}`}`,
    ...(point.quote === '' ? [] : [`> ${escapeMarkdown(point.quote)}`]),
    ...(point.says === '' ? [] : [`What we see: ${escapeMarkdown(point.says)}`]),
    `${point.severity === 'note' ? 'For your information' : 'What we ask'}: ${escapeMarkdown(point.asks)}`,
    ...(cited.length === 0 ? [] : [`See: ${cited.map(escapeMarkdown).join(' ')}`]),
  ]
}

function placeOf({ page, row, sheet }: Pick<LetterPoint, 'page' | 'row' | 'sheet'>): string {
  if (page !== null) return `page ${page}`
  if (row === null) return ''
  return `results table, ${sheet === null ? '' : `sheet ${escapeMarkdown(sheet)}, `}row ${row}`
}

function commentSection(comments: readonly LetterComment[]): string[] {
  if (comments.length === 0) return []
  const items = comments.map(({ body, targetLabel, page }) => {
    const place = [escapeMarkdown(targetLabel), page === null ? '' : `page ${page}`].filter((p) => p !== '')
    const lead = place.length === 0 ? '' : `(${place.join(', ')}) `
    // A comment is the reviewer's own Markdown: its further lines stand under the same bullet.
    return `- ${lead}${body.trim().replace(/\n(?=[^\n])/g, '\n  ')}`
  })
  return ['## Further comments', items.join('\n')]
}

function endSection({ verdict, points, answerDays, closing, house, reference }: Letter): string[] {
  const asked = verdict !== 'sound' || points.some((point) => point.severity !== 'note')
  return [
    '## How to read this letter',
    'What is printed in a manuscript is rounded, so each number that we recompute is a range; where we say that something cannot be decided, that is not an error. Reading can miss or misread a number: if we did, please tell us where. A difference between two numbers says nothing about how it came about. What this letter does not mention, such as the design, missing data or tests that are not reported, was not looked at.',
    escapeMarkdown(closing),
    ...(asked ? [`We should be glad to have your answer, point by point, within ${answerDays} days.`] : []),
    `With kind regards\\\n${escapeMarkdown(house)}${reference === null ? '' : `\\\n${reference}`}`,
  ]
}
