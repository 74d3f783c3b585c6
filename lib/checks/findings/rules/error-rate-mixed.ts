import type { Bench, Case } from '../../families/case'
import { countCalls } from '../../families/outcome'
import { procedureTable } from '../../procedures/table'
import type { Procedure } from '../../vocabulary'
import type { Found, RuleRow } from '../finding'
import { capitalise, listSome, reportsOf, showDecision } from '../wording'

/** Major where calls do not stand under control of the rate that is claimed, else minor; a note for the reverse. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

function inFamily({ assigned, comparisons, family }: Case): Found[] {
  const view = assigned?.view
  if (!view || view.errorRate === null) return []
  const named: Procedure | null =
    view.procedure === 'fdr'
      ? 'bh'
      : view.procedure === 'none' || view.procedure === 'unspecified'
        ? null
        : view.procedure
  if (named === null || procedureTable[named].controls === 'none') return []
  const { controls, label } = procedureTable[named]
  if (controls === view.errorRate) return []
  const lax = controls === 'fdr'
  const { wrong } = countCalls(comparisons)
  const changed = comparisons.filter(({ called, significant }) => called === true && significant === false)
  const effect =
    lax && changed.length > 0
      ? ` By Holm these calls would not stand: ${listSome(changed.map(showDecision))}.`
      : ''
  return [
    {
      severity: !lax ? 'note' : wrong > 0 ? 'major' : 'minor',
      family: family.id,
      reports: reportsOf(changed),
      place: view.lead.place,
      says: lax
        ? `${capitalise(label)} controls the false discovery rate; the manuscript speaks of the family-wise error rate.${effect}`
        : `${capitalise(label)} controls the family-wise error rate; the manuscript speaks of the false discovery rate.`,
      asks: lax
        ? 'Please say which error rate is meant: describe the results as controlled for the false discovery rate, or use a procedure for the family-wise rate.'
        : 'Please name the error rate that the procedure controls.',
      cites: ['benjamini-hochberg', 'holm'],
    },
  ]
}

export const errorRateMixed: RuleRow = {
  rule: 'error-rate-mixed',
  says: 'a false discovery rate procedure, presented as control of the family-wise rate, or the reverse',
  find,
}
