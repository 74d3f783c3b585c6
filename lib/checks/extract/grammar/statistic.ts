import type { Relation, Test } from '../../vocabulary'
import { parseNumber, RELATION_SIGN, SIGNED } from './number'
import { followedByUnit, toRelation } from './p-value'

/** A test statistic as it stands in a sentence; `start` and `end` are offsets into the sentence. */
export type PrintedStatistic = {
  start: number
  end: number
  test: Test
  df: number[]
  relation: Relation
  value: number
  decimals: number
  /** Printed so plainly, with degrees of freedom or a spelt-out name, that nothing beside it has to confirm it. */
  certain: boolean
}

/** Letters and names of the statistics, longest first within a test. */
const SYMBOLS: Record<Test, string> = {
  // 't', '|t|', 't-value', "Student's t", 't statistic'
  t: String.raw`\|t\||T(?=\s?[(\[_])|t(?:[- ](?:values?|statistics?|test|ratio))?`,
  // 'F', 'F-value', 'F statistic'
  F: String.raw`F(?:[- ](?:values?|statistics?|test|ratio))?`,
  // 'χ2', 'χ^2', 'chi-square', 'X2', 'X-squared', 'v2' from lost Greek
  chi2: String.raw`(?:χ|[Cc]hi|X|v)[- ]?(?:\^?\{?2\}?|[sS]quared?(?:\s(?:statistic|value|test))?)|χ\s\^?2`,
  // 'z', 'Z', 'z-score', 'Wald z'
  z: String.raw`[zZ](?:[- ](?:values?|statistics?|scores?))?`,
  // 'r', "Pearson's r"
  r: String.raw`r(?![sS]?_?s)`,
  // 'U', 'W', 'H', 'ln(W)', 'rs', 'ρ', 'τ', 'maxT', 'Q', 'G2', 'V', 'D'
  other: String.raw`ln\s?\(\s?[WVU]\s?\)|max\s?-?T|r_?s|rho|tau|ρ|τ|[UWHQVD]|G\^?2|q`,
}

const NUM = String.raw`\d{1,3}(?:,\s?\d{3})+(?!\d)|\d+(?:[.,]\d+)?`

/** '(28)', '[2,38]', '(2, N = 150)', '(1.24; 23.56)', '(df = 28)', '({3, 28})'. */
const BRACKET = String.raw`[(\[]\s*(?<bracket>[^()\[\]=<>]{1,24}|[^()\[\]]{0,24}\b(?:df|d\.f\.|[nN])\s?[=:]?\s?\d[^()\[\]]{0,24})\s*[)\]]`

/** '_28', '28', '_2,38', '2,38', ' 4,40', '_{2, 38}', ' 2/38', '_(28)': subscripts, with or without the mark of one. */
const SUBSCRIPT = String.raw`[_\s]?\{?(?<sub>\d+(?:\.\d+)?(?:\s?[,;/]\s?\d+(?:\.\d+)?)?)\}?`

/** '= -2.46', '< 0.01', ': 2.05', 'of 3.1', 'gave 6.15'; a blank alone, 't(28) 2.05', counts only with degrees of freedom. */
const VALUE = String.raw`\s*(?<relation>${RELATION_SIGN}|:|\bof\b|\bwas\b|\bgave\b|\byielded\b|\s)\s*(?<value>${SIGNED})`

const STATISTIC = new RegExp(
  String.raw`(?<![A-Za-z0-9_^/.–-])(?:${(['chi2', 'other', 't', 'F', 'z', 'r'] as const)
    .map((test) => `(?<${test}>${SYMBOLS[test]})`)
    .join('|')})(?:\s?${BRACKET}|${SUBSCRIPT}(?=\s*(?:${RELATION_SIGN})))?${VALUE}`,
  'g',
)

/** ', df = 28', '; df 2, 38', ' was found (df = 1, 57)', ' with 28 degrees of freedom', ', 2 d.f.', ' (df = 28)', ', num df = 3, denom df = 28', ' on 2 and 38 df'. */
const DF_AFTER = new RegExp(
  String.raw`^(?:\s(?:was|is)\s(?:found|obtained|observed|seen))?\s*[,;(]?\s*(?:(?:num\s)?(?:df|d\.f\.|d\.o\.f\.|ν|degrees\sof\sfreedom)\s?[=:]?\s?(?<first>${NUM})(?:\s*(?:[,;/]|and)\s*(?:(?:denom|den)\s?df\s?=\s?)?(?<second>\d+(?:\.\d+)?)(?!\s?\.?\d)(?![^,;)]*=))?|(?:with|on|for)?\s*(?<with>${NUM})(?:\s*(?:and|,|\/)\s*(?<with2>\d+(?:\.\d+)?))?\s*(?:df|d\.f\.|degrees\sof\sfreedom))`,
)

/** 'n = 50' after a correlation. */
const N_AFTER = /^\s*[,;(]?\s*(?:with\s)?[nN]\s?=\s?(\d{1,3}(?:,\d{3})+|\d+)/

/** Every test statistic printed in one sentence (folded text). */
export function findStatistics(sentence: string): PrintedStatistic[] {
  const found: PrintedStatistic[] = []
  for (const match of sentence.matchAll(STATISTIC)) {
    const statistic = toStatistic(sentence, match)
    if (statistic) found.push(statistic)
  }
  return found
}

function toStatistic(sentence: string, match: RegExpExecArray): PrintedStatistic | null {
  const groups = match.groups ?? {}
  const test = (['t', 'F', 'chi2', 'z', 'r', 'other'] as const).find((name) => groups[name] !== undefined)
  const printed = groups.value
  const parsed = printed === undefined ? null : parseNumber(printed.replace(/^([-–])\s/, '$1'))
  if (!test || !parsed || printed === undefined) return null
  const symbol = groups[test] ?? ''
  const start = match.index
  let end = start + match[0].length
  // '0.4 s', '2.6 kN'; a number that goes on, 't = 1.2.3' or a date
  if (followedByUnit(sentence, end) || /^(?:[.,]\d|\d|\/\d)/.test(sentence.slice(end))) return null
  const inside = groups.bracket ?? groups.sub
  let df = inside === undefined ? [] : parseDf(inside, test)
  // brackets that hold no degrees of freedom make it something else, 'F(x) = 3'
  if (df === null) return null
  if (df.length === 0) {
    const after = dfAfter(sentence.slice(end), test)
    df = after.df
    end += after.width
  }
  const spelt = /value|statistic|score|square|ratio/i.test(symbol)
  if (test === 'r' && Math.abs(parsed.value) > 1) return null
  // q without its bracket is a false discovery rate
  if (symbol === 'q' && groups.bracket === undefined) return null
  if (/of|was|gave|yielded|:/.test(groups.relation ?? '') && !spelt) return null
  if (groups.relation?.trim() === '' && (df.length === 0 || parsed.decimals < 1 || groups.sub !== undefined))
    return null
  return {
    start,
    end,
    test,
    df,
    relation: toRelation(groups.relation?.trim() || '='),
    value: parsed.value,
    decimals: parsed.decimals,
    certain: (df.length > 0 && test !== 'other') || spelt,
  }
}

/** Degrees of freedom from what stands in brackets or as a subscript; null when it is something else. */
export function parseDf(inside: string, test: Test): number[] | null {
  const n = /\b[nN]\s?=?\s?(\d[\d,\s]*)/.exec(inside)
  const plain = inside
    .replace(/[,;]?\s*\b[nN]\s?=?\s?\d[\d,\s]*/g, '')
    .replace(/\b(?:df|d\.f\.|ν)\d?\s?[=:]?/gi, '')
    .replace(/[{}_]/g, '')
    .trim()
  // 't1,28' is printed as the F that it is the root of
  const root = test === 't' ? /^1\s?[,;]\s?(\d{1,2}|\d{4})$/.exec(plain)?.[1] : undefined
  if (root) return [Number(root)]
  const parts = test === 'F' ? splitTwo(plain) : plain.split(/\s*(?:;|,\s+)\s*/)
  const numbers = parts.filter((part) => part !== '').map(toDf)
  if (numbers.some((value) => value === null)) return null
  const df = numbers.filter((value): value is number => value !== null)
  if (df.length === 0)
    return test === 'r' && n?.[1] ? [Number(n[1].replace(/\D/g, '')) - 2] : inside.trim() === '' ? [] : null
  if (test === 'F') return df.length === 2 ? df : null
  return test === 'z' ? [] : df.slice(0, 1)
}

/** The two of an F: '2, 38', '2;38', '2/38', '2,38', '1,1,024', '1 and 57'. */
function splitTwo(plain: string): string[] {
  const parts = plain.split(/\s*(?:;|,\s+|\/|\band\b)\s*/)
  if (parts.length > 1) return parts
  const at = plain.indexOf(',')
  return at < 0 ? parts : [plain.slice(0, at), plain.slice(at + 1)]
}

/** '28', '1,024', '1 024', '27.4', '27,4'. */
function toDf(part: string): number | null {
  const text = part.trim()
  if (/^\d{1,3}(?:[,\s]\d{3})+$/.test(text)) return Number(text.replace(/[,\s]/g, ''))
  return /^\d+(?:[.,]\d+)?$/.test(text) ? Number(text.replace(',', '.')) : null
}

/** Degrees of freedom that follow a statistic, or the p printed with it: 'χ2 = 4.2, P = 0.04, df = 1'. */
export function dfAfter(rest: string, test: Test): { df: number[]; width: number } {
  if (test === 'z' || test === 'other') return { df: [], width: 0 }
  const match = DF_AFTER.exec(rest)
  const first = match?.groups?.first ?? match?.groups?.with
  const second = match?.groups?.second ?? match?.groups?.with2
  if (match && first !== undefined) {
    const df = parseDf(second === undefined ? first : `${first}; ${second}`, test)
    if (df && df.length > 0) {
      const closing = /^\s*[,;]?\s*\(/.test(match[0]) && rest[match[0].length] === ')' ? 1 : 0
      return { df, width: match[0].length + closing }
    }
  }
  const n = test === 'r' ? N_AFTER.exec(rest) : null
  if (n?.[1]) return { df: [Number(n[1].replace(/,/g, '')) - 2], width: n[0].length }
  return { df: [], width: 0 }
}
