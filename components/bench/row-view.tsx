'use client'

import type { Place } from '@/lib/checks/types'
import { printedP } from '../charts/printed-p'
import { StatisticText } from '../families/statistic-text'
import { useBench } from './bench-state'

/** The row of the results table that a number comes from, as far as the audit read it. */
export function RowView({ place, words }: { place: Place; words: string }) {
  const { index } = useBench()
  const file = index.audit.table?.file
  const here = (other: Place) =>
    other.source === 'results-table' && other.row === place.row && other.sheet === place.sheet
  const reports = index.audit.reports.filter((report) => here(report.place))
  const statistics = index.audit.statistics.filter((statistic) => here(statistic.place))
  return (
    <dl
      className="mt-1.5 flex w-fit max-w-full flex-wrap border border-rule bg-paper text-xs"
      aria-label={`Results table, ${words}`}
    >
      <RowCell name={file ?? 'results table'} value={words} />
      {reports[0]?.comparison && <RowCell name="comparison" value={reports[0].comparison.join(' – ')} />}
      {statistics.map((statistic) => (
        <RowCell key={statistic.id} name="statistic" value={<StatisticText statistic={statistic} />} />
      ))}
      {reports.map((report) => (
        <RowCell
          key={report.id}
          name={report.scale === 'adjusted' ? 'adjusted p' : 'p'}
          value={printedP(report)}
        />
      ))}
      {reports.length + statistics.length === 0 && place.quote && (
        <RowCell name="as it stands" value={place.quote} />
      )}
    </dl>
  )
}

function RowCell({ name, value }: { name: string; value: React.ReactNode }) {
  return (
    <div className="border-r border-rule px-2 py-1 last:border-r-0">
      <dt className="text-ink-soft">{name}</dt>
      <dd className="tabular">{value}</dd>
    </div>
  )
}
