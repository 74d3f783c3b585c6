import type { Bench, Case } from '../../families/case'
import { procedureTable } from '../../procedures/table'
import type { Found, RuleRow } from '../finding'
import { capitalise, reportsOf } from '../wording'

/** Minor where control is claimed in words, else a question. Silent up to the number of groups for which it holds. */
function find({ cases, remarks }: Bench): Found[] {
  return cases.flatMap((each) => inFamily(each, remarks.familyWise !== null))
}

function inFamily({ assigned, comparisons, family, design, kind }: Case, saysFamilyWise: boolean): Found[] {
  const view = assigned?.view
  if (!view || view.procedure === 'fdr' || view.procedure === 'none' || view.procedure === 'unspecified')
    return []
  const { controls, label, upToGroups } = procedureTable[view.procedure]
  const groups = Math.max(design.groups.length, view.groups ?? 0)
  if (controls !== 'none' || kind !== 'pairs' || groups <= (upToGroups ?? 0)) return []
  const claimed = view.errorRate === 'fwer' || saysFamilyWise
  return [
    {
      severity: claimed ? 'minor' : 'question',
      family: family.id,
      reports: reportsOf(comparisons),
      place: view.lead.place,
      says: `${capitalise(label)} holds the family-wise error rate for up to ${upToGroups ?? 2} groups; here there are ${groups}.${claimed ? ' Control of this rate is claimed.' : ''}`,
      asks: 'Please use a procedure that controls the family-wise rate for this many groups, such as Tukey or Holm, or say which error rate is meant.',
      cites: ['hayter'],
    },
  ]
}

export const procedureDoesNotControl: RuleRow = {
  rule: 'procedure-does-not-control',
  says: 'the procedure does not control the error rate that is claimed for this many groups',
  find,
}
