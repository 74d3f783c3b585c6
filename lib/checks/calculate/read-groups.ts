import type { Unread } from './entry'
import { readPlainNumber } from './read-number'
import { splitRecords } from './split-records'

/** One group as typed; `decimals` of mean and spread as printed. */
export type GroupEntry = {
  line: number
  group: string
  n: number
  mean: number
  meanDecimals: number
  spread: number
  spreadDecimals: number
}

/** Whether the fourth column holds standard deviations or standard errors. */
export const SPREADS = ['sd', 'se'] as const
export type Spread = (typeof SPREADS)[number]

/** `spread`: what the header says the fourth column is, null where it does not say. */
export type ReadGroups = { groups: GroupEntry[]; unread: Unread[]; spread: Spread | null }

export const MOST_GROUPS = 20

/**
 * Reads rows of group, n, mean and SD or SE out of pasted text, with or without a header, separated by tabs,
 * semicolons, commas or spaces; the header may name them in another order. What is no group stands in `unread`.
 * Never throws.
 */
export function readGroups(text: string): ReadGroups {
  const plain = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n')
  const head = plain.split('\n', 50).find((line) => line.trim() !== '') ?? ''
  // '41,2': commas are decimal signs where no point is and digits stand on both sides
  const decimalComma = !/\d\.\d/.test(plain) && /\d,\d/.test(plain) && !/\d,\d+,/.test(plain)
  const delimiter = ['\t', ';', ...(decimalComma ? [] : [','])].find((sign) => head.includes(sign))
  const records =
    delimiter === undefined
      ? plain
          .split('\n')
          .flatMap((line, i) => (line.trim() === '' ? [] : [{ line: i + 1, cells: splitAtSpaces(line) }]))
      : splitRecords(plain, delimiter)
  const order = readHeader(records[0]?.cells ?? [])
  const groups: GroupEntry[] = []
  const unread: Unread[] = []
  for (const { line, cells } of order ? records.slice(1) : records) {
    const read = readGroup(line, cells, order ?? plainOrder)
    const full = groups.length >= MOST_GROUPS
    if (typeof read === 'string' || full) {
      const why = typeof read === 'string' ? read : `more than ${MOST_GROUPS} groups`
      unread.push({ line, text: cells.join(' | ').slice(0, 120), why })
    } else groups.push(read)
  }
  return { groups, unread, spread: order?.kind ?? null }
}

type Order = { group: number; n: number; mean: number; spread: number; kind: Spread | null }
const plainOrder: Order = { group: 0, n: 1, mean: 2, spread: 3, kind: null }

/** 'group, n, mean, SD' in any order; null where the row is no header. */
function readHeader(cells: readonly string[]): Order | null {
  if (cells.filter((cell) => readPlainNumber(cell) !== null).length > 0) return null
  const find = (form: RegExp) => cells.findIndex((cell) => form.test(cell.trim()))
  const n = find(/^(?:n|number|count|size)\b/i)
  const mean = find(/^(?:m|means?|average)\b/i)
  const sd = find(/^(?:s\.?d\.?|std\.? ?dev|standard deviation)/i)
  const se = find(/^(?:s\.?e\.?m?\.?\b|std\.? ?err|standard error)/i)
  const spread = sd >= 0 ? sd : se
  if (n < 0 || mean < 0 || spread < 0) return null
  const taken = [n, mean, spread]
  const group = cells.findIndex((_, i) => !taken.includes(i))
  return { group, n, mean, spread, kind: sd >= 0 ? 'sd' : 'se' }
}

function readGroup(line: number, cells: readonly string[], order: Order): GroupEntry | string {
  const at = (i: number) => readPlainNumber(cells[i] ?? '')
  const [n, mean, spread] = [at(order.n), at(order.mean), at(order.spread)]
  if (!n || !mean || !spread) return 'not a name, n, mean and spread'
  if (!Number.isSafeInteger(n.value) || n.value < 2) return 'n is a whole number of at least 2'
  if (spread.value < 0) return 'a spread is not negative'
  return {
    line,
    group: (cells[order.group] ?? '').slice(0, 200) || `group ${line}`,
    n: n.value,
    mean: mean.value,
    meanDecimals: mean.decimals,
    spread: spread.value,
    spreadDecimals: spread.decimals,
  }
}

/** 'oyster shell 10 27.9 6.1': the last three are numbers, what is before them is the name. */
function splitAtSpaces(line: string): string[] {
  const tokens = line.trim().split(/\s+/)
  if (tokens.length < 5) return tokens
  return [tokens.slice(0, -3).join(' '), ...tokens.slice(-3)]
}
