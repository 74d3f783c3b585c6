/**
 * Characters of a run as the engine reads them, each with its share of the run's width.
 * Ligatures, full-width forms and mathematical alphabets become plain letters; odd spaces become a space;
 * zero-width characters and soft hyphens inside a word disappear; raised and lowered digit characters
 * (U+00B2, U+2075, U+2082 …) keep their level so that `write-line` can mark them.
 */
export type Glyph = { char: string; level: -1 | 0 | 1; from: number; to: number }

const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻⁼⁽⁾ⁿ'
const raisedPlain = '0123456789+-=()n'
const lowered = '₀₁₂₃₄₅₆₇₈₉₊₋₌₍₎'
const loweredPlain = '0123456789+-=()'

// the standard encoding of symbol fonts, kept in the private use area
const symbols: Readonly<Record<string, string>> = {
  '\uf02b': '+',
  '\uf02d': '-',
  '\uf03c': '<',
  '\uf03d': '=',
  '\uf03e': '>',
  '\uf0a3': '≤',
  '\uf0b1': '±',
  '\uf0b3': '≥',
  '\uf0b4': '×',
  '\uf0bb': '≈',
  '\uf02a': '*',
  '\uf061': 'α',
  '\uf062': 'β',
  '\uf063': 'χ',
  '\uf068': 'η',
  '\uf06d': 'μ',
  '\uf072': 'ρ',
  '\uf073': 'σ',
  '\uf074': 'τ',
}

const plain: Readonly<Record<string, string>> = {
  ...symbols,
  '\u2217': '*',
  '\u204e': '*',
  '\uff0a': '*',
  '\u2212': '-',
  '\u2010': '-',
  '\u2011': '-',
  '\ufe63': '-',
  '\u2a7d': '≤',
  '\u2a7e': '≥',
  '\u2266': '≤',
  '\u2267': '≥',
  '\u2264': '≤',
  '\u2265': '≥',
  '\u2a85': '≤',
  '\u2a86': '≥',
  '\u02c2': '<',
  '\u02c3': '>',
  '\u3008': '<',
  '\u3009': '>',
  '\u00b5': 'μ',
  '\u2019': '’',
  '\u2236': ':',
  '\u2223': '|',
  '\u0394': 'Δ',
  '\u2206': 'Δ',
  '\u2126': 'Ω',
  '\u03f5': 'ε',
  '\u03d5': 'φ',
}

// ligatures, full-width forms, mathematical alphabets, letterlike symbols: what NFKC makes plain
const compatible = /[\ufb00-\ufb06\uff01-\uff5e\u2100-\u214f\u{1d400}-\u{1d7ff}]/u
// spaces of any width
const space = /[\s\u00a0\u1680\u2000-\u200a\u202f\u205f\u3000]/u
// zero-width characters, joiners, direction marks, controls that no font shows
const invisible =
  /[\u200b-\u200f\u2060-\u2064\ufeff\u202a-\u202e\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/u

const widths = new Map<string, number>()
for (const [chars, width] of [
  ["ijl.,:;'|!‘’`·", 0.28],
  ['ftrI()[]{}-/\\"^°*‐', 0.36],
  ['sczJ“”', 0.45],
  ['mMW%@—', 0.86],
  ['wANOQGDHUVKXYRCBT&ÆŒ', 0.7],
  ['+=<>−±×≤≥≈~∼÷', 0.7],
] as const)
  for (const char of chars) widths.set(char, width)

/** Rough advance of a character as a fraction of the font size, as in a common text face. */
export function roughWidth(char: string): number {
  const known = widths.get(char)
  if (known !== undefined) return known
  if (char === ' ') return 0.27
  return char >= 'A' && char <= 'Z' ? 0.64 : 0.5
}

// a run of numbers only: "44.29 6.71", "0.041 <0.001 (2.4)"
const numbersOnly = /^[\d.,·<>=≤≥±()[\]*\s\u2212–-]+$/

/**
 * Splits a run's text into glyphs between `from` and `to` along the baseline. A space is kept as ' '.
 * `even` for monospaced fonts, where every character has the same advance. In a run of numbers only the
 * digits have their own width `digit` (in points) and the spaces take what is left: several cells of a
 * table may have been drawn as one run.
 */
export function readGlyphs(text: string, from: number, to: number, even: boolean, digit = 0): Glyph[] {
  const chars = [...text]
  const kinds = chars.map(kindOf)
  const shares = kinds.map((kind) => (kind.hidden ? 0 : even ? 1 : kind.share))
  if (!even && digit > 0) widenSpaces(text, chars, shares, to - from, digit)
  const total = shares.reduce((sum, share) => sum + share, 0) || 1
  const glyphs: Glyph[] = []
  let at = from
  kinds.forEach(({ hidden, chars: read, level }, index) => {
    const start = at
    at += ((shares[index] ?? 0) / total) * (to - from)
    if (hidden) return
    const wide = (at - start) / Math.max(1, read.length)
    read.forEach((one, part) =>
      glyphs.push({ char: one, level, from: start + part * wide, to: start + (part + 1) * wide }),
    )
  })
  return glyphs
}

type CharacterKind = { hidden: boolean; share: number; chars: string[]; level: -1 | 0 | 1 }

/** What is known of a character; every page has the same few hundred. */
const known = new Map<string, CharacterKind>()
const mostKnown = 20_000

function kindOf(char: string): CharacterKind {
  const found = known.get(char)
  if (found) return found
  if (known.size >= mostKnown) known.clear()
  const kind = {
    hidden: invisible.test(char),
    share: roughWidth(space.test(char) ? ' ' : char),
    ...readCharacter(char),
  }
  known.set(char, kind)
  return kind
}

function widenSpaces(text: string, chars: string[], shares: number[], width: number, digit: number): void {
  if (!numbersOnly.test(text)) return
  const spaces = chars.filter((char) => space.test(char)).length
  if (spaces === 0) return
  const printed = shares.reduce((sum, share, i) => sum + (space.test(chars[i] ?? '') ? 0 : share), 0)
  const left = width / (digit / 0.5) - printed
  if (left < 0.2 * spaces || left > 2.5 * spaces) return
  chars.forEach((char, i) => {
    if (space.test(char)) shares[i] = left / spaces
  })
}

/** Width of a digit by font, as a fraction of the size: from runs of digits and points. */
export type DigitWidths = ReadonlyMap<string, number>

export function measureDigits(
  runs: Iterable<{ text: string; width: number; size: number; font: string }>,
): DigitWidths {
  const sums = new Map<string, { width: number; digits: number }>()
  for (const run of runs) {
    // "9.64"
    if (!/^\d+(?:\.\d+)?$/.test(run.text) || !(run.size > 0)) continue
    const digits = run.text.length - (run.text.includes('.') ? 0.45 : 0)
    const sum = sums.get(run.font) ?? { width: 0, digits: 0 }
    sums.set(run.font, { width: sum.width + run.width / run.size, digits: sum.digits + digits })
  }
  return new Map([...sums].map(([font, sum]) => [font, sum.width / sum.digits]))
}

function readCharacter(char: string): { chars: string[]; level: -1 | 0 | 1 } {
  if (space.test(char)) return { chars: [' '], level: 0 }
  const up = raised.indexOf(char)
  if (up >= 0) return { chars: [raisedPlain[up] ?? char], level: 1 }
  const down = lowered.indexOf(char)
  if (down >= 0) return { chars: [loweredPlain[down] ?? char], level: -1 }
  const known = plain[char]
  if (known !== undefined) return { chars: [known], level: 0 }
  if (compatible.test(char)) return { chars: [...char.normalize('NFKC')], level: 0 }
  return { chars: [char], level: 0 }
}
