import type { Bench, Case, Judged } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showDecision, showYardstick } from '../wording'

/** A question: a further digit is needed to judge. */
function find({ cases }: Bench): Found[] {
  return cases
    .filter(
      ({ family, design, asPrinted }) =>
        family.outcome !== 'uncorrected' && design.due !== null && !asPrinted,
    )
    .flatMap(inFamily)
}

function inFamily(judgedCase: Case): Found[] {
  const { comparisons, family, alpha } = judgedCase
  const open = comparisons.filter(
    ({ called, significant, conflict, raw }) =>
      called !== null && significant === null && !conflict && isRounded(raw),
  )
  const [first] = open
  if (!first) return []
  return [
    {
      severity: 'question',
      family: family.id,
      reports: reportsOf(open),
      place: leadOf(first)?.place ?? null,
      says: `By ${showYardstick(judgedCase)} the printed precision leaves open on which side of ${alpha} the adjusted value lies: ${listSome(open.map(showDecision))}. ${digitFor(first)}`,
      asks: `Please give ${open.length > 3 ? 'these p-values' : `the p-value${open.length > 1 ? 's' : ''} of ${open.map(({ label }) => label).join(', ')}`} with one more digit, or the test statistic with its degrees of freedom.`,
      cites: ['apa-7'],
    },
  ]
}

/** A range as wide as a rounding makes it; wider ones lack more than a digit. */
function isRounded(raw: Judged['raw']): boolean {
  return raw !== null && raw.low > 0 && raw.high <= 2 * raw.low
}

/** Which digit would decide, for the number that is quoted. */
function digitFor(comparison: Judged): string {
  const lead = leadOf(comparison)
  if (!lead || lead.relation !== '=' || lead.decimals < 1) return 'The exact p-value would decide it.'
  return `One more decimal than the ${lead.decimals} printed would most likely decide it.`
}

export const undecidedByRounding: RuleRow = {
  rule: 'undecided-by-rounding',
  says: 'the printed precision cannot decide; which digit would',
  find,
}
