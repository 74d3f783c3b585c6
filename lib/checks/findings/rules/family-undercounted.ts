import type { Bench, Case } from '../../families/case'
import { countCalls } from '../../families/outcome'
import type { Found, RuleRow } from '../finding'
import { listSome, reportsOf, showDecision, showLevel } from '../wording'

/** Major where a call depends on the number of tests, else minor. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

/** The m that was used: as stated, else as the lowered level tells. */
function usedM({ assigned, alpha }: Case): number | null {
  const view = assigned?.own ? assigned.view : null
  if (!view) return null
  if (view.m !== null) return view.m
  const ratio = view.threshold === null ? 1 : alpha / view.threshold
  const m = Math.round(ratio)
  return m >= 2 && Math.abs(ratio - m) < 0.06 * m ? m : null
}

function inFamily(judgedCase: Case): Found[] {
  const { comparisons, design, family, assigned, alpha } = judgedCase
  const used = usedM(judgedCase)
  if (used === null || design.due === null || design.kind === 'outcomes' || used >= design.due) return []
  const { wrong } = countCalls(comparisons)
  const changed = comparisons.filter(
    ({ called, significant }) => called !== null && significant !== null && called !== significant,
  )
  const effect =
    wrong > 0
      ? ` Adjusted for ${design.due}, these calls do not agree: ${listSome(changed.map(showDecision))}.`
      : ' No stated call depends on it.'
  const level =
    judgedCase.procedure === 'bonferroni'
      ? `, so that the level would be ${alpha} / ${design.due} = ${showLevel(alpha / design.due)}`
      : ''
  return [
    {
      severity: wrong > 0 ? 'major' : 'minor',
      family: family.id,
      reports: reportsOf(changed.length > 0 ? changed : comparisons),
      place: assigned?.view.lead.place ?? null,
      says: `The correction is for ${used} ${used === 1 ? 'test' : 'tests'}; ${design.why}${level}.${effect}`,
      asks: `Please correct for all ${design.due} comparisons, or list the ${used} that the correction was meant for and say when they were chosen.`,
      cites: ['sampl', 'dunn'],
    },
  ]
}

export const familyUndercounted: RuleRow = {
  rule: 'family-undercounted',
  says: 'the m used is smaller than the tests that the design implies',
  find,
}
