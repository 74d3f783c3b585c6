import type { Tx } from '@/db/client'
import { claims, families, findings, reports, statistics } from '@/db/schema'
import type { Audit, Place } from '@/lib/checks/types'

/** SQLite takes 32,766 values a statement; the widest table has 22 columns. */
const rowsAStatement = 1000

/** The audit's items as rows, each with its key and its place in the order. */
export function writeAuditRows(tx: Tx, auditId: string, audit: Audit): void {
  const reportRows = audit.reports.map(({ id, place, comparison, ...report }, position) => ({
    ...report,
    ...flatten(place),
    ...{ auditId, key: id, position },
    comparisonA: comparison?.[0] ?? null,
    comparisonB: comparison?.[1] ?? null,
  }))
  const statisticRows = audit.statistics.map(({ id, place, ...statistic }, position) => ({
    ...statistic,
    ...flatten(place),
    ...{ auditId, key: id, position },
  }))
  const claimRows = audit.claims.map(({ id, place, ...claim }, position) => ({
    ...claim,
    ...flatten(place),
    ...{ auditId, key: id, position },
  }))
  const familyRows = audit.families.map(({ id, m, ...family }, position) => ({
    ...family,
    ...{ auditId, key: id, position },
    mPrinted: m.printed,
    mClaimed: m.claimed,
    mDue: m.due,
    mWhy: m.why,
  }))
  const findingRows = audit.findings.map(({ id, ...finding }, position) => ({
    ...finding,
    ...{ auditId, key: id, position },
  }))
  for (const rows of chunk(reportRows)) tx.insert(reports).values(rows).run()
  for (const rows of chunk(statisticRows)) tx.insert(statistics).values(rows).run()
  for (const rows of chunk(claimRows)) tx.insert(claims).values(rows).run()
  for (const rows of chunk(familyRows)) tx.insert(families).values(rows).run()
  for (const rows of chunk(findingRows)) tx.insert(findings).values(rows).run()
}

function flatten({ source, page, row, sheet, quote, boxes }: Place) {
  return { source, page, row, sheet, quote, boxes }
}

function chunk<T>(rows: readonly T[]): T[][] {
  const count = Math.ceil(rows.length / rowsAStatement)
  return Array.from({ length: count }, (_, i) => rows.slice(i * rowsAStatement, (i + 1) * rowsAStatement))
}
