import type { ReadReport } from '../types'
import { prepareNames, type KnownName } from './grammar/comparison'

/** Names that the tables give: groups of the compared pairs, the groups that are in all of three or more pairs, outcomes. */
export type Names = { groups: KnownName[]; shared: string[]; outcomes: KnownName[] }

/** Names of groups and outcomes from the rows of tables, for finding them again in sentences. */
export function collectNames(reports: readonly ReadReport[]): Names {
  const pairs = reports.flatMap(({ comparison }) => (comparison ? [comparison] : []))
  const distinct = new Set(pairs.map((pair) => pair.map((name) => name.toLowerCase()).join('|')))
  const [first] = pairs
  const shared =
    distinct.size < 3
      ? []
      : (first ?? []).filter((name) =>
          pairs.every((pair) => pair.some((other) => other.toLowerCase() === name.toLowerCase())),
        )
  const groups = pairs.flat()
  const taken = new Set(groups.map((name) => name.toLowerCase()))
  const outcomes = reports
    .map(({ outcome }) => outcome)
    .filter((name): name is string => name !== null && name.length > 1 && !taken.has(name.toLowerCase()))
  return { groups: prepareNames(groups), shared, outcomes: prepareNames(outcomes) }
}
