import type { Bench, Case } from '../../families/case'
import type { ReadReport } from '../../types'
import type { Found, RuleRow } from '../finding'
import { listSome, showReport } from '../wording'

/** Minor: the product is to be set to 1; no conclusion changes. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap((judged) => {
    const above = isAboveOne(judged)
    const [first] = above
    if (!first) return []
    return [
      {
        severity: 'minor',
        family: judged.family.id,
        reports: above.map(({ id }) => id),
        place: first.place,
        says: `Adjusted p-values above 1 are printed: ${listSome(above.map(showReport))}.`,
        asks: 'Please give adjusted p-values above 1 as 1.',
        cites: ['dunn'],
      },
    ]
  })
}

/** Values above 1 in a family whose values are, or are claimed to be, adjusted. */
export function isAboveOne({ comparisons, assigned, series }: Case): ReadReport[] {
  const adjusts =
    (assigned !== null && assigned.view.procedure !== 'none') || series.some(({ is }) => is === 'adjusted')
  if (!adjusts) return []
  return comparisons
    .flatMap(({ items }) => items.map(({ report }) => report))
    .filter(({ value, place }) => value > 1 && place.source !== 'results-table')
}

export const adjustedAboveOne: RuleRow = {
  rule: 'adjusted-above-one',
  says: 'an adjusted value above 1',
  find,
}
