import { expect, test } from 'vitest'
import { readResultsTable } from '@/lib/checks/table/results-table'
import type { ReadCell, ReadTable } from '@/lib/checks/types'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

const remarksOf = (table: ReadTable) =>
  readResultsTable(table, 0.05).remarks.map(({ place, says }) => [place?.row, place?.quote, says])

test('a pair of degrees of freedom that became a date is named with its cell and not guessed', () => {
  const table = makeResultsTable(
    rowsOf(`
    Outcome | F | df | p
    grazing | 4.10 | Feb-38 | 0.024
    clinging | 0.41 | 2, 57 | 0.667`),
  )
  expect(remarksOf(table)).toEqual([
    [
      1,
      'Feb-38',
      expect.stringContaining('The cell "Feb-38" in the column "df" of the results table is a date.'),
    ],
  ])
  const { statistics } = readResultsTable(table, 0.05)
  expect(statistics.map(({ df, pLow }) => [df, pLow === null])).toEqual([
    [[], true],
    [[2, 57], false],
  ])
})

test('pairs and short names that became dates are named once a column', () => {
  const table = makeResultsTable(
    rowsOf(`
    Comparison | p
    02. Jan | 0.024
    03. Jan | 0.300
    2-4 | 0.667`),
  )
  expect(remarksOf(table)).toEqual([[1, '02. Jan', expect.stringContaining('So are 1 more in this column.')]])
})

test('a date that the file stores as one is known however it is shown', () => {
  const table = makeResultsTable(
    rowsOf(`
    Outcome | t | df | p
    grazing | 4.10 | 38 | 0.024`),
  )
  const cell: ReadCell = { text: '2/38', value: null, date: true }
  table.sheets[0]?.rows[1]?.splice(2, 1, cell)
  expect(remarksOf(table)).toHaveLength(1)
})

test('a column of dates is one, and names that look like months are names', () => {
  const dates = makeResultsTable(
    rowsOf(`
    Sampled | t | p
    2024-03-02 | 4.10 | 0.024
    2024-04-02 | 0.41 | 0.667`),
  )
  const names = makeResultsTable(
    rowsOf(`
    Month | t | p
    May | 4.10 | 0.024
    June | 0.41 | 0.667`),
  )
  expect(remarksOf(dates)).toEqual([])
  expect(remarksOf(names)).toEqual([])
})
