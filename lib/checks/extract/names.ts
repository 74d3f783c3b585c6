import type { ReadReport } from '../types'
import { prepareNames, type KnownName } from './grammar/comparison'

/** Names that the tables give: groups of the compared pairs, and outcomes. */
export type Names = { groups: KnownName[]; outcomes: KnownName[] }

/** Names of groups and outcomes from the rows of tables, for finding them again in sentences. */
export function collectNames(reports: readonly ReadReport[]): Names {
  const groups = reports.flatMap(({ comparison }) => comparison ?? [])
  const taken = new Set(groups.map((name) => name.toLowerCase()))
  const outcomes = reports
    .map(({ outcome }) => outcome)
    .filter((name): name is string => name !== null && name.length > 1 && !taken.has(name.toLowerCase()))
  return { groups: prepareNames(groups), outcomes: prepareNames(outcomes) }
}
