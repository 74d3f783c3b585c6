/** `text` as an R string in ASCII: what is not, and quotes, backslashes and control characters, as escapes; no NUL. */
export function rString(text: string): string {
  const escaped = [...text].map((character) => {
    const code = character.codePointAt(0) ?? 0
    if (character === '"' || character === '\\') return `\\${character}`
    if (code >= 32 && code < 127) return character
    if (code === 0) return ''
    return code > 0xffff
      ? `\\U{${code.toString(16)}}`
      : `\\u${isHalf(code) ? 'fffd' : code.toString(16).padStart(4, '0')}`
  })
  return `"${escaped.join('')}"`
}

/** Half of a surrogate pair without the other is no character in R. */
function isHalf(code: number): boolean {
  return code >= 0xd800 && code <= 0xdfff
}

/** A number as R reads it back to the last bit; NA for null and NaN. */
export function rNumber(value: number | null): string {
  if (value === null || Number.isNaN(value)) return 'NA'
  if (!Number.isFinite(value)) return value > 0 ? 'Inf' : '-Inf'
  return String(value)
}

export function rLogical(value: boolean | null): string {
  return value === null ? 'NA' : value ? 'TRUE' : 'FALSE'
}

/** `numeric(0)`, or `c(…)` broken into lines of at most about a hundred characters. */
export function rVector(
  elements: readonly string[],
  empty: 'numeric(0)' | 'character(0)' | 'list()',
): string {
  if (elements.length === 0) return empty
  const lines: string[] = []
  let line = ''
  for (const element of elements) {
    if (line !== '' && line.length + element.length > 96) {
      lines.push(line)
      line = ''
    }
    line += line === '' ? element : `, ${element}`
  }
  lines.push(line)
  const open = empty === 'list()' ? 'list(' : 'c('
  return lines.length === 1 ? `${open}${line})` : `${open}\n    ${lines.join(',\n    ')})`
}

export const rNumbers = (values: readonly (number | null)[]) => rVector(values.map(rNumber), 'numeric(0)')
export const rStrings = (values: readonly string[]) => rVector(values.map(rString), 'character(0)')

const spelt: Record<string, string> = {
  α: 'alpha',
  β: 'beta',
  ε: 'epsilon',
  η: 'eta',
  μ: 'mu',
  ρ: 'rho',
  σ: 'sigma',
  τ: 'tau',
  χ: 'chi',
  ω: 'omega',
  '≤': '<=',
  '≥': '>=',
  '×': 'x',
  '±': '+-',
}

/** Text for a comment: one line of ASCII, so that nothing printed in a manuscript can end the comment. */
export function rComment(text: string): string {
  const plain = text
    .replace(/[αβεημρστχω≤≥×±]/g, (sign) => spelt[sign] ?? sign) // signs of the trade
    .normalize('NFKD')
    .replace(/[\u2010-\u2015\u2212]/g, '-') // dashes and the minus sign
    .replace(/[\u2018\u2019]/g, "'") // quotes
    .replace(/[\u201c\u201d]/g, '"')
    .replace(/\p{M}/gu, '') // accents that NFKD has set apart
    .replace(/\s+/g, ' ')
    .replace(/[^\x20-\x7e]/g, '?')
  return `# ${plain.trim()}`
}
