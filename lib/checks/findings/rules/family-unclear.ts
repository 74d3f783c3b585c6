import type { Bench, Case } from '../../families/case'
import type { ClaimView } from '../../families/claims'
import { standing } from '../../families/outcome'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showDecision } from '../wording'

/** A question where the outcome depends on how the family is drawn; a note where it does not. */
function find({ cases }: Bench): Found[] {
  const open = cases.filter(({ design }) => design.due === null)
  const counted = cases.find(({ assigned }) => assigned?.own && assigned.view.m !== null)?.assigned?.view
  const outside = cases.flatMap((each) => {
    const { assigned, family } = each
    if (assigned !== null) return assigned.own ? [] : standsOutside(each, assigned.view)
    return counted && family.outcome === 'uncorrected' ? standsOutside(each, counted) : []
  })
  return [...open.map((each) => ofAlternatives(each)), ...outside]
}

function ofAlternatives({ under, family, assigned, comparisons, design }: Case): Found {
  const depends = new Set(under.map(({ outcome }) => outcome)).size > 1
  const open = comparisons.filter(({ called, significant }) => called !== null && significant === null)
  const each = under.map(({ m, outcome }) => `with m = ${m} ${standing[outcome]}`)
  const effect =
    open.length > 0 ? ` Adjusted p-values over these m: ${listSome(open.map(showDecision))}.` : ''
  const [first] = comparisons
  return {
    severity: depends || family.outcome === 'undecidable' ? 'question' : 'note',
    family: family.id,
    reports: reportsOf(open.length > 0 ? open : comparisons),
    place: assigned?.view.lead.place ?? (first && leadOf(first)?.place) ?? null,
    says: `The text allows more than one family: ${design.why}; ${each.join(', ')}.${effect}`,
    asks: `Please state which tests were corrected together: ${design.alternatives.join(' or ')}.`,
    cites: ['sampl', 'bender-lange'],
  }
}

/**
 * Tests beside a correction whose number fits another family. A question where the correction is said to hold for
 * them too; without that `no-correction` asks already, and this is a note.
 */
function standsOutside({ family, assigned, comparisons, design }: Case, view: ClaimView): Found[] {
  if (view.m === null || design.due === null || view.m === design.due) return []
  const [first] = comparisons
  const wrong = comparisons.filter(
    ({ called, significant }) => called !== null && significant !== null && called !== significant,
  )
  const effect =
    wrong.length > 0
      ? ` Adjusted by Holm as a family of their own: ${listSome(wrong.map(showDecision))}.`
      : ''
  return [
    {
      severity: assigned !== null && wrong.length > 0 ? 'question' : 'note',
      family: family.id,
      reports: reportsOf(comparisons),
      place: (first && leadOf(first)?.place) ?? view.lead.place,
      says: `The correction counts ${view.m} ${view.m === 1 ? 'test' : 'tests'}, which does not include these ${comparisons.length} (${family.label}).${effect}`,
      asks: 'Please say whether these tests belong to the corrected family, form one of their own, or are to be read one by one.',
      cites: ['sampl', 'ich-e9'],
    },
  ]
}

export const familyUnclear: RuleRow = {
  rule: 'family-unclear',
  says: 'the text allows more than one family; the outcome under each',
  find,
}
