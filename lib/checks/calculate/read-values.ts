import { findRoles, type ColumnRole } from '../table/roles'
import type { Scale } from '../vocabulary'
import type { Entry, Sides, Unread } from './entry'
import { readLine, type LineOptions } from './read-line'
import { readPlainNumber, readPToken } from './read-number'
import { readStatisticP, STATISTIC_DECIMALS } from './read-statistic'
import { splitRecords, type TextRecord } from './split-records'

/** Which columns of a pasted table are taken, 0-based; null for none. */
export type Columns = { name: number | null; value: number; adjusted: number | null; weight: number | null }

/** `alpha` stands for the bound of 'ns'; `columns` overrides what is found in a table's header. */
export type ReadValuesOptions = { alpha?: number; sides?: Sides; columns?: Partial<Columns> }

/**
 * `header` and `columns` where the text is a table with a header, else null. `scale`: what the head of the values' column
 * says of them; 'adjusted' values would be corrected twice. `cut`: values beyond MOST_VALUES.
 */
export type ReadValues = {
  entries: Entry[]
  unread: Unread[]
  header: string[] | null
  columns: Columns | null
  scale: Scale
  cut: number
}

export const MOST_VALUES = 100_000

/** With more that is no test, the text is no list: the rest is not looked at, and said so. */
const MOST_UNREAD = 2000

/** Rows that are looked at to tell what a column holds. */
const SAMPLE = 200

/**
 * Reads p-values and test statistics out of pasted text: a list, one or more a line, with or without names, or a table
 * with a header (tab, semicolon or comma). Decimal commas, relations, 'ns', Unicode minus and quotes are understood;
 * whatever is not read stands in `unread` with its line and reason. Never throws.
 */
export function readValues(text: string, options: ReadValuesOptions = {}): ReadValues {
  const { alpha = 0.05, sides = 'two-sided' } = options
  const plain = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n')
  const decimalComma = hasDecimalComma(plain)
  const how: LineOptions = { alpha, sides, decimalComma }
  const read = readTable(plain, how, options.columns ?? {}) ?? readList(plain, how)
  const cut = Math.max(0, read.entries.length - MOST_VALUES)
  return { ...read, entries: cut > 0 ? read.entries.slice(0, MOST_VALUES) : read.entries, cut }
}

/** '0,032' in a text without '0.032' or '.032'. */
function hasDecimalComma(text: string): boolean {
  if (/(?:^|[^\w.])\d*\.\d/.test(text)) return false
  return /(?:^|[^\d,.])[01]?,\d/.test(text)
}

function readList(text: string, how: LineOptions): Omit<ReadValues, 'cut'> {
  const entries: Entry[] = []
  const unread: Unread[] = []
  for (const [i, line] of text.split('\n').entries()) {
    if (line.trim() === '') continue
    // A lone head over the values: 'p', 'p-value', 'P value'
    if (entries.length === 0 && unread.length === 0 && /^\s*"?p(?:[ .-]?values?)?"?\s*$/i.test(line)) continue
    if (unread.length >= MOST_UNREAD) {
      unread.push({
        line: i + 1,
        text: '…',
        why: 'from here on the text was not looked at: too much of it is no test',
      })
      break
    }
    const read = readLine(line, i + 1, how)
    for (const one of read.entries) entries.push(one)
    for (const one of read.unread) unread.push(one)
  }
  return { entries, unread, header: null, columns: null, scale: 'unknown' }
}

function readTable(text: string, how: LineOptions, wanted: Partial<Columns>): Omit<ReadValues, 'cut'> | null {
  const head = text.split('\n', 50).find((line) => line.trim() !== '') ?? ''
  const delimiter = ['\t', ';', ','].find((sign) => head.includes(sign))
  if (delimiter === undefined || (delimiter === ',' && how.decimalComma)) return null
  const [header, ...records] = splitRecords(text, delimiter)
  if (!header || records.length === 0) return null
  // A header holds words, no numbers of its own.
  if (!header.cells.some((cell) => /\p{L}/u.test(cell)) || header.cells.some((cell) => isNumber(cell)))
    return null
  const roles = findRoles(
    header.cells.map((cell, i) => ({
      header: cell,
      cells: records.slice(0, SAMPLE).map((record) => record.cells[i] ?? ''),
    })),
  )
  const columns = chooseColumns(roles, header.cells, records, wanted)
  if (!columns) return null
  const entries: Entry[] = []
  const unread: Unread[] = []
  for (const record of records) {
    const entry = readRecord(record, columns, roles, how)
    if (typeof entry === 'string') {
      unread.push({ line: record.line, text: record.cells.join(' | ').slice(0, 120), why: entry })
    } else entries.push(entry)
  }
  const role = roles[columns.value]
  const scale = role?.kind === 'p' ? role.scale : 'unknown'
  return { entries, unread, header: header.cells, columns, scale }
}

const isNumber = (cell: string) => readPlainNumber(cell) !== null

/** The first raw p column, else the first of unknown scale, else a statistic; the rest by its role or its head. */
function chooseColumns(
  roles: readonly ColumnRole[],
  header: readonly string[],
  records: readonly TextRecord[],
  wanted: Partial<Columns>,
): Columns | null {
  const indexOf = (test: (role: ColumnRole, i: number) => boolean) => {
    const found = roles.findIndex(test)
    return found < 0 ? null : found
  }
  const isP = (scale: string) => (role: ColumnRole) => role.kind === 'p' && role.scale === scale
  const value =
    wanted.value ??
    indexOf(isP('raw')) ??
    indexOf(isP('unknown')) ??
    indexOf((role) => role.kind === 'statistic' && role.test !== 'other') ??
    indexOf(isP('adjusted'))
  if (value === null || value < 0 || value >= header.length) return null
  const name =
    wanted.name !== undefined
      ? wanted.name
      : (indexOf((role) => role.kind === 'comparison') ??
        indexOf((role) => role.kind === 'label' || role.kind === 'outcome' || role.kind === 'group') ??
        findWords(records, header.length, value))
  const adjusted =
    wanted.adjusted !== undefined
      ? wanted.adjusted
      : indexOf((role, i) => i !== value && role.kind === 'p' && role.scale === 'adjusted')
  // 'weight', 'w', 'weights'
  const weight =
    wanted.weight !== undefined ? wanted.weight : indexOf((_, i) => /^w(?:eights?)?$/i.test(header[i] ?? ''))
  return { name, value, adjusted, weight }
}

/** The first column that holds words. */
function findWords(records: readonly TextRecord[], width: number, value: number): number | null {
  for (let i = 0; i < width; i++) {
    const words = records.slice(0, SAMPLE).filter((record) => /\p{L}/u.test(record.cells[i] ?? ''))
    if (i !== value && words.length * 2 > Math.min(SAMPLE, records.length)) return i
  }
  return null
}

/** The test of a row, or why there is none. */
function readRecord(
  { line, cells }: TextRecord,
  columns: Columns,
  roles: readonly ColumnRole[],
  how: LineOptions,
): Entry | string {
  const printed = cells[columns.value] ?? ''
  if (printed === '') return 'the cell is empty'
  const base = {
    line,
    name: nameOf(cells, columns, roles),
    printed,
    statistic: null,
    adjusted: readAdjusted(columns.adjusted === null ? '' : (cells[columns.adjusted] ?? ''), how.alpha),
    weight: columns.weight === null ? null : (readPlainNumber(cells[columns.weight] ?? '')?.value ?? null),
  }
  const role = roles[columns.value]
  if (role?.kind === 'statistic') {
    const number = readPlainNumber(printed)
    const found = roles.flatMap((one, i) =>
      one.kind === 'df' ? [readPlainNumber(cells[i] ?? '')?.value ?? NaN] : [],
    )
    const df =
      role.df.length > 0 ? role.df : role.test === 'z' ? [] : found.slice(0, role.test === 'F' ? 2 : 1)
    const read = number && readStatisticP({ ...number, test: role.test, df, relation: '=' }, how.sides)
    if (!read) return 'a statistic without its degrees of freedom'
    return { ...base, ...read, relation: '=', decimals: STATISTIC_DECIMALS }
  }
  const read = readPToken(printed, how.alpha)
  if (read === 'outside') return 'a p-value lies between 0 and 1'
  return read === null ? 'no p-value' : { ...base, ...read }
}

function nameOf(cells: readonly string[], columns: Columns, roles: readonly ColumnRole[]): string {
  const name = columns.name === null ? '' : (cells[columns.name] ?? '')
  const second = roles.findIndex((role) => role.kind === 'group2')
  const paired = second >= 0 && columns.name !== null && roles[columns.name]?.kind === 'group'
  return (paired ? `${name} – ${cells[second] ?? ''}` : name).slice(0, 200)
}

function readAdjusted(printed: string, alpha: number): Entry['adjusted'] {
  const read = readPToken(printed, alpha)
  if (read === null || read === 'outside') return null
  return { low: read.low, high: read.high, decimals: read.decimals, printed }
}
