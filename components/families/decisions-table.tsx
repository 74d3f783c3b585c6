'use client'

import { useState } from 'react'
import type { Decision, Family, Report } from '@/lib/checks/types'
import type { Outcome } from '@/lib/checks/vocabulary'
import { nameOfReport, shortCalls } from '../charts/describe-dot'
import { outcomeOfDecision } from '../charts/outcome-of-decision'
import { printedP, recomputedInterval } from '../charts/printed-p'
import { isSame } from '../bench/audit-index'
import { useBench } from '../bench/bench-state'
import { PlaceLink } from '../bench/place-link'
import { OutcomeShape } from '../shell/outcome-mark'
import { Button } from '../ui/button'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { StatisticText } from './statistic-text'

const FIRST_ROWS = 30
/** Rows that are drawn for the printer though the screen hides them. */
const PRINTED_ROWS = 500

const outcomeTones: Record<Outcome, string> = {
  holds: 'text-holds',
  fails: 'font-semibold text-fails',
  undecidable: 'text-undecidable',
  uncorrected: 'text-uncorrected',
}

/** Every call of a family beside its recomputation. */
export function DecisionsTable({ family }: { family: Family }) {
  const { index, chosen } = useBench()
  const [all, setAll] = useState(false)
  const rows = family.decisions
    .map((decision) => ({ decision, report: index.reports.get(decision.report) }))
    .filter((row): row is { decision: Decision; report: Report } => row.report !== undefined)
  const drawn = all ? rows : rows.slice(0, PRINTED_ROWS)
  if (rows.length === 0) return <p className="text-ink-soft">No member of this family could be judged.</p>
  return (
    <div className="overflow-x-auto">
      <Table caption={`Calls of ${family.label} and their recomputation`}>
        <Thead>
          <tr role="row">
            <Th>Place</Th>
            <Th>Comparison</Th>
            <Th number>
              Printed <i>p</i>
            </Th>
            <Th>Statistic</Th>
            <Th number>Adjusted</Th>
            <Th>Called</Th>
            <Th>Stands</Th>
            <Th number>
              Up to <i>m</i>
            </Th>
          </tr>
        </Thead>
        <Tbody>
          {drawn.map(({ decision, report }, at) => (
            <DecisionRow
              key={report.id}
              decision={decision}
              report={report}
              family={family}
              printOnly={!all && at >= FIRST_ROWS && chosen?.id !== report.id}
            />
          ))}
        </Tbody>
      </Table>
      {!all && rows.length > FIRST_ROWS && (
        <Button size="small" variant="quiet" className="mt-1 print:hidden" onClick={() => setAll(true)}>
          Show all {rows.length}
        </Button>
      )}
    </div>
  )
}

type DecisionRowProps = { decision: Decision; report: Report; family: Family; printOnly: boolean }

function DecisionRow({ decision, report, family, printOnly }: DecisionRowProps) {
  const { index, chosen, show } = useBench()
  const target = { kind: 'report' as const, id: report.id }
  const outcome = outcomeOfDecision(decision, family)
  const statistic = report.statistic ? index.statistics.get(report.statistic) : undefined
  return (
    <Tr
      opens
      selected={isSame(chosen, target)}
      data-target={`report-${report.id}`}
      className={printOnly ? 'hidden print:table-row' : undefined}
    >
      <Td className="whitespace-nowrap">
        <span className="inline-flex items-center gap-1.5">
          {outcome ? <OutcomeShape outcome={outcome} /> : <span className="size-3.5" />}
          <PlaceLink row place={report.place} what={nameOfReport(report)} onShow={() => show(target)} />
        </span>
      </Td>
      <RowTh className="max-w-52 truncate font-normal">
        {report.comparison?.join(' – ') ?? <q className="font-mono text-xs">{report.place.quote}</q>}
      </RowTh>
      <Td number>{printedP(report)}</Td>
      <Td className="whitespace-nowrap">{statistic ? <StatisticText statistic={statistic} /> : '–'}</Td>
      <Td number>{recomputedInterval(decision.adjusted, report.decimals)}</Td>
      <Td className="whitespace-nowrap">{report.called ? shortCalls[report.called] : 'not stated'}</Td>
      <Td className={outcome ? outcomeTones[outcome] : undefined}>{outcome ?? '–'}</Td>
      <Td number>{decision.survivesUpTo ?? '–'}</Td>
    </Tr>
  )
}
