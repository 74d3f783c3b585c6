import type { HouseRules, ReadTable } from '../types'
import type { ClaimedProcedure, NamedRole, Relation, Scale, Test } from '../vocabulary'
import { isMark, isMissing, readNumber } from './cell'
import { readRows } from './grid'
import { nameRole } from './named-role'
import { listBlocks, type BlockReader } from './results-table'
import type { ColumnRole } from './roles'

/**
 * What a column was taken for. `column`: 0-based, of the sheet; `role`: by the name that a person may give it, with
 * `scale`, `procedure` and `test` where the role has one; `named`: a person gave it; `cells`: of the first rows, in
 * the order of `TableDescription.sample`; `filled`: cells that hold anything but a sign for a missing value; `reads`:
 * how many of them were read as what the role says.
 */
export type ColumnDescription = {
  column: number
  header: string
  role: NamedRole
  named: boolean
  scale: Scale | null
  procedure: ClaimedProcedure | null
  test: Test | null
  cells: string[]
  filled: number
  reads: number
}

/** One value that was read: the p-value of a row as printed, and what it is about. `row`: 1-based data row. */
export type ReadValue = {
  row: number | null
  comparison: [string, string] | null
  outcome: string | null
  relation: Relation
  value: number
  decimals: number
  scale: Scale
  markOnly: boolean
  statistic: { test: Test; df: number[]; value: number; decimals: number } | null
}

/** One table of a results file. `sheet`, `row`: where it begins, as `NamedColumn` wants it; `sample`: its first data rows. */
export type TableDescription = {
  sheet: number
  sheetName: string | null
  row: number
  title: string
  rows: number
  sample: (number | null)[]
  columns: ColumnDescription[]
  reports: number
  statistics: number
  values: ReadValue[]
}

const SAMPLE = 6

/**
 * What each column of each table of a results file was taken for and what was read with it, at the level of the house.
 * `values`: the first `limit` p-values of each table. Pure; the same code that the audit reads with.
 */
export function describeTable(
  table: ReadTable,
  rules: Pick<HouseRules, 'alpha'>,
  limit = 12,
): TableDescription[] {
  return listBlocks(table, rules.alpha).map((block) => describeBlock(table, block, limit))
}

function describeBlock(
  { sheets, roles = [] }: ReadTable,
  { sheet, block, reader }: BlockReader,
  limit: number,
): TableDescription {
  const { reports, statistics } = readRows(reader)
  const printed = new Map(statistics.map((statistic) => [statistic.id, statistic] as const))
  const found = { p: countByColumn(reports), statistic: countByColumn(statistics) }
  const body = block.rows.filter(({ number }) => number !== null)
  const sample = body.slice(0, SAMPLE)
  return {
    sheet,
    sheetName: sheets[sheet]?.name ?? null,
    row: block.row,
    title: block.title,
    rows: body.length,
    sample: sample.map(({ number }) => number),
    columns: block.headers.map((header, c) => {
      const role = reader.roles[c] ?? { kind: 'other' as const }
      const column = block.column + c
      const cells = body.map(({ cells: texts }) => texts[c] ?? '')
      const filled = cells.filter((cell) => cell !== '' && !isMissing(cell))
      return {
        column,
        header,
        role: nameRole(role),
        named: roles.some((n) => n.sheet === sheet && n.row === block.row && n.column === column),
        scale: role.kind === 'p' ? role.scale : null,
        procedure: role.kind === 'p' ? role.procedure : null,
        test: role.kind === 'statistic' ? role.test : null,
        cells: sample.map(({ cells: texts }) => texts[c] ?? ''),
        filled: filled.length,
        reads:
          role.kind === 'p' || role.kind === 'statistic'
            ? (found[role.kind].get(c) ?? 0)
            : countReads(role, filled),
      }
    }),
    reports: reports.length,
    statistics: statistics.length,
    values: reports.slice(0, limit).map((report) => {
      const { relation, value, decimals, scale, markOnly, comparison, outcome, place } = report
      const of = report.statistic === null ? undefined : printed.get(report.statistic)
      const statistic = of ? { test: of.test, df: of.df, value: of.value, decimals: of.decimals } : null
      return { row: place.row, comparison, outcome, relation, value, decimals, scale, markOnly, statistic }
    }),
  }
}

/** How many of the parts of a reading stand in each column of the table. */
function countByColumn(parts: readonly { cell?: { column: number } | null }[]): Map<number, number> {
  const counts = new Map<number, number>()
  for (const { cell } of parts) if (cell) counts.set(cell.column, (counts.get(cell.column) ?? 0) + 1)
  return counts
}

const NUMBERS = new Set<ColumnRole['kind']>(['df', 'n', 'mean', 'sd', 'se', 'estimate'])

function countReads(role: ColumnRole, filled: readonly string[]): number {
  if (role.kind === 'other') return 0
  if (role.kind === 'stars') return filled.filter(isMark).length
  if (NUMBERS.has(role.kind)) return filled.filter((cell) => readNumber(cell) !== null).length
  return filled.length
}
