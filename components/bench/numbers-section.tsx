'use client'

import { useMemo, useState } from 'react'
import type { Report, Statistic } from '@/lib/checks/types'
import { SOURCES, type Source } from '@/lib/checks/vocabulary'
import { shortCalls } from '../charts/describe-dot'
import { printedP, recomputedInterval } from '../charts/printed-p'
import { StatisticText } from '../families/statistic-text'
import { OutcomeShape, outcomeWords } from '../shell/outcome-mark'
import { Button } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { Field, Input, Select } from '../ui/field'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { isSame, outcomeOfReport } from './audit-index'
import { useBench } from './bench-state'
import { PlaceLink } from './place-link'

const FIRST_ROWS = 100
const sourceWords: Record<Source, string> = {
  text: 'running text',
  'pdf-table': 'tables of the manuscript',
  'results-table': 'results table',
}

/** Every number that was read, filtered by words and by where it stands. */
export function NumbersSection() {
  const { index } = useBench()
  const { reports, statistics } = index.audit
  const [words, setWords] = useState('')
  const [source, setSource] = useState<Source | ''>('')
  const shownReports = useMemo(
    () => reports.filter((report) => fits(report, wordsOfReport(report), words, source)),
    [reports, words, source],
  )
  const shownStatistics = useMemo(
    () => statistics.filter((statistic) => fits(statistic, '', words, source)),
    [statistics, words, source],
  )
  if (reports.length + statistics.length === 0) {
    return <EmptyState>No p-value and no test statistic was read in this manuscript.</EmptyState>
  }
  return (
    <div className="flex flex-col gap-6">
      <div className="flex flex-wrap gap-3 print:hidden">
        <Field label="Contains" className="min-w-44 flex-1">
          <Input type="search" value={words} onChange={(event) => setWords(event.target.value)} />
        </Field>
        <Field label="Stands in">
          <Select
            value={source}
            empty="anywhere"
            options={SOURCES.map((value) => ({ value, label: sourceWords[value] }))}
            onChange={(event) => setSource(SOURCES.find((one) => one === event.target.value) ?? '')}
          />
        </Field>
      </div>
      <ReportsTable reports={shownReports} total={reports.length} />
      <StatisticsTable statistics={shownStatistics} total={statistics.length} />
    </div>
  )
}

function wordsOfReport(report: Report): string {
  return [report.comparison?.join(' ') ?? '', report.scale, report.called ?? ''].join(' ')
}

function fits(item: Report | Statistic, more: string, words: string, source: Source | ''): boolean {
  if (source && item.place.source !== source) return false
  const text = `${item.place.quote} ${more}`.toLowerCase()
  return words
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word))
}

function ReportsTable({ reports, total }: { reports: readonly Report[]; total: number }) {
  const { index, chosen, show } = useBench()
  const [most, setMost] = useState(FIRST_ROWS)
  return (
    <section aria-labelledby="reports-title">
      <h3 id="reports-title" className="text-base font-semibold">
        Reported <i>p</i>-values
      </h3>
      <Count shown={reports.length} total={total} />
      <div className="overflow-x-auto">
        <Table caption="Reported p-values">
          <Thead>
            <tr role="row">
              <Th>Place</Th>
              <Th>As printed</Th>
              <Th number>
                <i>p</i>
              </Th>
              <Th>Scale</Th>
              <Th>Comparison</Th>
              <Th>Called</Th>
              <Th>Family</Th>
            </tr>
          </Thead>
          <Tbody>
            {reports.slice(0, most).map((report) => {
              const target = { kind: 'report' as const, id: report.id }
              const outcome = outcomeOfReport(index, report.id)
              return (
                <Tr
                  key={report.id}
                  opens
                  selected={isSame(chosen, target)}
                  data-target={`number-report-${report.id}`}
                >
                  <Td className="whitespace-nowrap">
                    <span className="inline-flex items-center gap-1.5">
                      {outcome ? (
                        <>
                          <OutcomeShape outcome={outcome} />
                          <span className="sr-only">{outcomeWords[outcome]}</span>
                        </>
                      ) : (
                        <span className="size-3.5" />
                      )}
                      <PlaceLink
                        row
                        place={report.place}
                        what={report.place.quote}
                        onShow={() => show(target)}
                      />
                    </span>
                  </Td>
                  <RowTh className="max-w-56 truncate font-mono text-xs font-normal">
                    {report.place.quote}
                  </RowTh>
                  <Td number>{printedP(report)}</Td>
                  <Td>{report.scale}</Td>
                  <Td className="max-w-44 truncate">{report.comparison?.join(' – ') ?? '–'}</Td>
                  <Td className="whitespace-nowrap">{report.called ? shortCalls[report.called] : '–'}</Td>
                  <Td className="max-w-48 truncate">
                    {(report.family && index.families.get(report.family)?.label) || '–'}
                  </Td>
                </Tr>
              )
            })}
          </Tbody>
        </Table>
      </div>
      <More shown={most} total={reports.length} onMore={() => setMost(most + 500)} />
    </section>
  )
}

function StatisticsTable({ statistics, total }: { statistics: readonly Statistic[]; total: number }) {
  const { index, chosen, show } = useBench()
  const [most, setMost] = useState(FIRST_ROWS)
  return (
    <section aria-labelledby="statistics-title">
      <h3 id="statistics-title" className="text-base font-semibold">
        Test statistics
      </h3>
      <Count shown={statistics.length} total={total} />
      <div className="overflow-x-auto">
        <Table caption="Test statistics">
          <Thead>
            <tr role="row">
              <Th>Place</Th>
              <Th>As printed</Th>
              <Th>Statistic</Th>
              <Th number>
                <i>p</i> that follows
              </Th>
              <Th number>
                Printed <i>p</i>
              </Th>
            </tr>
          </Thead>
          <Tbody>
            {statistics.slice(0, most).map((statistic) => {
              const target = { kind: 'statistic' as const, id: statistic.id }
              const report = statistic.report ? index.reports.get(statistic.report) : undefined
              const follows =
                statistic.pLow === null || statistic.pHigh === null
                  ? '–'
                  : recomputedInterval([statistic.pLow, statistic.pHigh], report?.decimals ?? 3)
              return (
                <Tr
                  key={statistic.id}
                  opens
                  selected={isSame(chosen, target)}
                  data-target={`number-statistic-${statistic.id}`}
                >
                  <Td>
                    <PlaceLink
                      row
                      place={statistic.place}
                      what={statistic.place.quote}
                      onShow={() => show(target)}
                    />
                  </Td>
                  <RowTh className="max-w-56 truncate font-mono text-xs font-normal">
                    {statistic.place.quote}
                  </RowTh>
                  <Td>
                    <StatisticText statistic={statistic} />
                  </Td>
                  <Td number>{follows}</Td>
                  <Td number>{report ? printedP(report) : '–'}</Td>
                </Tr>
              )
            })}
          </Tbody>
        </Table>
      </div>
      <More shown={most} total={statistics.length} onMore={() => setMost(most + 500)} />
    </section>
  )
}

function Count({ shown, total }: { shown: number; total: number }) {
  return (
    <p className="pb-1 text-ink-soft" aria-live="polite">
      {shown === total ? `${total} in all` : `${shown} of ${total}`}
    </p>
  )
}

function More({ shown, total, onMore }: { shown: number; total: number; onMore: () => void }) {
  if (shown >= total) return null
  return (
    <>
      <Button size="small" variant="quiet" className="mt-1 print:hidden" onClick={onMore}>
        Show {Math.min(500, total - shown)} more
      </Button>
      <p className="hidden print:block">{total - shown} more rows are in the CSV of this audit.</p>
    </>
  )
}
