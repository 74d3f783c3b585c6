import type { NamedColumn, ReadTable, TableRemark } from '../types'
import { isDateCell, remarkOnDates } from './date-cells'
import { carryNames } from './carry-names'
import { makeReader, readRows, type Part, type Reader } from './grid'
import { splitSheet, type Block } from './split-sheet'

/** A table of the results file with what it was taken for; `sheet` is an index into the file's sheets. */
export type BlockReader = { sheet: number; block: Block; reader: Reader }

/** Reports and statistics of a results table handed in beside the manuscript, sheet by sheet, table by table. */
export function readResultsTable(table: ReadTable, alpha: number): Part & { remarks: TableRemark[] } {
  const blocks = listBlocks(table, alpha)
  const parts = blocks.map(({ reader }) => readRows(reader))
  return {
    reports: parts.flatMap(({ reports }) => reports),
    statistics: parts.flatMap(({ statistics }) => statistics),
    remarks: [
      ...(table.remarks ?? []).map((remark) => ({ ...remark, place: null })),
      ...blocks.flatMap((block) => remarkOnBlock(table, block)),
    ],
  }
}

/** Every table of every sheet, its columns taken for what they hold or for what a person named them. */
export function listBlocks(table: ReadTable, alpha: number): BlockReader[] {
  return table.sheets.flatMap((sheet, s) =>
    splitSheet(sheet).map((block, b) => {
      const grid = {
        key: `sheet${s}-${b}`,
        source: 'results-table' as const,
        page: null,
        sheet: sheet.name,
        table: s,
        caption: block.title || (table.sheets.length > 1 ? (sheet.name ?? '') : ''),
        notes: block.notes,
        headers: block.headers,
        rows: block.rows,
        offset: 0,
        section: 'results' as const,
        alpha,
      }
      const reader = makeReader(grid, [], namedIn(table.roles ?? [], s, block))
      return { sheet: s, block, reader: carryNames(reader) }
    }),
  )
}

/** The roles that a person gave the columns of one table, by the table's own columns. */
function namedIn(roles: readonly NamedColumn[], sheet: number, { row, column, headers }: Block) {
  const own = roles.filter((named) => named.sheet === sheet && named.row === row)
  return new Map(
    own
      .map((named) => [named.column - column, named.role] as const)
      .filter(([c]) => c >= 0 && c < headers.length),
  )
}

function remarkOnBlock({ sheets }: ReadTable, { sheet: s, block, reader }: BlockReader): TableRemark[] {
  const sheet = sheets[s]
  if (!sheet?.rows.some((row) => row.some(isDateCell))) return []
  return block.headers.flatMap((header, c) => {
    const role = reader.roles[c]
    const cells = block.lines.flatMap((line, i) => {
      const cell = line === null ? undefined : sheet.rows[line]?.[block.column + c]
      return cell ? [{ cell, number: block.rows[i]?.number ?? null }] : []
    })
    const remark = role ? remarkOnDates({ header, role, cells }, sheet.name) : null
    return remark ? [remark] : []
  })
}
