import type { Bench, Case, Judged } from '../../families/case'
import { independentRaw, rangeOfReport } from '../../families/evidence'
import { combine } from '../../families/interval'
import type { ReadReport } from '../../types'
import type { Found, RuleRow } from '../finding'
import { listSome, reportsOf, showRange, showReport } from '../wording'

/** Major where a call rests on it that does not stand, else minor. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap((judged) => {
    const below = listBelowRaw(judged)
    const [first] = below
    if (!first) return []
    const wrong = below.some(
      ({ comparison: { called, significant } }) => called === true && significant === false,
    )
    const entries = below.map(
      ({ comparison, report }) =>
        `${comparison.label}: printed ${showReport(report)}${comparison.raw ? `, unadjusted ${showRange(comparison.raw)}` : ''}`,
    )
    return [
      {
        severity: wrong ? 'major' : 'minor',
        family: judged.family.id,
        reports: reportsOf(below.map(({ comparison }) => comparison)),
        place: first.report.place,
        says: `An adjusted p-value is never smaller than the unadjusted one; here it is: ${listSome(entries)}.`,
        asks: 'Please check these values and give the adjusted p-values.',
        cites: ['dunn'],
      },
    ]
  })
}

/** Adjusted values that lie below the raw p for certain. Storey's q may, with an estimated share of true nulls. */
export function listBelowRaw({
  comparisons,
  assigned,
  series,
}: Case): { comparison: Judged; report: ReadReport }[] {
  const procedure = assigned?.view.procedure
  if (!procedure || ['storey', 'bky', 'fdr', 'none'].includes(procedure)) return []
  return comparisons.flatMap((comparison) => {
    const known = combine(independentRaw(comparison))
    if (!known || known.conflict) return []
    const report = comparison.items
      .map((item) => item.report)
      .find((each) => {
        const own = series.find(
          ({ source, presented }) => source === each.place.source && presented === each.scale,
        )
        const adjusted = own?.is === 'adjusted' || (each.scale === 'adjusted' && own?.is === 'unknown')
        return adjusted && !each.markOnly && rangeOfReport(each).high < known.range.low * 0.99
      })
    return report ? [{ comparison, report }] : []
  })
}

export const adjustedBelowRaw: RuleRow = {
  rule: 'adjusted-below-raw',
  says: 'an adjusted value below its raw value',
  find,
}
