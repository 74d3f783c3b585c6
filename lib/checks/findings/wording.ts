import type { Interval } from '../families/interval'
import { leadOf } from '../families/lead'
import { nameOf } from '../families/outcome'
import type { Case, Judged } from '../families/case'
import type { ReadReport, ReadStatistic } from '../types'

/** A p-value for reading: two or three significant digits, never rounded to 0; "1.2 × 10⁻⁵" below 0.0001. */
export function showP(p: number): string {
  if (p >= 0.9995) return '1'
  if (p <= 0) return '0'
  return p < 0.0001 ? showPower(p, 2) : String(Number(p.toPrecision(p < 0.01 ? 2 : 3)))
}

/** A level of significance for reading: three significant digits at most, "0.0167", "4.17 × 10⁻⁷". */
export function showLevel(level: number): string {
  if (level >= 0.0001) return String(Number(level.toPrecision(3)))
  return showPower(
    level,
    Math.min(3, Number(level.toPrecision(3)).toExponential().split('e')[0]?.replace('.', '').length ?? 3),
  )
}

const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹'

/** "1.2 × 10⁻⁵" with `digits` significant digits. */
function showPower(value: number, digits: number): string {
  const [mantissa = '', exponent = ''] = value.toExponential(Math.max(0, digits - 1)).split('e')
  const power = [...exponent].map((sign) => (sign === '-' ? '⁻' : (raised[Number(sign)] ?? ''))).join('')
  return `${mantissa} × 10${power}`
}

/** A range for reading: one number where both ends read alike. */
export function showRange({ low, high }: Interval): string {
  const [from, to] = [showP(low), showP(high)]
  return from === to ? from : `${from} to ${to}`
}

/** The p-value as it is printed, with its relation; out of a quote that may hold the statistic too. */
export function showReport({ place, relation, value, decimals }: ReadReport): string {
  // "p = .03", "P<0.001", "adjusted p = 0.02", "q = .04" at the end of "t(36) = 2.43, p = .020"
  const printed = /(?:\b(?:adjusted|corrected)\s+)?\b[pq](?:[-_\s]\p{L}{1,10})?\s?[=<>≤≥⩽⩾][^;,|]*$/iu.exec(
    place.quote.trim(),
  )
  if (printed) return printed[0].replace(/[)\].\s]+$/, '')
  return `p ${signs[relation]} ${showPrinted(value, decimals)}`
}

const signs: Record<ReadReport['relation'], string> = { '=': '=', '<': '<', '<=': '≤', '>': '>', '>=': '≥' }

/** The digits as printed; of many decimals as a power of ten. */
function showPrinted(value: number, decimals: number): string {
  if (value > 0 && value < 0.0001 && decimals > 5) {
    return showPower(value, Math.max(1, decimals + 1 + Math.floor(Math.log10(value) + 1e-9)))
  }
  return decimals >= 0 && decimals <= 12 ? value.toFixed(decimals) : String(value)
}

export function showStatistic({ test, df, value, decimals }: ReadStatistic): string {
  const symbol = test === 'chi2' ? 'χ²' : test
  const degrees = df.length > 0 ? `(${df.join(', ')})` : ''
  return `${symbol}${degrees} = ${value.toFixed(Math.max(0, Math.min(12, decimals))).replace('-', '−')}`
}

/** At most `most` entries, then how many more. */
export function listSome(entries: readonly string[], most = 6): string {
  const shown = entries.slice(0, most).join('; ')
  return entries.length > most ? `${shown}; and ${entries.length - most} more` : shown
}

/** "Bonferroni with m = 6" */
export function showYardstick({ procedure, design }: Case): string {
  return design.due === null || procedure === 'raw'
    ? nameOf(procedure)
    : `${nameOf(procedure)} with m = ${design.due}`
}

export function reportsOf(comparisons: readonly Pick<Judged, 'items'>[]): string[] {
  return [...new Set(comparisons.flatMap(({ items }) => items.map(({ report }) => report.id)))]
}

/** A sentence begins with a capital. */
export function capitalise(text: string): string {
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}`
}

/** "A – B (printed p = .021): 0.124 to 0.125" */
export function showDecision(judged: Judged): string {
  const lead = leadOf(judged)
  const shown = lead ? showReport(lead) : ''
  const printed = shown === '' || judged.label.includes(shown) ? '' : ` (printed ${shown})`
  return `${judged.label}${printed}: ${showRange(judged.due)}`
}

export { leadOf }
