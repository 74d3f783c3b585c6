import type { Bench } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { reportsOf } from '../wording'

/** A question: needed to judge. Silent where another sentence names the procedure. */
function find({ views, cases }: Bench): Found[] {
  const named = views.some(({ procedure }) => procedure !== 'unspecified' && procedure !== 'none')
  return views
    .filter((view) => view.procedure === 'unspecified')
    .filter((view) => !named || cases.some(({ assigned }) => assigned?.view === view && assigned.own))
    .map((view) => {
      const concerned = cases.find(({ assigned }) => assigned?.view === view)
      return {
        severity: 'question',
        family: concerned?.family.id ?? null,
        reports: concerned ? reportsOf(concerned.comparisons) : [],
        place: view.lead.place,
        says: `A correction is stated without naming the procedure: "${view.lead.place.quote.slice(0, 200)}".`,
        asks: 'Please name the procedure and the number of tests to which it was applied.',
        cites: ['sampl'],
      }
    })
}

export const procedureUnnamed: RuleRow = {
  rule: 'procedure-unnamed',
  says: '"corrected", without saying how',
  find,
}
