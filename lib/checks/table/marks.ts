import { fold } from '../extract/grammar/fold'
import type { Call } from '../vocabulary'
import { isMark, isNotSignificantMark, readCall, readNumber, readP, type PCell } from './cell'
import type { GridRow, Reader } from './grid'

/** The value that a cell of a p column holds; a mark alone stands for its bound, 'n.s.' for 'above the level'. */
export function toValue({ legend, grid }: Reader, cell: string): (PCell & { markOnly: boolean }) | null {
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
export function callOfMark(
  { starred }: Reader,
  column: number,
  mark: string,
  markOnly: boolean,
): Call | null {
  if (isNotSignificantMark(mark)) return 'not significant'
  if (mark !== '') return 'significant'
  return starred[column] && !markOnly ? 'not significant' : null
}

/** The row's call: a column of calls or marks, an asterisk on statistic or estimate. */
export function callOfRow({ roles, starred }: Reader, { cells }: GridRow): Call | null {
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

/** The mark by which a cell outside the p columns says how its row came out: '***' alone, or on a statistic or estimate. */
export function markOf({ roles }: Reader, { cells }: GridRow, column: number): string | null {
  const cell = cells[column] ?? ''
  const kind = roles[column]?.kind
  if (kind === 'stars') return isMark(cell) ? cell.trim() : null
  if (kind !== 'statistic' && kind !== 'estimate') return null
  const mark = readNumber(cell)?.mark ?? ''
  return mark === '' ? null : mark
}
