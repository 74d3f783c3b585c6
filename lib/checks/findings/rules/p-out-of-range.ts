import type { Bench } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { isAboveOne } from './adjusted-above-one'
import { showReport } from '../wording'

/** Minor. The zeros of a results file are a matter of its format and stay silent. */
function find(bench: Bench): Found[] {
  const above = new Set(bench.cases.flatMap((judged) => isAboveOne(judged).map(({ id }) => id)))
  return bench.reading.reports
    .filter(({ place, markOnly }) => place.source !== 'results-table' && !markOnly)
    .filter(({ value, relation, id }) => {
      const zero = value === 0 && relation !== '>' && relation !== '>='
      return (zero || value < 0 || value > 1) && !above.has(id)
    })
    .map((report) => ({
      severity: 'minor',
      family: null,
      reports: [report.id],
      place: report.place,
      says: `A p-value is printed as ${showReport(report)}; p-values lie between 0 and 1 and are never exactly 0.`,
      asks:
        report.value === 0
          ? `Please give the value as below the smallest number that can be shown, such as p < ${smallest(report.decimals)}.`
          : 'Please check this p-value.',
      cites: ['apa-7'],
    }))
}

function smallest(decimals: number): string {
  return (10 ** -Math.max(3, Math.min(decimals, 12))).toFixed(Math.max(3, Math.min(decimals, 12)))
}

export const pOutOfRange: RuleRow = {
  rule: 'p-out-of-range',
  says: 'p above 1, below 0, or printed as 0',
  find,
}
