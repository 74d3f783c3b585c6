import type { Bench, Case } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showDecision, showYardstick } from '../wording'

/** Major: a conclusion changes. Only calls in words count, and only under a procedure that is named. */
function find({ cases }: Bench): Found[] {
  return cases
    .filter(({ family, exemption }) => family.outcome !== 'uncorrected' && exemption === null)
    .flatMap(inFamily)
}

function inFamily(judgedCase: Case): Found[] {
  const { comparisons, family, alpha } = judgedCase
  const kept = comparisons.filter(
    ({ called, significant, implied }) => !implied && called === false && significant,
  )
  const [first] = kept
  if (!first) return []
  return [
    {
      severity: 'major',
      family: family.id,
      reports: reportsOf(kept),
      place: leadOf(first)?.place ?? null,
      says: `${kept.length === 1 ? 'One comparison is' : `${kept.length} comparisons are`} called not significant, but the adjusted p-value by ${showYardstick(judgedCase)} is below ${alpha}: ${listSome(kept.map(showDecision))}.`,
      asks: `Please check what is said of ${kept.length > 4 ? 'these comparisons' : kept.map(({ label }) => label).join(', ')}, or state the level against which it was made.`,
      cites: ['sampl'],
    },
  ]
}

export const callUnderstated: RuleRow = {
  rule: 'call-understated',
  says: 'called not significant, is significant after the claimed correction',
  find,
}
