import type { Reader } from './grid'
import type { ColumnRole } from './roles'

const CARRIED = new Set<ColumnRole['kind']>(['group', 'outcome'])
const NAMES = new Set<ColumnRole['kind']>(['comparison', 'group', 'group2', 'outcome', 'label'])

/**
 * A name that is printed once for several rows ('kelp' beside 'krill', then a blank beside 'fish') counts for the rows
 * below it that name something else; a blank row or a heading ends it.
 */
export function carryNames(reader: Reader): Reader {
  const { grid, roles } = reader
  const columns = roles.flatMap(({ kind }, c) => (CARRIED.has(kind) ? [c] : []))
  const names = roles.flatMap(({ kind }, c) => (NAMES.has(kind) ? [c] : []))
  if (columns.length === 0 || names.length < 2) return reader
  const last = new Map<number, string>()
  const rows = grid.rows.map((row) => {
    if (row.number === null) last.clear()
    const cells = [...row.cells]
    for (const c of columns) {
      const own = (cells[c] ?? '').trim()
      const above = last.get(c)
      if (own !== '') last.set(c, own)
      else if (above !== undefined && names.some((n) => n !== c && (row.cells[n] ?? '').trim() !== ''))
        cells[c] = above
    }
    return { ...row, cells }
  })
  return { ...reader, grid: { ...grid, rows } }
}
