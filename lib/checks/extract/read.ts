import type { HouseRules, LaidOut, Reading, ReadTable } from '../types'
import { findClaims, findGeneralAlpha } from './claims'
import { readConsole } from './read-console'
import { readProse } from './read-prose'
import { splitSentences } from './sentences'
import { collectNames } from './names'
import { settleScales } from './scale'
import { readPdfTables } from '../table/pdf-table'
import { readResultsTable } from '../table/results-table'

/**
 * Everything that the manuscript and its results table report: p-values, statistics, claims of correction and the
 * level of significance, each with its place. Reports come in the order text, tables of the manuscript, results
 * table; ids are r1…, s1…, c1…. Never throws on content; nothing is judged here.
 */
export function read(laidOut: LaidOut, table: ReadTable | null, rules: HouseRules): Reading {
  const sentences = splitSentences(laidOut.prose)
  const alpha = findGeneralAlpha(laidOut, sentences, rules.alpha)
  const claims = findClaims(laidOut, sentences)
  const controls = claims.flatMap(({ scope, sentence }) =>
    scope.control === null ? [] : [{ name: scope.control, sentence }],
  )
  const inTables = readPdfTables(laidOut, alpha.value, controls)
  const inResults = table
    ? readResultsTable(table, alpha.value)
    : { reports: [], statistics: [], remarks: [] }
  const names = collectNames([...inTables.reports, ...inResults.reports], laidOut.tables)
  const inText = readProse(
    laidOut,
    sentences,
    names,
    alpha.value,
    controls.map(({ name }) => name),
  )
  const atPrompts = { reports: readConsole(laidOut), statistics: [] }
  const parts = [inText, atPrompts, inTables, inResults]
  return number({
    alpha,
    claims,
    reports: settleScales(
      parts.flatMap(({ reports }) => reports),
      claims,
    ),
    statistics: parts.flatMap(({ statistics }) => statistics),
    tableRemarks: inResults.remarks,
  })
}

/** Gives the final ids; until here statistic and report are tied by provisional ones. */
function number(reading: Reading): Reading {
  const reportIds = new Map(reading.reports.map(({ id }, i) => [id, `r${i + 1}`] as const))
  const statisticIds = new Map(reading.statistics.map(({ id }, i) => [id, `s${i + 1}`] as const))
  return {
    ...reading,
    reports: reading.reports.map((report) => ({
      ...report,
      id: reportIds.get(report.id) ?? report.id,
      statistic: report.statistic === null ? null : (statisticIds.get(report.statistic) ?? null),
    })),
    statistics: reading.statistics.map((statistic) => ({
      ...statistic,
      id: statisticIds.get(statistic.id) ?? statistic.id,
      report: statistic.report === null ? null : (reportIds.get(statistic.report) ?? null),
    })),
  }
}
