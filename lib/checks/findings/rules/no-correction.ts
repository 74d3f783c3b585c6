import { familyWiseError } from '../../sensitivity/family-wise-error'
import type { Bench, Case } from '../../families/case'
import { countCalls } from '../../families/outcome'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showDecision } from '../wording'

/**
 * Major where control of the family-wise rate is claimed and a call would not stand; a question where calls would not
 * stand or where the correction of other tests is claimed; else a note.
 */
function find({ cases, remarks }: Bench): Found[] {
  return cases
    .filter(({ family, assigned }) => family.outcome === 'uncorrected' && !isReached(assigned))
    .map((each) => inFamily(each, remarks.familyWise !== null))
}

/** A claim for the whole manuscript that was not acted on here is found as `adjustment-absent`. */
function isReached(assigned: Case['assigned']): boolean {
  return assigned !== null && assigned.view.procedure !== 'none'
}

function inFamily(judgedCase: Case, saysFamilyWise: boolean): Found {
  const { comparisons, family, assigned, alpha } = judgedCase
  const { wrong } = countCalls(comparisons)
  const view = assigned?.view ?? null
  const claimsControl = view?.errorRate === 'fwer' || (view !== null && saysFamilyWise)
  const m = comparisons.length
  const rate = familyWiseError(alpha, m).toFixed(3)
  const changed = comparisons.filter(({ called, significant }) => called === true && significant === false)
  const [first] = changed.length > 0 ? changed : comparisons
  const effect =
    changed.length > 0
      ? ` By Holm with m = ${m} these calls would not stand: ${listSome(changed.map(showDecision))}.`
      : ''
  const declared = view ? 'the manuscript says that none was corrected' : 'no correction was found'
  return {
    severity: claimsControl && wrong > 0 ? 'major' : wrong > 0 ? 'question' : 'note',
    family: family.id,
    reports: reportsOf(changed.length > 0 ? changed : comparisons),
    place: view?.lead.place ?? (first && leadOf(first)?.place) ?? null,
    says: `${m} tests at ${alpha} each; ${declared}.${claimsControl ? ' Control of the error rate over all tests is claimed.' : ''} If all ${m} null hypotheses were true and the tests independent, at least one would be called significant with probability ${rate}.${effect}`,
    asks: 'Please state which tests form the family and how the error rate was handled, or explain why no adjustment is needed and word the conclusions test by test.',
    cites: ['sampl', 'bender-lange', 'cook-farewell'],
  }
}

export const noCorrection: RuleRow = {
  rule: 'no-correction',
  says: 'several tests, family-wise wording or a house rule, and no correction',
  find,
}
