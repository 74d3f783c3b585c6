import { pBounds } from '../numbers/p-bounds'
import { roundingInterval } from '../numbers/printed-interval'
import { fold } from '../extract/grammar/fold'
import type { ReadStatistic } from '../types'
import type { Test } from '../vocabulary'
import { readNumber } from './cell'
import type { Grid, GridRow, Reader } from './grid'
import type { ColumnRole } from './roles'

/** The statistic of one cell, with the degrees of freedom from wherever the table states them; null where it holds none. */
export function toStatistic(
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
  const near = nearColumns(roles, columns, column)
  const first = near.filter(({ index }) => index === 0).pop() ?? near[near.length - 1]
  const own = first === undefined ? null : at(first.c)
  if (own !== null && first) {
    // between two models the number of parameters is told as a loss: -2
    if (test !== 'F') return [test === 'chi2' ? Math.abs(own) : own]
    const second = near.find(({ index }) => index === 1)
    const error = second ? at(second.c) : residualDf(grid, row, first.c, at)
    return error === null ? (df.length === 2 ? df : []) : [own, error]
  }
  const both = first && test === 'F' ? PAIR_OF_DF.exec((row.cells[first.c] ?? '').trim()) : null
  if (both) return [Number(both[1]), Number(both[2])]
  if (test === 'r') {
    const n = roles.findIndex((role) => role.kind === 'n')
    const count = n < 0 ? null : at(n)
    if (count !== null) return [count - 2]
    const all = /\b[nN]\s?=\s?(\d+)/.exec(`${grid.caption} ${grid.notes} ${grid.headers.join(' ')}`)?.[1]
    if (all) return [Number(all) - 2]
  }
  return df.length === (test === 'F' ? 2 : 1) ? df : []
}

/** '2, 38', '2/38', '(2; 57.5)' in a column of degrees of freedom. */
const PAIR_OF_DF = /^\(?(\d+)\s?(?:,\s|[;/])\s?(\d+(?:\.\d+)?)\)?$/

/**
 * The columns of df that stand with a statistic: those right before it where df come first in the table, else those
 * between it and the next statistic; all, where none stand there.
 */
function nearColumns<C extends { c: number }>(
  roles: readonly ColumnRole[],
  columns: readonly C[],
  column: number,
): readonly C[] {
  const statistics = roles.flatMap(({ kind }, c) => (kind === 'statistic' ? [c] : []))
  const since = statistics.findLast((c) => c < column) ?? -1
  const until = statistics.find((c) => c > column) ?? roles.length
  const before = columns.filter(({ c }) => c < column && c > since)
  const after = columns.filter(({ c }) => c > column && c < until)
  const leading = (columns[0]?.c ?? 0) < (statistics[0] ?? 0)
  const near = leading || after.length === 0 ? before : after
  return near.length > 0 ? near : columns
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
export function findDf(text: string): number[] {
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
