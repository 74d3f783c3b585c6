import type { Decision, Report } from '@/lib/checks/types'
import { printedP, recomputedInterval } from './printed-p'

/** What a report is called in the picture and in lists: its comparison, else its place. */
export function nameOfReport(report: Report): string {
  if (report.comparison) return `${report.comparison[0]} and ${report.comparison[1]}`
  if (report.place.page !== null) return `“${report.place.quote}”, page ${report.place.page}`
  if (report.place.row !== null) return `row ${report.place.row} of the results table`
  return `“${report.place.quote}”`
}

/** The printed and the adjusted value and how the call stands, in one line. */
export function describeDot(report: Report, decision: Decision | null): string {
  const sign = report.relation === '=' ? '= ' : ''
  const printed = `p ${sign}${printedP(report)}`
  if (!decision) return `${printed}; not judged`
  return `${printed}, adjusted ${recomputedInterval(decision.adjusted, report.decimals)}; ${callWords(decision)}`
}

/** How a call compares with the recomputation. */
export function callWords({ called, significant }: Pick<Decision, 'called' | 'significant'>): string {
  if (called === null) return 'not called'
  const call = called ? 'called significant' : 'called not significant'
  if (significant === null) return `${call}, cannot be decided`
  if (called === significant) return `${call}, holds`
  return significant ? `${call}, is significant` : `${call}, is not`
}

/** As the trade abbreviates them, for narrow columns. */
export const shortCalls = { significant: 'sig.', 'not significant': 'n.s.' } as const
