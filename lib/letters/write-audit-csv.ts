import { writeCsv, type CsvCell } from '@/lib/checks/table/write-csv'
import type { Audit, Report } from '@/lib/checks/types'

/** An audit's reports as CSV (RFC 4180), one a row, each with its family, the decision on it and its statistic. */
export function writeAuditCsv(audit: Audit): string {
  const rows = audit.reports.map((report) => Object.values(toRow(audit, report)))
  const header = audit.reports[0] ? Object.keys(toRow(audit, audit.reports[0])) : noReports
  return writeCsv([header, ...rows])
}

const noReports = ['report']

function toRow(audit: Audit, report: Report): Record<string, CsvCell> {
  const family = audit.families.find((one) => one.id === report.family)
  const decision = family?.decisions.find((one) => one.report === report.id)
  const claim = audit.claims.find((one) => one.id === family?.claim)
  const statistic = audit.statistics.find((one) => one.id === report.statistic)
  return {
    report: report.id,
    source: report.place.source,
    page: report.place.page,
    row: report.place.row,
    sheet: report.place.sheet,
    quote: report.place.quote,
    relation: report.relation,
    value: report.value,
    decimals: report.decimals,
    low: report.low,
    high: report.high,
    scale: report.scale,
    called: report.called,
    comparison_a: report.comparison?.[0] ?? null,
    comparison_b: report.comparison?.[1] ?? null,
    family: report.family,
    family_label: family?.label ?? null,
    procedure: claim?.procedure ?? null,
    m_printed: family?.m.printed ?? null,
    m_claimed: family?.m.claimed ?? null,
    m_due: family?.m.due ?? null,
    family_outcome: family?.outcome ?? null,
    adjusted_low: decision?.adjusted[0] ?? null,
    adjusted_high: decision?.adjusted[1] ?? null,
    significant: decision?.significant ?? null,
    survives_up_to: decision?.survivesUpTo ?? null,
    test: statistic?.test ?? null,
    df: statistic ? statistic.df.join(' ') : null,
    statistic: statistic?.value ?? null,
    p_low: statistic?.pLow ?? null,
    p_high: statistic?.pHigh ?? null,
  }
}
