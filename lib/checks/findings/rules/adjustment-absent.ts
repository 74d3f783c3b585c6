import { worksOnT } from '../../families/adjusted'
import type { Bench, Case } from '../../families/case'
import { nameOf } from '../../families/outcome'
import type { Procedure } from '../../vocabulary'
import { PROCEDURES } from '../../vocabulary'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showReport } from '../wording'

/** Major where a call does not stand after the correction, else minor. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

function inFamily(judgedCase: Case): Found[] {
  const { series, assigned, comparisons, family } = judgedCase
  const view = assigned?.view
  if (!view || view.procedure === 'none' || view.procedure === 'lsd') return []
  const named = PROCEDURES.find((name): name is Procedure => name === view.procedure) ?? null
  const givesValues = named !== null && worksOnT(named)
  const own = series.filter(({ source, is }) => source !== 'results-table' && is === 'raw')
  const found = own.find(
    ({ presented, agreeing, checked }) =>
      agreeing >= Math.min(2, checked) &&
      (presented === 'adjusted' || givesValues || !assigned.own) &&
      presented !== 'raw',
  )
  if (!found) return []
  // a raw value quoted beside adjusted ones of the same tests is no lack of these
  const givenToo = comparisons.filter(({ printed }) => printed !== null).length
  if (2 * givenToo > comparisons.length) return []
  const concerned = comparisons.filter(({ items }) =>
    items.some(({ report }) => report.place.source === found.source && report.scale === found.presented),
  )
  const wrong = comparisons.filter(({ called, significant }) => called === true && significant === false)
  const [first] = concerned
  const values = concerned.flatMap((comparison) => {
    const lead = leadOf(comparison)
    return lead ? [`${comparison.label} (${showReport(lead)})`] : []
  })
  return [
    {
      severity: wrong.length > 0 ? 'major' : 'minor',
      family: family.id,
      reports: reportsOf(concerned),
      place: (first && leadOf(first)?.place) ?? view.lead.place,
      says: `The values are given as corrected${named ? ` (${nameOf(named)})` : ''}; ${found.agreeing} of the ${found.checked} printed values that can be checked ${found.agreeing === 1 ? 'equals' : 'equal'} the unadjusted p-value: ${listSome(values)}.`,
      asks: `Please give the adjusted values, or label the printed ones as unadjusted and say how the correction was applied.`,
      cites: ['sampl', 'jars-quant'],
    },
  ]
}

export const adjustmentAbsent: RuleRow = {
  rule: 'adjustment-absent',
  says: 'values presented as adjusted equal the raw ones recomputed from their statistics',
  find,
}
