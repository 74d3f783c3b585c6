import type { Bench, Case } from '../../families/case'
import { count } from '../../families/design'
import type { Found, RuleRow } from '../finding'
import { capitalise, leadOf, reportsOf } from '../wording'

/** A question; a note where the correction counts the missing ones anyway. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

function inFamily({ comparisons, design, family, assigned, procedure }: Case): Found[] {
  if (design.due === null || design.kind === 'outcomes' || comparisons.length >= design.due) return []
  const [first] = comparisons
  const counted =
    (assigned?.view.m ?? 0) >= design.due || ['tukey', 'games-howell', 'scheffe'].includes(procedure)
  return [
    {
      severity: counted ? 'note' : 'question',
      family: family.id,
      reports: reportsOf(comparisons),
      place: (first && leadOf(first)?.place) ?? null,
      says: capitalise(
        `${count(comparisons.length, 'comparison is', 'comparisons are')} reported; ${design.why}.`,
      ),
      asks: `Please report all ${design.due} comparisons with their p-values, or the planned set and where it was fixed.`,
      cites: ['sampl', 'asa-2016'],
    },
  ]
}

export const comparisonsMissing: RuleRow = {
  rule: 'comparisons-missing',
  says: 'fewer comparisons printed than the design has',
  find,
}
