/**
 * Printed numbers, in folded text (see fold.ts).
 *
 * POWER: ' × 10-5', 'x10^-5', '×10^{-5}', ' × 10 -9', '5 × 10−8'; also with the superscript lost, '× 108',
 * which for a p-value can only mean 10⁻⁸.
 */
const POWER = String.raw`\s?[×x*]\s?10\s?\^?\{?\s?[-–]?\s?\d{1,3}\}?`

/** '1.2e-5', '<2.2e-16', '5E−8'. */
const EXPONENT = String.raw`[eE]\s?[-–+]?\s?\d{1,3}`

/** An unsigned decimal or whole number: '.03', '0.03', '0,03', '0. 03', '.0 31', '12', '1.2e-5', '3.2 × 10-5'. */
export const UNSIGNED = String.raw`(?:0\.\s\d{2,5}|0?\.0\s\d{2}(?![\d.,])|\d*\.\d+|\d+,\d+(?!,?\d)|\d+)(?:${EXPONENT}|${POWER})?`

/** The same with a sign: '-2.46', '– 0.5', '+1.2'. */
export const SIGNED = String.raw`[-–+]?\s?${UNSIGNED}`

/** Relations as they are printed: '=', '<', '≤', '<=', '=<', '≪', '≈'. */
export const RELATION_SIGN = String.raw`(?:=\s?<|<\s?=|=\s?>|>\s?=|&lt;|&gt;|[=<>≤≥≪≫≈~∼])`

export type PrintedNumber = { value: number; decimals: number }

/**
 * Value and position of the last printed digit: '.030' is 0.03 with 3 decimals, '1.2e-5' is 0.000012 with 6,
 * '12' has 0. `bounded` says that the number cannot exceed 1, which decides a lost exponent sign. Null when
 * the text is no number.
 */
export function parseNumber(text: string, bounded = false): PrintedNumber | null {
  const plain = text.replace(/[–−]/g, '-').replace(/[\s{}]/g, '')
  // sign, mantissa, and a power in either notation: -2.46, 1.2e-5, 3.2×10^-5
  const match = /^([-+]?)(\d*)(?:[.,](\d+))?(?:[eE]([-+]?\d+)|[×x*]10\^?([-+]?\d+))?$/.exec(plain)
  if (!match) return null
  const [, sign = '', whole = '', fraction = '', exponent, power] = match
  if (whole === '' && fraction === '') return null
  const shift = exponent ?? power ?? '0'
  const lost = bounded && power !== undefined && !/^[-+]/.test(power)
  const e = Number(lost ? `-${shift}` : shift)
  const value = Number(`${sign}${whole || '0'}.${fraction || '0'}e${e}`)
  if (!Number.isFinite(value)) return null
  return { value, decimals: Math.max(0, fraction.length - e) }
}

/** Number words that papers use for counts of groups and comparisons. */
const WORDS: Record<string, number> = {
  two: 2,
  three: 3,
  four: 4,
  five: 5,
  six: 6,
  seven: 7,
  eight: 8,
  nine: 9,
  ten: 10,
  eleven: 11,
  twelve: 12,
  thirteen: 13,
  fourteen: 14,
  fifteen: 15,
  sixteen: 16,
  seventeen: 17,
  eighteen: 18,
  nineteen: 19,
  twenty: 20,
  'twenty-one': 21,
  'twenty-four': 24,
  'twenty-eight': 28,
  thirty: 30,
  'thirty-six': 36,
  forty: 40,
  'forty-five': 45,
  fifty: 50,
  hundred: 100,
  'half a dozen': 6,
  'a dozen': 12,
  one: 1,
  single: 1,
}

/** A count in words or digits: 'six', '15', '22,277', '1 024'. */
export const COUNT = String.raw`(?:${Object.keys(WORDS)
  .sort((a, b) => b.length - a.length)
  .join('|')}|\d{1,3}(?:[,\s]\d{3})+|\d{1,6})`

/** The whole number that a count stands for, null where it is none. */
export function parseCount(text: string): number | null {
  const word = WORDS[text.toLowerCase().trim()]
  if (word !== undefined) return word
  const digits = text.replace(/[,\s]/g, '')
  return /^\d+$/.test(digits) ? Number(digits) : null
}
