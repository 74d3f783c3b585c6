import type { ReadRemark } from '../types'
import type { Frame, Word } from './words'

/**
 * Repairs relation signs, minus signs and χ that a damaged font prints as other characters. What a character
 * stands for is told by where it stands in this document: between 'p' and a decimal, or between a statistic
 * or a count and a number, there must be a relation. A common replacement found in typeset papers decides
 * only between '=', '<' and '>'; by itself it repairs nothing. Works per font, in place. Answers what was repaired,
 * and that it stays in doubt where the values alone told '<' from '='.
 */
export function repairGlyphs(frames: readonly Frame[]): ReadRemark[] {
  const lines = frames.flatMap(toLines)
  return [...repairRelations(lines), ...repairSigns(lines), ...repairChi(lines)]
}

function remark(printed: string, read: string, count: number, doubt = ''): ReadRemark {
  const places = count === 1 ? 'one place' : `${count} places`
  return {
    says: `A font of this PDF gives "${printed}" where "${read}" must stand; it was read as "${read}" in ${places}.${doubt}`,
    asks: 'Please supply the manuscript as a PDF whose fonts carry the usual characters.',
  }
}

/** A drawn line as text, with the word and index of every character (null for a space). */
type Line = { text: string; at: ({ word: Word; index: number } | null)[] }

function toLines(frame: Frame): Line[] {
  const lines: Line[] = []
  let last: Word | null = null
  for (const word of [...frame.words].sort((a, b) => a.order - b.order)) {
    let line = lines.at(-1)
    if (
      !line ||
      !last ||
      Math.abs(last.v - word.v) > 0.6 * Math.max(last.size, word.size) ||
      word.u0 < last.u0 - 2
    ) {
      line = { text: '', at: [] }
      lines.push(line)
    } else if (word.gap || word.u0 - last.u1 > 0.15 * word.size) {
      line.text += ' '
      line.at.push(null)
    }
    line.text += word.chars
    for (let index = 0; index < word.chars.length; index++) line.at.push({ word, index })
    last = word
  }
  return lines
}

// "p ¼ 0.03", "(P 5 .02", "p-value o 0.001": whatever one character stands between
const afterP = /(?<![\p{L}\d])[pP](?:[- ]?values?)? ?([^\s=<>≤≥≈~±+(–-]) ?(?=(0?[.·]\d+))/dgu
// "n ¼ 12", "t(28) ¼ 2.46", "F(2, 38) 5 3.60", "SD ¼ 4.1", "r ¼ À.35"
const afterStatistic =
  /(?<![\p{L}\d])(?:[nN]|df|SD|SE|SEM|[tFrzHQ] ?\(\d[\d., ]*\)|[tFrzZMR]|OR|HR|RR|CI|α|β) ?([^\s=<>≤≥≈~±+(–\-.,;:)/|]) ?(?=([^\s\d]? ?\d*[.·]?\d))/dgu

type Evidence = {
  char: string
  values: number[]
  other: number
  slots: { line: Line; at: number }[]
  total: number
}

const thresholds: ReadonlySet<number> = new Set([0.05, 0.01, 0.001, 0.0001, 0.005, 0.1])
const equals = '¼5Z⫽ϭ'
const greater = '[.4N⬎Ͼ'

function repairRelations(lines: readonly Line[]): ReadRemark[] {
  const remarks: ReadRemark[] = []
  const evidence = new Map<string, Evidence>()
  for (const line of lines) {
    for (const match of line.text.matchAll(afterP)) note(evidence, line, match, true)
    for (const match of line.text.matchAll(afterStatistic)) note(evidence, line, match, false)
  }
  countAll(lines, evidence)
  for (const found of evidence.values()) {
    const relation = readRelation(found)
    if (relation === null) continue
    const everywhere = !isPlain(found.char) || found.total <= 1.5 * found.slots.length
    if (everywhere) replaceAll(lines, found, relation)
    else for (const { line, at } of found.slots) put(line, at, relation)
    // beside conventional levels '<' is likelier than '=', and no more than that
    const doubt =
      relation === '<' ? ' Whether "=" is meant the values alone cannot tell; compare the page.' : ''
    remarks.push(remark(found.char, relation, everywhere ? found.total : found.slots.length, doubt))
  }
  return remarks
}

function note(
  evidence: Map<string, Evidence>,
  line: Line,
  match: RegExpExecArray | RegExpMatchArray,
  p: boolean,
): void {
  const at = match.indices?.[1]?.[0]
  const place = at === undefined ? null : line.at[at]
  const char = match[1]
  if (at === undefined || !place || char === undefined) return
  if (isPlain(char) && !standsApart(line, at)) return
  const key = `${place.word.font}|${char}`
  const found = evidence.get(key) ?? { char, values: [], other: 0, slots: [], total: 0 }
  evidence.set(key, found)
  found.slots.push({ line, at })
  if (p) found.values.push(Number((match[2] ?? '').replace('·', '.')))
  else found.other++
}

/** Letters, digits and common marks, which also stand for themselves. */
function isPlain(char: string): boolean {
  return /[\x20-\x7e]/.test(char)
}

/** Drawn in another font than both its neighbours, or alone between spaces. */
function standsApart(line: Line, at: number): boolean {
  const own = line.at[at]?.word
  const left = line.at[at - 1] ?? line.at[at - 2]
  const right = line.at[at + 1] ?? line.at[at + 2]
  if (!own || !left || !right) return false
  if (own.font !== left.word.font && own.font !== right.word.font) return true
  return line.at[at - 1] === null && line.at[at + 1] === null && own.chars.length === 1
}

function countAll(lines: readonly Line[], evidence: ReadonlyMap<string, Evidence>): void {
  for (const line of lines)
    for (const place of line.at) {
      if (!place) continue
      const found = evidence.get(`${place.word.font}|${place.word.chars[place.index] ?? ''}`)
      if (found) found.total++
    }
}

function readRelation({ char, values, other }: Evidence): string | null {
  const common = values.length > 0 && values.every((value) => thresholds.has(value))
  const count = values.length + other
  if (values.length === 0 ? count < 3 : count < 2 && isPlain(char)) return null
  if (other > values.length || equals.includes(char)) return '='
  if (greater.includes(char)) return '>'
  return common ? '<' : '='
}

function replaceAll(lines: readonly Line[], { char, slots }: Evidence, by: string): void {
  const first = slots[0]
  const font = first?.line.at[first.at]?.word.font
  for (const line of lines)
    line.at.forEach((place, at) => {
      if (place && place.word.font === font && place.word.chars[place.index] === char) put(line, at, by)
    })
}

function put(line: Line, at: number, by: string): void {
  const place = line.at[at]
  if (!place) return
  const { word, index } = place
  word.chars = word.chars.slice(0, index) + by + word.chars.slice(index + 1)
  line.text = line.text.slice(0, at) + by + line.text.slice(at + 1)
}

// "= À2.46", "(Ϫ0.35": a character that no number begins with, where a sign must stand
const sign =
  /[=<>(,] ?([\u00c0-\u00d6\u00d8-\u00f6\u00f8-\u00ff\u03e2-\u03ef\u2a00-\u2aff\ue000-\uf8ff?]) ?(?=\d*[.·]?\d)/dgu

function repairSigns(lines: readonly Line[]): ReadRemark[] {
  const remarks: ReadRemark[] = []
  const places = new Map<string, { line: Line; at: number }[]>()
  for (const line of lines)
    for (const match of line.text.matchAll(sign)) {
      const at = match.indices?.[1]?.[0]
      const word = at === undefined ? undefined : line.at[at]?.word
      if (at === undefined || !word) continue
      const key = `${word.font}|${match[1] ?? ''}`
      places.set(key, [...(places.get(key) ?? []), { line, at }])
    }
  for (const [key, found] of places) {
    if (key.endsWith('?') && found.length < 2) continue
    for (const { line, at } of found) put(line, at, '-')
    remarks.push(remark(key.slice(key.lastIndexOf('|') + 1), '−', found.length))
  }
  return remarks
}

// "v2(2) = 6.15", "(w2 = 4.1": a letter with a raised 2, as a test statistic
const chi = /(?<![\p{L}\d])([vwc])(2) ?(?:\(\d|[=<>])/dgu

function repairChi(lines: readonly Line[]): ReadRemark[] {
  const letters: string[] = []
  for (const line of lines)
    for (const match of line.text.matchAll(chi)) {
      const at = match.indices?.[1]?.[0]
      if (at === undefined) continue
      const [letter, two] = [line.at[at]?.word, line.at[at + 1]?.word]
      if (letter && two && letter !== two && two.size < 0.9 * letter.size) {
        letters.push(match[1] ?? '')
        put(line, at, 'χ')
      }
    }
  return [...new Set(letters)].map((letter) =>
    remark(letter, 'χ', letters.filter((one) => one === letter).length),
  )
}
