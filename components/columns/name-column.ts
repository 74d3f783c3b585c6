import type { NamedColumn, TableDescription } from '@/lib/checks'
import type { NamedRole } from '@/lib/checks/vocabulary'

type Spot = Pick<NamedColumn, 'sheet' | 'row' | 'column'>

const isAt = (a: Spot, b: Spot) => a.sheet === b.sheet && a.row === b.row && a.column === b.column

/**
 * The named columns after a person gave one a role. A column that gets the role that is found without a person is
 * no longer named. `found`: the description of the same table without named columns.
 */
export function nameColumn(
  named: readonly NamedColumn[],
  spot: Spot,
  role: NamedRole,
  found: readonly TableDescription[],
): NamedColumn[] {
  const others = named.filter((one) => !isAt(one, spot))
  const tables = found.filter(({ sheet, row }) => sheet === spot.sheet && row === spot.row)
  const own = tables.flatMap(({ columns }) => columns).find(({ column }) => column === spot.column)
  return own?.role === role ? others : [...others, { ...spot, role }]
}

/** Whether two lists name the same columns the same way, in any order. */
export function isSameNaming(a: readonly NamedColumn[], b: readonly NamedColumn[]): boolean {
  return (
    a.length === b.length && a.every((one) => b.some((other) => isAt(one, other) && one.role === other.role))
  )
}
