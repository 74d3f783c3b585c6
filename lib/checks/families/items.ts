import type { LaidOut, PdfTable, ReadReport, ReadStatistic, Reading } from '../types'
import type { Item } from './comparison'
import { canonicalNames, normaliseName } from './names'
import { findPrintedNames } from './printed-names'

/** Sections whose p-values are never results of this manuscript. */
const foreign = new Set(['introduction', 'references'])

/**
 * Why a reported p-value is no member of a family, in words that follow "left out:"; null where it may be one.
 * Omnibus tests, baseline and assumption checks and interactions are not what a correction counts
 * (an omnibus F or chi-square has more than one numerator degree of freedom).
 */
export function findReasonApart(report: ReadReport, statistic: ReadStatistic | null): string | null {
  if (foreign.has(report.section)) return 'quoted from elsewhere'
  const [df] = statistic?.df ?? []
  const several = df !== undefined && df >= 1.01
  if (report.role === 'omnibus' || (several && (statistic?.test === 'F' || statistic?.test === 'chi2')))
    return 'overall tests'
  if (report.role === 'baseline') return 'checks of the initial values'
  if (report.role === 'assumption') return 'checks of assumptions'
  if (report.role === 'interaction') return 'interactions'
  return null
}

/** Reports that can be members of a family, with their statistic and with names brought to one form. */
export function listItems(reading: Reading, { tables, prose }: LaidOut): Item[] {
  const statisticOf = new Map(reading.statistics.map((statistic) => [statistic.id, statistic] as const))
  const members = reading.reports
    .map((report) => ({ report, statistic: statisticOf.get(report.statistic ?? '') ?? null }))
    .filter(({ report, statistic }) => findReasonApart(report, statistic) === null)
  const pairsOf = (list: typeof members) =>
    list.flatMap(({ report }) => (report.comparison ? [report.comparison] : []))
  const canon = canonicalNames(
    pairsOf(members),
    pairsOf(members.filter(({ report }) => report.place.source !== 'text')),
  )
  const names = members.flatMap(({ report }) => [...(report.comparison ?? []), report.outcome ?? ''])
  const print = findPrintedNames(
    names.filter((name) => name !== ''),
    prose.text,
  )
  return members.map(({ report, statistic }) => {
    const pair = toPair(report.comparison, canon)
    const outcome = report.outcome === null ? null : normaliseName(report.outcome) || null
    return {
      report,
      statistic,
      pair,
      outcome,
      shown: {
        pair: pair ? [print(pair[0]), print(pair[1])] : null,
        outcome: outcome === null ? null : print(outcome),
      },
      block: toBlock(report, tables),
    }
  })
}

function toPair(comparison: [string, string] | null, canon: (name: string) => string) {
  if (!comparison) return null
  const [a, b] = [canon(comparison[0]), canon(comparison[1])]
  if (a === '' || b === '' || a === b) return null
  const pair: [string, string] = a < b ? [a, b] : [b, a]
  return pair
}

/** A table that goes on over the page is one place: it has the number again, or says that it continues. */
function tableName(at: number | null, tables: readonly PdfTable[]): string {
  const table = at === null ? undefined : tables[at]
  if (at === null || !table) return `at ${at}`
  if (table.number !== null) return table.number
  return /\bcont(?:inued|\.|'d)/i.test(table.caption) && at > 0 ? tableName(at - 1, tables) : `at ${at}`
}

function toBlock({ place, table, section, heading }: ReadReport, tables: readonly PdfTable[]): string {
  if (place.source === 'pdf-table') return `table ${tableName(table, tables)}`
  if (place.source === 'results-table') return `sheet ${place.sheet ?? ''} ${heading}`
  return section === 'results' || section === 'other' ? `text ${section} ${heading}` : `text ${section}`
}
