import type { Bench, Case, Judged } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showLevel, showReport } from '../wording'

/** Ordinary rounding of a quotient (0.0167 for 0.05/3, 0.013 for 0.05/4) stays within this. */
const ordinary = 0.05

/** Major where a p lies between the quotient and the printed level and is called significant, else minor. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

function inFamily({ assigned, alpha, comparisons, family, design }: Case): Found[] {
  const view = assigned?.view
  const threshold = view?.threshold ?? null
  const m = view?.m ?? design.due
  if (!view || threshold === null || m === null || m < 2 || threshold >= alpha * 0.999) return []
  const exact = alpha / m
  const between = comparisons.filter(
    ({ raw, called }) => called === true && raw !== null && raw.low > exact && raw.high <= threshold,
  )
  const excess = threshold / exact - 1
  if (excess <= 1e-9 || (excess <= ordinary && between.length === 0)) return []
  // a level far above the quotient is no rounding; another number of tests is behind it
  if (excess > 0.6) return []
  const effect =
    between.length > 0
      ? ` Between the two ${between.length === 1 ? 'lies' : 'lie'} ${listSome(between.map(showRaw))}.`
      : ''
  return [
    {
      severity: between.length > 0 ? 'major' : 'minor',
      family: family.id,
      reports: reportsOf(between),
      place: view.lead.place,
      says: `The level is given as ${showLevel(threshold)}; ${alpha} / ${m} is ${showLevel(exact)}.${effect}`,
      asks: `Please confirm which level was used, and hold the p-values against ${showLevel(exact)} or against a level rounded down from it.`,
      cites: ['sampl'],
    },
  ]
}

/** "16 °C – 20 °C (p = .0092)" */
function showRaw(judged: Judged): string {
  const lead = leadOf(judged)
  return lead ? `${judged.label} (${showReport(lead)})` : judged.label
}

export const thresholdRoundedUp: RuleRow = {
  rule: 'threshold-rounded-up',
  says: 'the printed threshold is above alpha / m',
  find,
}
