import { read } from './extract/read'
import { judge } from './families/judge'
import { layOut } from './text/lay-out'
import type { Audit, HouseRules, ReadDocument, Reading, ReadReport, ReadTable, Report } from './types'

/** Version of the engine; raised whenever the same input could give another answer. */
export const ENGINE = '0.2.0'

/** Stages of an audit in their order, as the person who waits sees them. */
export const STAGES = ['opening', 'reading', 'laying out', 'extracting', 'judging', 'keeping'] as const
export type Stage = (typeof STAGES)[number]

/**
 * The whole audit of a manuscript and, where one is given, its results table. Pure: same input and engine
 * version give byte-identical output. Never throws on a manuscript's content.
 */
export function audit(
  document: ReadDocument,
  table: ReadTable | null,
  rules: HouseRules,
  onStage: (stage: Stage) => void = () => undefined,
): Audit {
  onStage('laying out')
  const laidOut = layOut(document)
  onStage('extracting')
  const reading = read(laidOut, table, rules)
  onStage('judging')
  const { families, findings, called } = judge(reading, laidOut, rules)
  // comparisons that only the results file holds are no members, and belong to the family all the same
  const familyOf = new Map(
    families.flatMap(({ id, members, decisions }) =>
      [...decisions.map(({ report }) => report), ...members].map((report) => [report, id] as const),
    ),
  )
  return {
    engine: ENGINE,
    document: { pages: document.pages.length, sha256: document.sha256, title: document.title },
    table: table ? { file: table.file, rows: countRows(table), sha256: table.sha256 } : null,
    alpha: reading.alpha,
    reports: reading.reports.map((report) => ({
      ...toReport(report),
      called: called.get(report.id) ?? report.called,
      family: familyOf.get(report.id) ?? null,
    })),
    statistics: reading.statistics.map(({ id, place, test, df, value, decimals, pLow, pHigh, report }) => ({
      id,
      place,
      test,
      df,
      value,
      decimals,
      pLow,
      pHigh,
      report,
    })),
    claims: toClaims(reading),
    families,
    findings,
  }
}

function toReport(r: ReadReport): Report {
  const { id, place, relation, value, decimals, low, high, scale, statistic, comparison, called, family } = r
  return { id, place, relation, value, decimals, low, high, scale, statistic, comparison, called, family }
}

function toClaims(reading: Reading): Audit['claims'] {
  return reading.claims.map(({ id, place, procedure, m, alpha, threshold, groups }) => ({
    id,
    place,
    procedure,
    m,
    alpha,
    threshold,
    groups,
  }))
}

/** Data rows: rows that hold anything, less one header row a sheet. */
function countRows(table: ReadTable): number {
  return table.sheets
    .map((sheet) => sheet.rows.filter((row) => row.some((cell) => cell.text.trim() !== '')).length)
    .reduce((sum, rows) => sum + Math.max(0, rows - 1), 0)
}
