import { findRoles } from '../table/roles'
import type { PdfTable, ReadReport } from '../types'
import { fold } from './grammar/fold'
import { prepareNames, type KnownName } from './grammar/comparison'

/** Names that the tables give: groups of the compared pairs, the groups that are in all of three or more pairs, outcomes. */
export type Names = { groups: KnownName[]; shared: string[]; outcomes: KnownName[] }

/** Names of groups and outcomes from the rows of tables, for finding them again in sentences. */
export function collectNames(reports: readonly ReadReport[], tables: readonly PdfTable[]): Names {
  const pairs = reports.flatMap(({ comparison }) => (comparison ? [comparison] : []))
  const groups = [...pairs.flat(), ...tables.flatMap(listGroups)]
  const taken = new Set(groups.map((name) => name.toLowerCase()))
  const outcomes = reports
    .map(({ outcome }) => outcome)
    .filter((name): name is string => name !== null && name.length > 1 && !taken.has(name.toLowerCase()))
  return { groups: prepareNames(groups), shared: findShared(pairs), outcomes: prepareNames(outcomes) }
}

function findShared(pairs: readonly [string, string][]): string[] {
  const distinct = new Set(pairs.map((pair) => pair.map((name) => name.toLowerCase()).join('|')))
  const [first] = pairs
  if (distinct.size < 3 || !first) return []
  return first.filter((name) =>
    pairs.every((pair) => pair.some((other) => other.toLowerCase() === name.toLowerCase())),
  )
}

/** The groups of a table of means: names in the first column under a head, beside mean and n or SD. */
function listGroups(table: PdfTable): string[] {
  const columns = Array.from({ length: table.columns }, (_, c) => ({
    header: table.header
      .map((row) => row[c]?.text.trim() ?? '')
      .filter((text) => text !== '')
      .join(' | '),
    cells: table.rows.map((row) => row[c]?.text ?? ''),
  }))
  const kinds = findRoles(columns).map(({ kind }) => kind)
  const [first] = columns
  const described = kinds.filter(
    (kind) => kind === 'mean' || kind === 'sd' || kind === 'se' || kind === 'n',
  ).length
  if (!first || first.header === '' || !(kinds[0] === 'group' || kinds[0] === 'label')) return []
  if (described < 2 || !kinds.includes('mean') || first.cells.length > 20) return []
  return first.cells
    .map((cell) => fold(cell).trim())
    .filter((name) => /[A-Za-z]/.test(name) && name.length <= 40)
}
