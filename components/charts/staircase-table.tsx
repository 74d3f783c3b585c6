import type { Claim, Family, Report } from '@/lib/checks/types'
import { callWords, nameOfReport } from './describe-dot'
import { printedP, recomputedInterval } from './printed-p'
import type { Interval } from './raw-intervals'
import { steppedFor, thresholdOf } from './thresholds'

/** The content of the staircase for those who do not see the picture: ranks, values, thresholds, calls. */
export function StaircaseTable(props: {
  family: Family
  reports: readonly Report[]
  claim: Claim | null
  alpha: number
  raw?: ReadonlyMap<string, Interval>
}) {
  const { family, claim, alpha } = props
  const stepped = steppedFor(claim?.procedure ?? null)
  const m = Math.max(family.m.due ?? family.m.printed, 1)
  const byId = new Map(props.reports.map((report) => [report.id, report]))
  const rows = family.decisions
    .map((decision) => ({
      decision,
      report: byId.get(decision.report),
      raw: props.raw?.get(decision.report) ?? null,
    }))
    .filter((row): row is typeof row & { report: Report } => row.report !== undefined)
    .sort((a, b) => lowOf(a) - lowOf(b))
  return (
    <table className="w-full text-left text-xs tabular-nums">
      <caption className="pb-1 text-left">
        {`The p-values of ${family.label} by rank, with the threshold at m = ${m} and α = ${alpha}`}
      </caption>
      <thead>
        <tr className="border-b border-rule">
          <th scope="col">Rank</th>
          <th scope="col">Comparison</th>
          <th scope="col">Printed</th>
          <th scope="col">Unadjusted</th>
          <th scope="col">Threshold</th>
          <th scope="col">Adjusted</th>
          <th scope="col">Call</th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ decision, report, raw }, index) => (
          <tr key={report.id} className="border-b border-rule">
            <td>{index + 1}</td>
            <th scope="row" className="font-normal">
              {nameOfReport(report)}
            </th>
            <td>{printedP(report)}</td>
            <td>{raw ? recomputedInterval([raw.low, raw.high], report.decimals) : '–'}</td>
            <td>
              {(report.scale === 'adjusted' && !raw) || !stepped
                ? alpha
                : Number(thresholdOf[stepped](Math.min(index + 1, m), m, alpha).toPrecision(3))}
            </td>
            <td>{recomputedInterval(decision.adjusted, report.decimals)}</td>
            <td>{callWords(decision)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

function lowOf({ report, raw }: { report: Report; raw: Interval | null }): number {
  return report.scale === 'raw' || raw === null ? report.low : raw.low
}
