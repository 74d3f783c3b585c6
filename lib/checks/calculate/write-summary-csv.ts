import type { Summary } from '../summary/summarize'
import { writeCsv, type CsvCell } from '../table/write-csv'

/**
 * The comparisons of a summary as CSV, one a row: the difference (second less first), its pooled and Welch tests, and
 * for each procedure the adjusted p-value, its range over the rounding of the print and the joint confidence limits.
 */
export function writeSummaryCsv({ comparisons }: Summary): string {
  const procedures = comparisons[0]?.adjusted.map((one) => one.procedure) ?? []
  const header = [
    'first',
    'second',
    'difference',
    ...['pooled', 'welch'].flatMap((test) =>
      ['se', 't', 'df', 'p', 'p_low', 'p_high'].map((part) => `${test}_${part}`),
    ),
    ...procedures.flatMap((procedure) =>
      ['p', 'p_low', 'p_high', 'limit_low', 'limit_high'].map(
        (part) => `${procedure.replaceAll('-', '_')}_${part}`,
      ),
    ),
  ]
  const rows = comparisons.map((one): CsvCell[] => [
    one.first,
    one.second,
    one.difference,
    ...(
      [
        [one.pooled, one.bounds?.pooled.p],
        [one.welch, one.bounds?.welch?.p],
      ] as const
    ).flatMap(([test, bounds]): CsvCell[] => [
      test?.se ?? null,
      test?.t ?? null,
      test?.df ?? null,
      test?.p ?? null,
      bounds?.low ?? null,
      bounds?.high ?? null,
    ]),
    ...one.adjusted.flatMap(({ procedure, p, interval }): CsvCell[] => {
      const bounds = one.bounds?.adjusted.find((each) => each.procedure === procedure)?.p
      return [p, bounds?.low ?? null, bounds?.high ?? null, interval?.low ?? null, interval?.high ?? null]
    }),
  ])
  return writeCsv([header, ...rows])
}
