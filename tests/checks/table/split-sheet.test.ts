import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import type { Merge, ReadTable } from '@/lib/checks/types'
import { makeLaidOut } from '@/tests/support/prose'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

function readLines(lines: string, merges: Merge[] = []) {
  const table = makeResultsTable(rowsOf(lines))
  return readTable({ ...table, sheets: table.sheets.map((sheet) => ({ ...sheet, merges })) })
}

const readTable = (table: ReadTable) => read(makeLaidOut([]), table, defaultHouseRules)

/** 'row, heading, pair or outcome: statistic, p scale call' of each report. */
function wordsOf({ reports, statistics }: ReturnType<typeof read>) {
  return reports.map((r) => {
    const s = statistics.find(({ id }) => id === r.statistic)
    const about = r.comparison?.join(' v ') ?? '-'
    const printed = s ? `${s.test}(${s.df.join(', ')}) = ${s.value}, ` : ''
    return `${r.place.row} ${r.heading}/${r.outcome ?? '-'}/${about}: ${printed}p ${r.relation} ${r.value} ${r.scale}`
  })
}

test('two tables side by side, of different length, share their row numbers', () => {
  const reading = readLines(`
    Attachment |  |  |  |  | Growth |  |
    Comparison | t | df | p |  | Comparison | t | p
    still vs slow | 2.10 | 22 | 0.047 |  | still vs slow | 1.20 | 0.243
    still vs fast | 3.05 | 22 | 0.006 |  | |  |
    slow vs fast | 0.90 | 22 | 0.378 |  |  |  | `)
  expect(wordsOf(reading)).toEqual([
    '1 Attachment/-/still v slow: t(22) = 2.1, p = 0.047 unknown',
    '2 Attachment/-/still v fast: t(22) = 3.05, p = 0.006 unknown',
    '3 Attachment/-/slow v fast: t(22) = 0.9, p = 0.378 unknown',
    '1 Growth/-/still v slow: t() = 1.2, p = 0.243 unknown',
  ])
})

test('tables side by side below a table of full width', () => {
  const reading = readLines(`
    Comparison | t | df | p | note
    A vs B | 2.10 | 22 | 0.047 | x
     |  |  |  |
    First |  |  | Second |
     |  |  |  |
    Pair | p |  | Pair | p
    A vs C | 0.01 |  | B vs D | 0.02
     |  |  |  |
    A vs E | 0.03 |  | B vs F | 0.04`)
  expect(wordsOf(reading)).toEqual([
    '1 /-/A v B: t(22) = 2.1, p = 0.047 unknown',
    '2 First/-/A v C: p = 0.01 unknown',
    '3 First/-/A v E: p = 0.03 unknown',
    '2 Second/-/B v D: p = 0.02 unknown',
    '3 Second/-/B v F: p = 0.04 unknown',
  ])
})

test('a blank column within one table parts nothing', () => {
  const reading = readLines(`
    Comparison | t | df |  | p | Decision
    A vs B | 2.10 | 22 |  | 0.047 | yes
    A vs C | 1.10 | 22 |  | 0.283 | no`)
  expect(wordsOf(reading)).toEqual([
    '1 /-/A v B: t(22) = 2.1, p = 0.047 unknown',
    '2 /-/A v C: t(22) = 1.1, p = 0.283 unknown',
  ])
})

test('heads over two rows: the upper one names a span, as merged or up to the next text', () => {
  const lines = `
    Table 2. Responses of two snails |  |  |  |  |  |
    Comparison | Grazing |  |  | Clinging |  |
     | t | df | p | t | df | p
    low vs mid | 2.10 | 22 | 0.047 | 0.50 | 20 | 0.623`
  const expected = [
    '1 Table 2. Responses of two snails/Grazing/low v mid: t(22) = 2.1, p = 0.047 unknown',
    '1 Table 2. Responses of two snails/Clinging/low v mid: t(20) = 0.5, p = 0.623 unknown',
  ]
  expect(wordsOf(readLines(lines))).toEqual(expected)
  const merges: Merge[] = [
    [0, 0, 1, 7],
    [1, 1, 1, 3],
    [1, 4, 1, 3],
    [1, 0, 2, 1],
  ]
  expect(wordsOf(readLines(lines, merges))).toEqual(expected)
})

test('an upper head that says how values were adjusted gives the columns below it their scale', () => {
  const reading = readLines(`
    Comparison | Unadjusted | Holm
     | p | p
    A vs B | 0.012 | 0.036`)
  expect(wordsOf(reading)).toEqual([
    '1 /Unadjusted/A v B: p = 0.012 raw',
    '1 /Holm/A v B: p = 0.036 adjusted',
  ])
})

test('a span over a part of the heads is no title', () => {
  const reading = readLines(`
     | Paired t tests |  |
    Pair | t | df | P
    A vs B | 2.10 | 22 | 0.047`)
  expect(wordsOf(reading)).toEqual(['1 /-/A v B: t(22) = 2.1, p = 0.047 unknown'])
})

test('a first row with signs for missing values is data and no second head', () => {
  const reading = readLines(`
    Term | Estimate | t | p
    Reference (ref) | – | – | –
    Shade | 1.2 | 2.2 | 0.031
    Tide | 0.2 | NA | NA`)
  expect(wordsOf(reading)).toEqual(['2 /Shade/-: t() = 2.2, p = 0.031 unknown'])
})

test('a column that is mostly missing is still a column of p-values', () => {
  const reading = readLines(`
    Comparison | p adj
    A vs B | NA
    A vs C | –
    A vs D | n.a.
    B vs C | 0.020`)
  expect(wordsOf(reading)).toEqual(['4 /-/B v C: p = 0.02 adjusted'])
})

test('a note below the rows speaks of its own table and of no other', () => {
  const reading = readLines(`
    Comparison | p
    A vs B | 0.012
    Note: p-values are Bonferroni-adjusted. |
     |
    Table 2 |
    Comparison | p
    C vs D | 0.020`)
  expect(wordsOf(reading)).toEqual(['1 /-/A v B: p = 0.012 adjusted', '2 Table 2/-/C v D: p = 0.02 unknown'])
})

test('a total row and lines of residuals give no p-value', () => {
  const reading = readLines(`
    Source | SS | df | MS | F | p
    Flow | 120.5 | 3 | 40.2 | 5.12 | 0.004
    Residuals | 345.1 | 44 | 7.84 |  |
    Total | 465.6 | 47 |  |  | `)
  expect(wordsOf(reading)).toEqual(['1 /Flow/-: F(3, 44) = 5.12, p = 0.004 unknown'])
})

test('a first group printed once counts for the rows below it', () => {
  const reading = readLines(`
    (I) diet | (J) diet | Sig.
    kelp | krill | 0.004
     | fish | 1.000
    krill | kelp | 0.004
     | fish | 0.300`)
  expect(reading.reports.map(({ comparison }) => comparison?.join(' v '))).toEqual([
    'kelp v krill',
    'kelp v fish',
    'krill v kelp',
    'krill v fish',
  ])
})

test('two degrees of freedom in one cell', () => {
  const reading = readLines(`
    Outcome | F | df | p
    grazing | 4.10 | 2, 38 | 0.024
    clinging | 0.41 | 2/38 | 0.667`)
  expect(reading.statistics.map(({ df }) => df)).toEqual([
    [2, 38],
    [2, 38],
  ])
})

test('marks in a column without a head are calls', () => {
  const reading = readLines(
    `
    contrast | t value | Pr(>|t|) |
    quiet - noise | 3.10 | 0.0031 | **
    quiet - rain | 0.40 | 0.6900 | `.replaceAll('Pr(>|t|)', 'Pr(>t)'),
  )
  expect(reading.reports.map(({ called }) => called)).toEqual(['significant', 'not significant'])
})
