import { writeCsv, type CsvCell } from '../table/write-csv'
import type { Calculation } from './calculate'
import type { Entry } from './entry'

/**
 * A calculation as CSV, one entry a row in input order: its line, name and print, the interval of its p-value, and by
 * each procedure that could be computed the adjusted interval and whether it is significant (empty where the rounding
 * leaves it open), then the largest families that its significance survives (empty: any).
 */
export function writeCalculationCsv(entries: readonly Entry[], calculation: Calculation): string {
  const results = calculation.results.filter((one) => one.refused === null)
  const header = [
    'line',
    'name',
    'printed',
    'p_low',
    'p_high',
    ...results.flatMap(({ procedure }) => {
      const name = procedure.replaceAll('-', '_')
      return [`${name}_low`, `${name}_high`, `${name}_significant`]
    }),
    ...Object.keys(calculation.survives).flatMap((name) => [`${name}_holds_up_to`, `${name}_fails_above`]),
    'printed_adjusted',
    'weight',
  ]
  const rows = entries.map((entry, i): CsvCell[] => [
    entry.line,
    entry.name,
    entry.printed,
    calculation.raw[i]?.low ?? null,
    calculation.raw[i]?.high ?? null,
    ...results.flatMap(({ adjusted, significant }): CsvCell[] => [
      adjusted[i]?.low ?? null,
      adjusted[i]?.high ?? null,
      significant[i] ?? null,
    ]),
    ...Object.values(calculation.survives).flatMap((list): CsvCell[] => [
      finite(list[i]?.certain),
      finite(list[i]?.possible),
    ]),
    entry.adjusted?.printed ?? null,
    entry.weight,
  ])
  return writeCsv([header, ...rows])
}

const finite = (value: number | undefined): number | null =>
  value !== undefined && Number.isFinite(value) ? value : null
