import { printedInterval } from '../numbers/printed-interval'
import type { Box, ReadReport, ReadStatistic, SectionKind } from '../types'
import type { Call, NamedRole, Scale, Source } from '../vocabulary'
import { isMark, readLegend, readNumber, readP, type Legend, type PCell } from './cell'
import { callOfMark, callOfRow, markOf, toValue } from './marks'
import type { Control } from './pdf-table'
import { toColumnRole } from './named-role'
import { findRoles, type ColumnRole } from './roles'
import { controlOf, findControl, nameRow, pairOfLabel, spanOf, type RowNames } from './row-names'
import { statedScale } from './stated-scale'
import { findDf, toStatistic } from './statistics'

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

/** A grid with what was found out about it as a whole. */
export type Reader = {
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
  return readRows(makeReader(grid, controls))
}

const STAR = /[*∗†‡]/

/** What a table as a whole is taken for. `named`: by column, the role that a person gave it, which is obeyed. */
export function makeReader(
  grid: Grid,
  controls: readonly Control[] = [],
  named: ReadonlyMap<number, NamedRole> = new Map(),
): Reader {
  const columns = grid.headers.map((header, c) => ({
    header,
    cells: grid.rows.map(({ cells }) => cells[c] ?? ''),
  }))
  const around = `${grid.caption} ${grid.notes}`
  const roles = findRoles(columns).map((role, c) => {
    const header = grid.headers[c] ?? ''
    const name = named.get(c)
    return name === undefined ? statedScale(role, around, header) : toColumnRole(name, header, role)
  })
  return {
    grid,
    roles,
    legend: readLegend(around),
    df: findDf(around),
    control:
      findControl(`${grid.caption}. ${grid.headers.join('. ')}. ${grid.notes}`) ??
      controlOf(grid, roles, controls),
    starred: columns.map(({ cells }) =>
      cells.some((cell) => STAR.test(cell) && STAR.test(readP(cell)?.mark ?? readNumber(cell)?.mark ?? '')),
    ),
  }
}

/** The rows of a table, read by the roles of its columns. */
export function readRows(reader: Reader): Part {
  const { grid } = reader
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

type Row = { row: GridRow; names: RowNames; call: Call | null; sentence: string; statistics: ReadStatistic[] }

function readRow(reader: Reader, row: GridRow, heading: string | null): Part {
  const { roles } = reader
  const context: Row = {
    row,
    names: nameRow(reader, row, heading),
    call: callOfRow(reader, row),
    sentence: row.cells.join(' | '),
    statistics: [],
  }
  const reports: ReadReport[] = []
  roles.forEach((role, c) => {
    if (role.kind === 'statistic') readStatistic(reader, context, c, role)
    if (role.kind === 'p') reports.push(...readValue(reader, context, c, role.scale))
  })
  // a statistic that stands right of its value
  const [single, second] = context.statistics
  if (single && !second && single.report === null && reports.length === 1 && reports[0]) {
    reports[0].statistic = single.id
    single.report = reports[0].id
  }
  if (reports.length === 0) reports.push(...roles.flatMap((_, c) => readMark(reader, context, c)))
  return { reports, statistics: context.statistics }
}

function readStatistic(
  reader: Reader,
  { row, sentence, statistics }: Row,
  column: number,
  role: Extract<ColumnRole, { kind: 'statistic' }>,
): void {
  const { grid } = reader
  const statistic = toStatistic(reader, row, column, role)
  if (!statistic) return
  statistics.push({
    ...statistic,
    id: `${grid.key}-${row.index}-${column}-s`,
    place: placeOf(grid, row, column),
    report: null,
    offset: grid.offset,
    table: grid.table,
    cell: { row: row.index, column },
    sentence,
  })
}

/** The report of a cell in a p column; it belongs to the statistic to its left, whose own is the unadjusted value. */
function readValue(reader: Reader, context: Row, column: number, scale: Scale): ReadReport[] {
  const value = toValue(reader, context.row.cells[column] ?? '')
  if (!value) return []
  const statistic = context.statistics[context.statistics.length - 1]
  const called = callOfMark(reader, column, value.mark, value.markOnly) ?? context.call
  const report = toReport(reader, context, column, value, { scale, called, statistic })
  if (statistic && (statistic.report === null || scale === 'raw')) statistic.report = report.id
  return [report]
}

/** Rows without a value that carry marks: the bound of the mark, with the statistic or estimate that bears it. */
function readMark(reader: Reader, context: Row, column: number): ReadReport[] {
  const { grid } = reader
  const mark = markOf(reader, context.row, column)
  const value = mark === null ? null : toValue(reader, mark)
  // marks other than asterisks mean nothing without a key
  if (mark === null || !value || (/^[†‡§#¶]/.test(mark) && !reader.legend.has(mark))) return []
  const own = `${grid.key}-${context.row.index}-${column}-s`
  const statistic = context.statistics.find(({ id }) => id === own) ?? context.statistics[0]
  const called = callOfMark(reader, column, value.mark, true)
  const scale = /adjust|correct/i.test(`${grid.caption} ${grid.notes}`) ? 'adjusted' : 'unknown'
  const report = toReport(reader, context, column, value, { scale, called, statistic })
  if (statistic) statistic.report = report.id
  return [report]
}

function toReport(
  reader: Reader,
  { row, names, sentence }: Row,
  column: number,
  value: PCell & { markOnly: boolean },
  told: { scale: Scale; called: Call | null; statistic: ReadStatistic | undefined },
): ReadReport {
  const { grid } = reader
  const comparison = names.comparison ?? (value.label === null ? null : pairOfLabel(value.label))
  const around = `${grid.headers[column] ?? ''} ${grid.caption} ${grid.notes}`
  return {
    id: `${grid.key}-${row.index}-${column}-p`,
    place: placeOf(grid, row, column),
    relation: value.relation,
    value: value.value,
    decimals: value.decimals,
    ...printedInterval(value.value, value.decimals, value.relation),
    scale: told.scale,
    statistic: told.statistic?.id ?? null,
    comparison,
    called: told.called,
    family: null,
    offset: grid.offset,
    section: grid.section,
    heading: grid.caption,
    table: grid.table,
    cell: { row: row.index, column },
    sentence,
    outcome: names.outcome ?? spanOf(reader, column),
    role: roleOfRow(grid, sentence, told.statistic, comparison !== null),
    oneSided: /\b(?:one|1)-(?:sided|tailed)\b/i.test(around),
    markOnly: value.markOnly,
  }
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
