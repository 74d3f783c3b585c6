import type { Word } from './words'

/** Where a character of the text was drawn; null for a character that the layout added (a space, a mark). */
export type Origin = { word: Word; from: number; to: number } | null
export type Written = { text: string; origins: Origin[] }

/**
 * The text of words in reading order on one line. Raised characters are written with '^', lowered ones with
 * '_' before them ('10^-5', 'F_2,38', 'kg^a'), save: χ² is 'χ2'; raised asterisks and daggers stand plain
 * ('0.03*'); 1st, 2nd … stand plain.
 */
export function writeLine(words: readonly Word[]): Written {
  let text = ''
  const origins: Origin[] = []
  let last: Word | null = null
  for (const word of words) {
    const spaced = last !== null && isSpaced(last, word)
    if (spaced) {
      text += ' '
      origins.push(null)
    }
    const mark = getMark(word, spaced ? null : last, text)
    if (mark) {
      text += mark
      origins.push(null)
    }
    for (let unit = 0; unit < word.chars.length; unit++)
      origins.push({ word, from: word.edges[unit] ?? word.u0, to: word.edges[unit + 1] ?? word.u1 })
    text += word.chars
    last = word
  }
  return { text, origins }
}

function isSpaced(last: Word, word: Word): boolean {
  const size = Math.max(last.size, word.size)
  const gap = word.u0 - last.u1
  if (word.gap && gap > 0.06 * size) return word.level === last.level || gap > 0.16 * size
  return gap > 0.17 * size
}

// asterisks and daggers, which mark by themselves
const selfMarking = /^[*†‡§¶#∥‖]+[,]?$/
// endings of ordinals: 1st 2nd 3rd 4th
const ordinal = /^(?:st|nd|rd|th)$/
// signs that stand between operands and are never raised: a font may draw them a little higher
const operator = /^[±=×<>≤≥~≈·+]+$/

function getMark(word: Word, last: Word | null, before: string): string {
  if (word.level === 0 || last?.level === word.level) return ''
  if (selfMarking.test(word.chars) || operator.test(word.chars)) return ''
  if (word.level === 1) {
    if (ordinal.test(word.chars)) return ''
    if (word.chars.startsWith('2') && /[χΧ]$/.test(before)) return ''
    return last === null && before !== '' && !before.endsWith(' ') ? '' : '^'
  }
  return last === null ? '' : '_'
}
