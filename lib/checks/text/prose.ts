import type { Box, Prose } from '../types'
import { normalise } from './normalise'
import type { Row } from './rows'
import { toPageBox } from './words'
import { writeLine, type Origin, type Written } from './write-line'

/** Words of a document that stand unbroken on a line; they tell how a word broken at a line's end is joined. */
export type Vocabulary = ReadonlySet<string>

// a word of letters, with hyphens inside: "two-sample"
const wordPattern = /\p{L}+(?:-\p{L}+)*/gu

export function readVocabulary(lines: Iterable<string>): Vocabulary {
  const vocabulary = new Set<string>()
  let broken = false
  for (const line of lines) {
    const found = [...line.matchAll(wordPattern)]
    found.forEach((match, index) => {
      const brokenOff = index === found.length - 1 && /[-\u00ad]$/.test(line)
      const cutBefore = index === 0 && broken
      if (!brokenOff && !cutBefore) vocabulary.add(match[0].toLowerCase())
    })
    broken = /[-\u00ad]$/.test(line)
  }
  return vocabulary
}

/** Joins the lines of a paragraph: hyphenation undone, one space between lines. */
export function joinRows(rows: readonly Row[], vocabulary: Vocabulary): Written {
  let text = ''
  const origins: Origin[] = []
  for (const row of rows) {
    const line = writeLine(row.segments.flatMap((segment) => segment.words))
    if (line.text === '') continue
    if (text !== '') {
      const join = howToJoin(text.slice(-60), line.text.slice(0, 60), vocabulary)
      if (join === 'drop-hyphen') {
        text = text.slice(0, -1)
        origins.pop()
      } else if (join === 'space') {
        text += ' '
        origins.push(null)
      }
    }
    text += line.text
    for (const origin of line.origins) origins.push(origin)
  }
  return normalise({ text, origins })
}

// second parts of compounds that keep their hyphen: "Bonferroni-corrected", "two-sided", "least-squares"
const compoundEnd =
  /^(?:corrected|adjusted|based|wise|sided|tailed|sample|squares?|hoc|values?|tests?|free|controlled|blind(?:ed)?|generated|specific|dependent|independent|induced|treated|related|level|term|group|factor|way|fold|rank|down|up|off|effects?|life|year|old|time|like)\b/i

function howToJoin(before: string, after: string, vocabulary: Vocabulary): 'space' | 'close' | 'drop-hyphen' {
  if (before.endsWith('\u00ad')) return 'drop-hyphen'
  if (/\d[–-]$/.test(before) && /^\d/.test(after)) return 'close'
  if (/[=<>≤≥] ?[-–]$/.test(before) && /^[\d.]/.test(after)) return 'close'
  const left = /(\p{L}+(?:-\p{L}+)*)-$/u.exec(before)?.[1]
  const right = /^(\p{L}+)/u.exec(after)?.[1]
  if (!left || !right)
    return /\p{L}-$/u.test(before) && /^\d/.test(after)
      ? 'close'
      : /\d-$/.test(before) && right
        ? 'close'
        : 'space'
  if (/^\p{Lu}/u.test(right)) return 'close'
  const whole = (left + right).toLowerCase()
  const hyphened = `${left}-${right}`.toLowerCase()
  const tail = left.split('-').at(-1) ?? left
  if (vocabulary.has(hyphened)) return 'close'
  if (vocabulary.has(whole) || vocabulary.has((tail + right).toLowerCase())) return 'drop-hyphen'
  if (tail.length === 1) return 'close'
  if (left.length > 2 && compoundEnd.test(after)) return 'close'
  const both = vocabulary.has(tail.toLowerCase()) && vocabulary.has(right.toLowerCase())
  return both && tail.length > 2 && right.length > 3 ? 'close' : 'drop-hyphen'
}

/** Prose with the way back from every character to its page and box. */
export function toProse(text: string, origins: readonly Origin[], sections: Prose['sections']): Prose {
  const nearest = (offset: number): Origin => {
    for (let step = 0; step < origins.length; step++) {
      const before = origins[offset - step] ?? null
      const after = origins[offset + step] ?? null
      if (after ?? before) return after ?? before
      if (offset - step < 0 && offset + step >= origins.length) return null
    }
    return null
  }
  return {
    text,
    sections,
    pageOf: (offset) => nearest(Math.max(0, Math.min(offset, origins.length - 1)))?.word.page ?? 1,
    boxesOf: (start, end) => findBoxes(origins, Math.max(0, start), Math.min(end, origins.length)),
  }
}

type Stretch = {
  u0: number
  u1: number
  v0: number
  v1: number
  base: number
  size: number
  origin: NonNullable<Origin>
}

function findBoxes(origins: readonly Origin[], start: number, end: number): Box[] {
  const stretches: Stretch[] = []
  for (let at = start; at < end; at++) {
    const origin = origins[at]
    if (!origin) continue
    const { word, from, to } = origin
    const last = stretches.at(-1)
    const sameLine =
      last !== undefined &&
      last.origin.word.page === word.page &&
      last.origin.word.turn === word.turn &&
      Math.abs(last.base - word.v) < 0.75 * Math.max(last.size, word.size) &&
      from > last.u0 - last.size
    if (last && sameLine) {
      last.u0 = Math.min(last.u0, from)
      last.u1 = Math.max(last.u1, to)
      last.v0 = Math.min(last.v0, word.v + word.drop)
      last.v1 = Math.max(last.v1, word.v + word.rise)
      if (word.size > last.size) {
        last.size = word.size
        last.base = word.v
      }
    } else
      stretches.push({
        u0: from,
        u1: to,
        v0: word.v + word.drop,
        v1: word.v + word.rise,
        base: word.v,
        size: word.size,
        origin,
      })
  }
  return stretches.map((s) => toPageBox(s.origin.word.turn, s.u0, s.v0, s.u1, s.v1))
}
