import { fold } from '../extract/grammar/fold'
import { findPValues } from '../extract/grammar/p-value'
import { findStatistics } from '../extract/grammar/statistic'
import type { Entry, Sides, Unread } from './entry'
import { readPToken, type ReadP } from './read-number'
import { readStatisticP, STATISTIC_DECIMALS, type ReadStatisticP } from './read-statistic'

export type LineOptions = { alpha: number; sides: Sides; decimalComma: boolean }
export type ReadLine = { entries: Entry[]; unread: Unread[] }

/** Longer lines are taken for lists of bare numbers only. */
const LONGEST_SENTENCE = 2000

/** A letter, perhaps with its degrees of freedom, before a relation: 't(28) = 2.05', 'p < .001', 'χ2(3, N = 90) = 7.8'. */
const STATED = /[A-Za-zχΧ²2)\]}|]\s*(?:[=<>≤≥]|:\s*[-\d.])/

/**
 * The tests of one line: bare p-values in any number, separated by spaces, semicolons, bars, tabs or commas; or a name
 * with one p-value; or test statistics and p-values as papers print them. What is none of these is `unread`.
 */
export function readLine(text: string, line: number, options: LineOptions): ReadLine {
  if (text.length <= LONGEST_SENTENCE && STATED.test(text)) {
    const stated = readStated(text, line, options)
    if (stated) return stated
  }
  return readTokens(text, line, options)
}

/** 'A – B; t(28) = 2.05', 'A vs B: p = .032', 't(28) = 2.05, p = .049': null where nothing is stated so. */
function readStated(text: string, line: number, { alpha, sides }: LineOptions): ReadLine | null {
  const folded = fold(text)
  const statistics = findStatistics(folded)
  const values = findPValues(folded)
  const first = Math.min(...statistics.map((one) => one.start), ...values.map((one) => one.start))
  if (!Number.isFinite(first)) return null
  const last = Math.max(...statistics.map((one) => one.end), ...values.map((one) => one.end))
  const name = trimName(text.slice(0, first)) || trimName(text.slice(last))
  const printedOf = (one: { start: number; end: number }) => text.slice(one.start, one.end).trim()
  const refuse = (piece: string, why: string): ReadLine => ({
    entries: [],
    unread: [{ line, text: piece, why }],
  })
  const base = { line, name, statistic: null, adjusted: null, weight: null }

  const raw = values.filter((one) => one.scale !== 'adjusted')
  const adjusted = values.filter((one) => one.scale === 'adjusted')
  if (raw.some((one) => !(one.value <= 1) && !one.markOnly))
    return refuse(text, 'a p-value lies between 0 and 1')
  if (statistics.length > 1 || raw.length > 1 || adjusted.length > 1) return readMany()
  const value = raw[0] ? toP(raw[0]) : null
  const statistic = statistics[0]
  const fromStatistic = statistic ? readStatisticP(statistic, sides) : null
  if (!value && statistic && !fromStatistic) {
    return refuse(printedOf(statistic), 'its degrees of freedom, or its distribution, are not given')
  }
  const print = adjusted[0] ? toP(adjusted[0]) : null
  const printedAdjusted =
    print && adjusted[0]
      ? { low: print.low, high: print.high, decimals: print.decimals, printed: printedOf(adjusted[0]) }
      : null
  if (value && fromStatistic) {
    // Both are printed: each narrows the other where they agree; the p-value counts where they do not.
    const low = Math.max(value.low, fromStatistic.low)
    const high = Math.min(value.high, fromStatistic.high)
    const statisticOf = { ...fromStatistic.statistic, alone: false }
    const both = low <= high ? { ...value, low, high, statistic: statisticOf } : value
    return {
      entries: [{ ...base, ...both, printed: text.slice(first, last).trim(), adjusted: printedAdjusted }],
      unread: [],
    }
  }
  if (value && raw[0]) {
    return {
      entries: [{ ...base, ...value, printed: printedOf(raw[0]), adjusted: printedAdjusted }],
      unread: [],
    }
  }
  if (fromStatistic && statistic) {
    return {
      entries: [
        { ...base, ...ofStatistic(fromStatistic), printed: printedOf(statistic), adjusted: printedAdjusted },
      ],
      unread: [],
    }
  }
  return refuse(text, 'an adjusted value without a raw one')

  function readMany(): ReadLine {
    const unread: Unread[] = []
    // A p-value printed with each statistic says the same twice: the statistics alone are taken.
    const taken: Entry[] =
      statistics.length > 0
        ? statistics.flatMap((one) => {
            const read = readStatisticP(one, sides)
            if (!read)
              unread.push({ line, text: printedOf(one), why: 'its degrees of freedom are not given' })
            return read ? [{ ...base, ...ofStatistic(read), printed: printedOf(one) }] : []
          })
        : raw.map((one) => ({ ...base, ...toP(one), printed: printedOf(one) }))
    return { entries: taken, unread }
  }

  function toP(one: (typeof values)[number]): ReadP {
    if (one.markOnly) return { relation: '>', value: alpha, decimals: 2, low: alpha, high: 1 }
    const sign = one.relation === '=' ? '' : one.relation
    const read = readPToken(`${sign}${one.value.toFixed(Math.min(100, one.decimals))}`, alpha)
    const fallback: ReadP = { ...one, low: 0, high: Math.min(1, one.value) }
    return read === null || read === 'outside' ? fallback : read
  }
}

function ofStatistic({ value, low, high, statistic }: ReadStatisticP) {
  return { value, low, high, statistic, relation: '=' as const, decimals: STATISTIC_DECIMALS }
}

/** What separates the items of a line; a comma only where it is no decimal comma. */
const PLAIN = /[\s;,|]+/
const WITH_DECIMAL_COMMA = /[\s;|]+|,(?=\s|$)/

function readTokens(text: string, line: number, { alpha, decimalComma }: LineOptions): ReadLine {
  // '< 0.001' and 'p = .03': the relation belongs to what follows it
  if (text.length > LONGEST_SENTENCE && /[^\W\d_e]{2}/i.test(text)) {
    return { entries: [], unread: [{ line, text: clip(text), why: 'words in a very long line' }] }
  }
  const joined = text.replace(/([<>≤≥=])\s+(?=[\d.,])/g, '$1')
  const tokens = joined.split(decimalComma ? WITH_DECIMAL_COMMA : PLAIN).filter((token) => token !== '')
  const read = tokens.map((token) => readPToken(token, alpha))
  if (read.every((one) => one !== null)) {
    const entries: Entry[] = []
    const unread: Unread[] = []
    read.forEach((one, i) => {
      const token = tokens[i] ?? ''
      if (one === 'outside') unread.push({ line, text: token, why: 'a p-value lies between 0 and 1' })
      else if (one) entries.push(toEntry(line, '', token, one))
    })
    return { entries, unread }
  }
  const refuse = (why: string): ReadLine => ({ entries: [], unread: [{ line, text: clip(text), why }] })
  // In 'Dose 1 0.032' the whole number belongs to the name.
  const found = read.map((one, i) => ({ one, i })).filter(({ one }) => one !== null)
  const values = found.filter(({ i }) => /[.,]\d|e-|[<>≤≥=]|^n/i.test(tokens[i] ?? ''))
  const chosen = values.length > 0 ? values : found.filter(({ i }) => i === tokens.length - 1)
  const [only] = chosen
  if (!only?.one) return refuse('no p-value and no test statistic')
  if (chosen.length > 1)
    return refuse('more than one number beside a name: paste it as a table with a header')
  if (only.one === 'outside') return refuse('a p-value lies between 0 and 1')
  const printed = tokens[only.i] ?? ''
  const at = joined.lastIndexOf(printed)
  const name = trimName(joined.slice(0, at)) || trimName(joined.slice(at + printed.length))
  return { entries: [toEntry(line, name, printed, only.one)], unread: [] }
}

/** A name without the signs that part it from its number. */
function trimName(text: string): string {
  return text
    .replace(/^[\s;:,|"'“”=(]+|[\s;:,|"'“”=(]+$/g, '')
    .replace(/\s+/g, ' ')
    .slice(0, 200)
}

const clip = (text: string) => (text.length > 120 ? `${text.slice(0, 119)}…` : text)

/** Written out: there may be a hundred thousand of them. */
function toEntry(line: number, name: string, printed: string, p: ReadP): Entry {
  const { low, high, value, relation, decimals } = p
  return {
    line,
    name,
    printed,
    value,
    relation,
    decimals,
    low,
    high,
    statistic: null,
    adjusted: null,
    weight: null,
  }
}
