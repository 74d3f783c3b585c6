import type { Bench, Case } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { listSome, leadOf, reportsOf, showLevel, showReport } from '../wording'

/** Minor: the double correction is conservative; a call that it changes is found as `call-understated`. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

function inFamily({ assigned, alpha, comparisons, series, family }: Case): Found[] {
  const threshold = assigned?.view.threshold ?? null
  if (!assigned || threshold === null || threshold > alpha * 0.98) return []
  const printed = series.filter(({ source }) => source !== 'results-table')
  if (
    !printed.some(({ is, presented }) => is === 'adjusted' || (presented === 'adjusted' && is === 'unknown'))
  )
    return []
  const between = comparisons.filter(
    ({ printed: value, called }) =>
      called === false && value !== null && value.low >= threshold && value.high <= alpha,
  )
  if (between.length === 0) return []
  const values = between.flatMap((comparison) => {
    const lead = leadOf(comparison)
    return lead ? [`${comparison.label} (${showReport(lead)})`] : []
  })
  return [
    {
      severity: 'minor',
      family: family.id,
      reports: reportsOf(between),
      place: assigned.view.lead.place,
      says: `The p-values are already adjusted, and they are held against the lowered level ${showLevel(threshold)} too. These lie between ${showLevel(threshold)} and ${alpha} and are called not significant: ${listSome(values)}.`,
      asks: `Please hold adjusted p-values against ${alpha}, or give unadjusted ones with the lowered level.`,
      cites: ['sampl'],
    },
  ]
}

export const correctedTwice: RuleRow = {
  rule: 'corrected-twice',
  says: 'adjusted values are held against a lowered threshold too',
  find,
}
