import { pBounds } from '../numbers/p-bounds'
import { printedInterval, roundingInterval } from '../numbers/printed-interval'
import type { Box, ReadReport, ReadStatistic, SectionKind } from '../types'
import type { Call, Source, Test } from '../vocabulary'
import { splitPair } from '../extract/grammar/comparison'
import { fold } from '../extract/grammar/fold'
import { findProcedures } from '../extract/grammar/procedure'
import {
  isMark,
  isNotSignificantMark,
  readCall,
  readLegend,
  readNumber,
  readP,
  type Legend,
  type PCell,
} from './cell'
import type { Control } from './pdf-table'
import { findRoles, type ColumnRole } from './roles'

/** A table ready to be read, from a page or from a results file: one header text a column, body cells as texts. */
export type Grid = {
  key: string
  source: Source
  page: number | null
  sheet: string | null
  /** Index into `LaidOut.tables` or of the sheet. */
  table: number
  caption: string
  notes: string
  headers: string[]
  rows: GridRow[]
  offset: number
  section: SectionKind
  alpha: number
}
/** `number`: 1-based data row of a results table, null on a page; `index`: 0-based row of the body. */
export type GridRow = { cells: string[]; boxes: Box[][]; number: number | null; index: number }

export type Part = { reports: ReadReport[]; statistics: ReadStatistic[] }

type Reader = {
  grid: Grid
  roles: ColumnRole[]
  legend: Legend
  /** Degrees of freedom that caption or notes state for the whole table. */
  df: number[]
  /** The group with which every row is compared, where caption, notes or head name one. */
  control: string | null
  starred: boolean[]
}

/** Reports and statistics of one table, a row for each comparison or outcome. Ids are provisional. */
export function readGrid(grid: Grid, controls: readonly Control[] = []): Part {
  const columns = grid.headers.map((header, c) => ({
    header,
    cells: grid.rows.map(({ cells }) => cells[c] ?? ''),
  }))
  const roles = findRoles(columns)
  const around = `${grid.caption} ${grid.notes}`
  const reader: Reader = {
    grid,
    roles: roles.map((role, c) => statedScale(role, around, grid.headers[c] ?? '')),
    legend: readLegend(around),
    df: findDf(around),
    control:
      findControl(`${grid.caption}. ${grid.headers.join('. ')}. ${grid.notes}`) ??
      controlOf(grid, roles, controls),
    starred: columns.map(({ cells }) =>
      cells.some((cell) => /[*†‡]/.test(readP(cell)?.mark ?? readNumber(cell)?.mark ?? '')),
    ),
  }
  const part: Part = { reports: [], statistics: [] }
  let heading: string | null = null
  for (const row of grid.rows) {
    const filled = row.cells.filter((cell) => cell.trim() !== '')
    const [only] = filled
    // a line that holds one text stands above the rows of one outcome
    if (
      filled.length === 1 &&
      only !== undefined &&
      readP(only) === null &&
      readNumber(only) === null &&
      !isMark(only)
    ) {
      heading = only.trim()
      continue
    }
    const read = readRow(reader, row, heading)
    part.reports.push(...read.reports)
    part.statistics.push(...read.statistics)
  }
  return part
}

function readRow(reader: Reader, row: GridRow, heading: string | null): Part {
  const { grid, roles } = reader
  const names = nameRow(reader, row, heading)
  const rowCall = callOfRow(reader, row)
  const sentence = row.cells.join(' | ')
  const statistics: ReadStatistic[] = []
  const reports: ReadReport[] = []
  let latest: { index: number; column: number } | null = null
  roles.forEach((role, c) => {
    const cell = row.cells[c] ?? ''
    if (cell.trim() === '') return
    const id = `${grid.key}-${row.index}-${c}`
    if (role.kind === 'statistic') {
      const statistic = toStatistic(reader, row, c, role)
      if (!statistic) return
      latest = { index: statistics.length, column: c }
      statistics.push({
        ...statistic,
        id: `${id}-s`,
        place: placeOf(grid, row, c),
        report: null,
        offset: grid.offset,
        table: grid.table,
        sentence,
      })
    }
    if (role.kind !== 'p') return
    const value = toValue(reader, cell)
    if (!value) return
    const { mark, markOnly, label, ...printed } = value
    const comparison = names.comparison ?? (label === null ? null : pairOfLabel(label))
    const statistic = latest === null ? undefined : statistics[(latest as { index: number }).index]
    const outcome = names.outcome ?? spanOf(reader, c)
    reports.push({
      id: `${id}-p`,
      place: placeOf(grid, row, c),
      ...printed,
      ...printedInterval(printed.value, printed.decimals, printed.relation),
      scale: role.scale,
      statistic: statistic?.id ?? null,
      comparison,
      called: callOfMark(reader, c, mark, markOnly) ?? rowCall,
      family: null,
      offset: grid.offset,
      section: grid.section,
      heading: grid.caption,
      table: grid.table,
      cell: { row: row.index, column: c },
      sentence,
      outcome,
      role: roleOfRow(grid, sentence, statistic, comparison !== null),
      oneSided: /\b(?:one|1)-(?:sided|tailed)\b/i.test(
        `${grid.headers[c] ?? ''} ${grid.caption} ${grid.notes}`,
      ),
      markOnly,
    })
    // the unadjusted value, else the first, is the statistic's own
    if (statistic && (statistic.report === null || role.scale === 'raw')) statistic.report = `${id}-p`
  })
  // a statistic that stands right of its value
  const [single, second] = statistics
  if (single && !second && single.report === null && reports.length === 1 && reports[0]) {
    reports[0].statistic = single.id
    single.report = reports[0].id
  }
  if (reports.length === 0) reports.push(...markReports(reader, row, names, statistics, sentence))
  return { reports, statistics }
}

/** Rows that carry only asterisks: one report with the bound of the mark, beside the statistic or the estimate. */
function markReports(
  reader: Reader,
  row: GridRow,
  names: RowNames,
  statistics: ReadStatistic[],
  sentence: string,
): ReadReport[] {
  const { grid, roles } = reader
  return roles.flatMap((role, c) => {
    const cell = row.cells[c] ?? ''
    const mark =
      role.kind === 'stars'
        ? cell.trim()
        : role.kind === 'statistic' || role.kind === 'estimate'
          ? (readNumber(cell)?.mark ?? '')
          : ''
    if (!/^[*†‡§#¶]/.test(mark)) return []
    const bound =
      reader.legend.get(mark) ??
      (mark.startsWith('*') ? { relation: '<' as const, value: grid.alpha, decimals: 2 } : null)
    if (!bound) return []
    const statistic =
      role.kind === 'statistic'
        ? statistics.find(({ id }) => id === `${grid.key}-${row.index}-${c}-s`)
        : statistics[0]
    const id = `${grid.key}-${row.index}-${c}-p`
    if (statistic) statistic.report = id
    return [
      {
        id,
        place: placeOf(grid, row, c),
        ...bound,
        ...printedInterval(bound.value, bound.decimals, bound.relation),
        scale: /adjust|correct/i.test(`${grid.caption} ${grid.notes}`)
          ? ('adjusted' as const)
          : ('unknown' as const),
        statistic: statistic?.id ?? null,
        comparison: names.comparison,
        called: 'significant' as const,
        family: null,
        offset: grid.offset,
        section: grid.section,
        heading: grid.caption,
        table: grid.table,
        cell: { row: row.index, column: c },
        sentence,
        outcome: names.outcome ?? spanOf(reader, c),
        role: roleOfRow(grid, sentence, statistic, names.comparison !== null),
        oneSided: false,
        markOnly: true,
      },
    ]
  })
}

type RowNames = { comparison: [string, string] | null; outcome: string | null }

/** The pair and the outcome that a row is about. */
function nameRow({ grid, roles, control }: Reader, { cells }: GridRow, heading: string | null): RowNames {
  const textOf = (kind: ColumnRole['kind']) => {
    const c = roles.findIndex((role) => role.kind === kind)
    const text =
      c < 0
        ? ''
        : fold(cells[c] ?? '')
            .replace(/\s+/g, ' ')
            .trim()
    return text === '' ? null : text.replace(/[\^]?[*†‡§#]+$/, '').trim()
  }
  const comparison = textOf('comparison')
  const [group, group2] = [textOf('group'), textOf('group2')]
  const label = textOf('label')
  const outcome = textOf('outcome') ?? heading
  const pair = comparison ? splitPair(comparison) : null
  if (pair) return { comparison: pair, outcome: outcome ?? (label && label !== comparison ? label : null) }
  if (group && group2) return { comparison: [group, group2], outcome: outcome ?? label }
  const inLabel =
    label && /\s(?:vs?\.?|versus|minus|against)\s|\s[-–]\s/i.test(label) ? splitPair(label) : null
  if (inLabel) return { comparison: inLabel, outcome }
  const name = comparison ?? group ?? (textOf('outcome') ? null : label)
  if (name && control && name.toLowerCase() !== control.toLowerCase() && isAgainstControl(grid))
    return { comparison: [name, control], outcome: heading }
  return { comparison: null, outcome: textOf('outcome') ?? label ?? group ?? comparison ?? heading }
}

/**
 * The control that the text names, where this table's first column is what the text compares with it: its head
 * stands in that sentence ('each of the five depths was compared with the surface' over a column 'Depth').
 */
function controlOf(grid: Grid, roles: readonly ColumnRole[], controls: readonly Control[]): string | null {
  const c = roles.findIndex(({ kind }) => kind === 'group' || kind === 'label' || kind === 'outcome')
  const head = fold(grid.headers[c] ?? '')
    .toLowerCase()
    .replace(/[^a-z]+.*$/, '')
    .replace(/s$/, '')
  if (c < 0 || head.length < 3) return null
  return controls.find(({ sentence }) => new RegExp(`\\b${head}s?\\b`, 'i').test(sentence))?.name ?? null
}

/** Rows are treatments held against one control only where the table says so. */
const isAgainstControl = (grid: Grid): boolean => !/correlat/i.test(grid.caption)

/** 'compared with the control', 'vs surface', 'minus control', 'difference from placebo' in a caption, note or head. */
function findControl(text: string): string | null {
  const match =
    /\b(?:compared (?:with|to)|comparisons? (?:with|to)|versus|vs\.?|against|minus|differences? (?:from|to)|relative to|than)\s(?:that of\s|the\s|untreated\s|an?\s)*(?<name>(?:[\w°+-]+\s){0,2}?(?:control|placebo|vehicle|sham|reference|baseline|standard|surface|check|blank|untreated)(?:s\b)?)/i.exec(
      fold(text),
    )
  return match?.groups?.name?.trim() ?? null
}

/** 'A vs B', 'group1-2', 'I–II' behind a value as the two groups. */
function pairOfLabel(label: string): [string, string] | null {
  // one word before two short names: 'group1-2', 'groups 1 vs 3'
  const short = /^(groups?|arms?)\s?(\w{1,2})\s?(?:[-–/]|vs\.?|and)\s?(\w{1,2})$/i.exec(fold(label))
  if (short?.[1] && short[2] && short[3]) {
    const noun = short[1].replace(/s$/i, '')
    return [`${noun} ${short[2]}`, `${noun} ${short[3]}`]
  }
  return splitPair(fold(label))
}

/** The upper line of a head in several lines, where it names what a block of columns is about: 'BAI | p'. */
function spanOf({ grid, roles }: Reader, column: number): string | null {
  if (roles.filter(({ kind }) => kind === 'p').length < 2) return null
  const parts = (grid.headers[column] ?? '').split(' | ')
  return parts.length > 1 ? (parts[0] ?? null) : null
}

function toValue({ legend, grid }: Reader, cell: string): (PCell & { markOnly: boolean }) | null {
  const p = readP(cell)
  if (p) return { ...p, markOnly: false }
  if (!isMark(cell)) return null
  const mark = fold(cell)
    .trim()
    .replace(/[\s^{}]/g, '')
  const decimals = Math.max(2, String(grid.alpha).length - 2)
  if (isNotSignificantMark(mark))
    return { relation: '>', value: grid.alpha, decimals, mark, label: null, markOnly: true }
  const bound = legend.get(mark) ?? { relation: '<' as const, value: grid.alpha, decimals }
  return { ...bound, mark, label: null, markOnly: true }
}

/** A mark on the value; where others of the column carry asterisks, the lack of one says 'not significant'. */
function callOfMark({ starred }: Reader, column: number, mark: string, markOnly: boolean): Call | null {
  if (isNotSignificantMark(mark)) return 'not significant'
  if (mark !== '') return 'significant'
  return starred[column] && !markOnly ? 'not significant' : null
}

/** The row's call: a column of calls or marks, an asterisk on statistic or estimate. */
function callOfRow({ roles, starred }: Reader, { cells }: GridRow): Call | null {
  for (const [c, role] of roles.entries()) {
    const cell = cells[c] ?? ''
    if (role.kind === 'call' || role.kind === 'stars') {
      const call = readCall(cell)
      if (call) return call
      if (role.kind === 'stars') return isMark(cell) ? 'significant' : 'not significant'
    }
    if (role.kind !== 'statistic' && role.kind !== 'estimate') continue
    const number = readNumber(cell)
    if (number && starred[c])
      return number.mark === '' || isNotSignificantMark(number.mark) ? 'not significant' : 'significant'
  }
  return null
}

function toStatistic(
  reader: Reader,
  row: GridRow,
  column: number,
  role: { test: Test; df: number[] },
): Pick<ReadStatistic, 'test' | 'df' | 'value' | 'decimals' | 'pLow' | 'pHigh'> | null {
  const number = readNumber(row.cells[column] ?? '')
  if (!number || (role.test === 'r' && Math.abs(number.value) > 1)) return null
  const df = role.df.length > 0 ? role.df : dfOfRow(reader, row, column, role.test)
  const { value, decimals } = number
  return { test: role.test, df, value, decimals, ...boundsOf(role.test, df, value, decimals) }
}

function boundsOf(
  test: Test,
  df: readonly number[],
  value: number,
  decimals: number,
): { pLow: number | null; pHigh: number | null } {
  const need = test === 'F' ? 2 : test === 'z' ? 0 : 1
  if (test === 'other' || df.length !== need || df.some((d) => !(d > 0))) return { pLow: null, pHigh: null }
  const { low, high } = roundingInterval(value, decimals)
  const bounds = pBounds(test, low, high, df)
  return { pLow: bounds.low, pHigh: bounds.high }
}

/** Degrees of freedom from the row's own columns, from the line of the residuals, from n, or from the notes. */
function dfOfRow({ grid, roles, df }: Reader, row: GridRow, column: number, test: Test): number[] {
  if (test === 'z' || test === 'other') return []
  const at = (c: number, from = row) => readNumber(from.cells[c] ?? '')?.value ?? null
  const columns = roles.flatMap((role, c) => (role.kind === 'df' ? [{ c, index: role.index }] : []))
  const since = roles.slice(0, column).findLastIndex(({ kind }) => kind === 'statistic')
  const before = columns.filter(({ c }) => c < column && c > since)
  const near = before.length > 0 ? before : columns
  const first = near.filter(({ index }) => index === 0).pop() ?? near[near.length - 1]
  const own = first === undefined ? null : at(first.c)
  if (own !== null && first) {
    if (test !== 'F') return [own]
    const second = near.find(({ index }) => index === 1)
    const error = second ? at(second.c) : residualDf(grid, row, first.c, at)
    return error === null ? (df.length === 2 ? df : []) : [own, error]
  }
  if (test === 'r') {
    const n = roles.findIndex((role) => role.kind === 'n')
    const count = n < 0 ? null : at(n)
    if (count !== null) return [count - 2]
    const all = /\b[nN]\s?=\s?(\d+)/.exec(`${grid.caption} ${grid.notes} ${grid.headers.join(' ')}`)?.[1]
    if (all) return [Number(all) - 2]
  }
  return df.length === (test === 'F' ? 2 : 1) ? df : []
}

/** The df of the next line of residuals below the row, else of any. */
function residualDf(
  grid: Grid,
  row: GridRow,
  column: number,
  at: (c: number, from: GridRow) => number | null,
): number | null {
  const lines = grid.rows.filter(({ cells }) =>
    cells.some((cell) => /^\s*(?:error|residuals?|within(?:\sgroups)?)\b/i.test(cell)),
  )
  const line = lines.find(({ index }) => index > row.index) ?? lines[lines.length - 1]
  return line ? at(column, line) : null
}

/** '28 residual degrees of freedom throughout', '(38 degrees of freedom)', 'df = 54', 't(36)', 'F(2, 57)' in caption or notes. */
function findDf(text: string): number[] {
  const folded = fold(text)
  const two =
    /\bF\s?[(_]\s?(\d+)\s?[,;]\s?(\d+(?:\.\d+)?)|(\d+)\s(?:and|,)\s(\d+(?:\.\d+)?)\s(?:degrees of freedom|d\.?f\.?)/i.exec(
      folded,
    )
  if (two) return [Number(two[1] ?? two[3]), Number(two[2] ?? two[4])]
  const one =
    /(\d+(?:\.\d+)?)\s(?:residual\s|error\s)?(?:degrees of freedom|d\.f\.|df\b)|\b(?:df|d\.f\.|degrees of freedom)\s?(?:=|:|were|was|of)?\s?(\d+(?:\.\d+)?)|\b[tr]\s?[(_]\s?(\d+)\s?\)?/i.exec(
      folded,
    )
  const df = one?.[1] ?? one?.[2] ?? one?.[3]
  return df ? [Number(df)] : []
}

/** What caption and notes say of the p-values: 'pB: Bonferroni-corrected', 'adjusted P after Holm', 'P values are unadjusted'. */
function statedScale(role: ColumnRole, around: string, header: string): ColumnRole {
  if (role.kind !== 'p' || role.scale !== 'unknown') return role
  const text = fold(around)
  const byMark = markedNote(header, text)
  if (byMark !== null) {
    const [mention] = findProcedures(byMark)
    if (/unadjusted|uncorrected|not (?:adjusted|corrected)/i.test(byMark)) return { ...role, scale: 'raw' }
    if (mention || /adjust|correct/i.test(byMark))
      return { kind: 'p', scale: 'adjusted', procedure: mention?.procedure ?? null }
  }
  if (
    /\b(?:unadjusted|uncorrected|raw|nominal)\s[pP]\b|[pP](?:[\s-]?values?)?\s(?:\w+\s){0,4}(?:unadjusted|uncorrected|not (?:adjusted|corrected)|nominal)/i.test(
      text,
    )
  )
    return { ...role, scale: 'raw' }
  if (
    /\b(?:adjusted|corrected)\s[pP](?:[\s-]values?)?\b|\b[pP](?:[\s-]?values?)?\s?(?:_?\w+\s?)?[:=]?\s?(?:\w+\s){0,3}(?:[A-ZŠ]\w+-)?(?:adjusted|corrected)\b(?!\s(?:mean|odds|for (?!mult)))/.test(
      text,
    ) &&
    header.length < 40
  )
    return { ...role, scale: 'adjusted' }
  return role
}

/** The note of the mark on a head, 'p†' with '†, false discovery rate correction …'; null where there is none. */
function markedNote(header: string, notes: string): string | null {
  const mark = /([*†‡§#¶]+)\s*$|\^\{?([a-z])\}?\s*$/.exec(fold(header).trim())
  const sign = mark?.[1] ?? mark?.[2]
  if (!sign) return null
  const at = notes.search(new RegExp(`(?:^|[\\s.;^])${sign.replace(/[*^]/g, '\\$&')}\\s?[,:=)]?\\s`))
  if (at < 0) return null
  return notes.slice(at + 1).split(/[.;](?:\s|$)/)[0] ?? null
}

function roleOfRow(
  grid: Grid,
  sentence: string,
  statistic: ReadStatistic | undefined,
  hasPair: boolean,
): ReadReport['role'] {
  if (/baseline|demographic|characteristics|at (?:entry|inclusion|enrol)/i.test(grid.caption) && !hasPair)
    return 'baseline'
  if (
    /shapiro|levene|mauchly|bartlett|normality|homogeneity of variance|sphericity/i.test(
      `${grid.caption} ${sentence}`,
    )
  )
    return 'assumption'
  const label = sentence.split(' | ')[0] ?? ''
  if (/[×*]|\S:\S|\binteraction\b|\bx\b/.test(label) && !hasPair) return 'interaction'
  const numerator =
    statistic && (statistic.test === 'F' || statistic.test === 'chi2') ? statistic.df[0] : undefined
  if (numerator !== undefined && numerator > 1 && !hasPair) return 'omnibus'
  if (/\banova\b|analysis of (?:co)?variance/i.test(grid.caption) && statistic?.test === 'F' && !hasPair)
    return 'omnibus'
  return /^\(?intercept\)?$|^constant$/i.test(label.trim()) ? 'other' : 'comparison'
}

function placeOf(grid: Grid, row: GridRow, column: number) {
  return {
    source: grid.source,
    page: grid.page,
    row: row.number,
    sheet: grid.sheet,
    quote: (row.cells[column] ?? '').replace(/\s+/g, ' ').trim(),
    boxes: row.boxes[column] ?? [],
  }
}
