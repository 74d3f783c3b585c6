import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut } from '@/tests/support/prose'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

const readRows = (...args: Parameters<typeof makeResultsTable>) =>
  read(makeLaidOut([]), makeResultsTable(...args), defaultHouseRules)

/** 'pair or outcome: relation value scale call' of each report. */
const wordsOf = ({ reports }: ReturnType<typeof read>) =>
  reports.map(
    (r) =>
      `${r.comparison?.join(' v ') ?? r.outcome ?? '-'}: ${r.relation} ${r.value}/${r.decimals} ${r.scale} ${r.called ?? '-'}`,
  )

test('one row a comparison, raw and adjusted values beside each other', () => {
  const reading = readRows(
    rowsOf(`
      Comparison | estimate | SE | df | t | p | adj. p
      Reef vs Bank | -31.73 | 12.91 | 28 | -2.457 | 0.02045 | 0.1227
      Reef vs Creek | -39.52 | 12.91 | 28 | -3.061 | 0.00483 | 0.0290`),
  )
  expect(wordsOf(reading)).toEqual([
    'Reef v Bank: = 0.02045/5 raw -',
    'Reef v Bank: = 0.1227/4 adjusted -',
    'Reef v Creek: = 0.00483/5 raw -',
    'Reef v Creek: = 0.029/4 adjusted -',
  ])
  expect(reading.statistics.map(({ test: name, df, value }) => [name, df, value])).toEqual([
    ['t', [28], -2.457],
    ['t', [28], -3.061],
  ])
  expect(reading.reports.map(({ place }) => place.row)).toEqual([1, 1, 2, 2])
  expect(reading.statistics[0]?.report).toBe(reading.reports[0]?.id)
})

test('title above the heads, decimal comma, German head for df', () => {
  const reading = readRows(
    rowsOf(`
      Trial 4 - pairwise comparisons |  |  |  |  |  |
      Group A | Group B | Diff. (t/ha) | SE | t | FG | P
      Arle | Bess | -0,48 | 0,406 | -1,19 | 20 | 0,2464
      Arle | Corv | -1,45 | 0,406 | -3,58 | 20 | 0,0019`),
  )
  expect(wordsOf(reading)).toEqual(['Arle v Bess: = 0.2464/4 unknown -', 'Arle v Corv: = 0.0019/4 unknown -'])
  expect(reading.statistics.map(({ df }) => df)).toEqual([[20], [20]])
})

test('blank rows within a table end nothing', () => {
  const reading = readRows(
    rowsOf(`
      contrast | t | df | p
      quiet - noise | -0.78 | 17 | 0.445
       |  |  |
      quiet - rain | -2.61 | 17 | 0.018`),
  )
  expect(wordsOf(reading)).toEqual([
    'quiet v noise: = 0.445/3 unknown -',
    'quiet v rain: = 0.018/3 unknown -',
  ])
  expect(reading.reports.map(({ place }) => place.row)).toEqual([1, 2])
})

test('several tables on a sheet, each under its title', () => {
  const reading = readRows(
    rowsOf(`
      Table S1. Firmness |  |  |  |
      Group A | Group B | t | df | P
      heat | acid | -1,19 | 27 | 0,2429
       |  |  |  |
      Table S2. Water retention |  |  |  |
      Group A | Group B | t | df | P
      heat | acid | 0,96 | 27 | 0,3432`),
  )
  expect(wordsOf(reading)).toEqual(['heat v acid: = 0.2429/4 unknown -', 'heat v acid: = 0.3432/4 unknown -'])
  expect(reading.reports.map(({ heading }) => heading)).toEqual([
    'Table S1. Firmness',
    'Table S2. Water retention',
  ])
})

test('several sheets carry their names', () => {
  const reading = readRows({
    comparisons: rowsOf(`
      pair | p_raw | p_bonf
      A10/B20 | 0.0035 | 0.0209`),
    descriptives: rowsOf(`
      Routine | N | Mean | Std. dev.
      Tape | 12 | 40.1 | 6.2`),
  })
  expect(wordsOf(reading)).toEqual(['A10 v B20: = 0.0035/4 raw -', 'A10 v B20: = 0.0209/4 adjusted -'])
  expect(reading.reports[0]?.place.sheet).toBe('comparisons')
})

test('bounds, asterisks on the value, not significant, percent and numbers as text', () => {
  const reading = readRows(
    rowsOf(`
      outcome | p
      weight | <0.001
      length | 0.032*
      width | n.s.
      colour | 3.2%
      depth | 2.72E-04
      age | 8.4 × 10-7
      * p < 0.05`),
  )
  expect(wordsOf(reading)).toEqual([
    'weight: < 0.001/3 unknown not significant',
    'length: = 0.032/3 unknown significant',
    'width: > 0.05/2 unknown not significant',
    'colour: = 0.032/3 unknown not significant',
    'depth: = 0.000272/6 unknown not significant',
    'age: = 8.4e-7/8 unknown not significant',
  ])
})

test('cells with asterisks alone take the bound of the legend', () => {
  const reading = readRows(
    rowsOf(`
      comparison | difference | significance
      A vs B | 3.1 | ***
      A vs C | 2.2 | *
      B vs C | 0.4 | n.s.
      * p < 0.05; ** p < 0.01; *** p < 0.001 |  |`),
  )
  expect(wordsOf(reading)).toEqual([
    'A v B: < 0.001/3 unknown significant',
    'A v C: < 0.05/2 unknown significant',
    'B v C: > 0.05/2 unknown not significant',
  ])
  expect(reading.reports.every(({ markOnly }) => markOnly)).toBe(true)
})

test('a column of calls', () => {
  const reading = readRows(
    rowsOf(`
      pair | p | significant
      A10/B20 | 0.556 | no
      A10/C30 | 0.008 | yes
      A10/D40 | <0.001 | yes`),
  )
  expect(wordsOf(reading)).toEqual([
    'A10 v B20: = 0.556/3 unknown not significant',
    'A10 v C30: = 0.008/3 unknown significant',
    'A10 v D40: < 0.001/3 unknown significant',
  ])
})

test('a column of marks beside the values', () => {
  const reading = readRows(
    rowsOf(`
      Comparison | t | df | p | Sig.
      splint vs cast | 2.96 | 52 | 0.005 | *
      splint vs tape | 0.70 | 52 | 0.485 | n.s.
       |  |  |  |
      Secondary endpoint | t | df | p | Sig.
      pain on loading | -2.16 | 26 | 0.040 | *`),
  )
  expect(wordsOf(reading)).toEqual([
    'splint v cast: = 0.005/3 unknown significant',
    'splint v tape: = 0.485/3 unknown not significant',
    'pain on loading: = 0.04/2 unknown significant'.replace('0.04/2', '0.04/3'),
  ])
})

test('the text shown counts, not the stored digits', () => {
  const reading = readRows([
    ['Comparison', 'p'],
    ['A vs B', { text: '0.020', value: 0.0204512 }],
  ])
  expect(wordsOf(reading)).toEqual(['A v B: = 0.02/3 unknown -'])
})

test('correlations take their df from n', () => {
  const reading = readRows(
    rowsOf(`
      behaviour | r | n | P
      grooming | 0.57 | 36 | <0.001
      fanning | -0.24 | 36 | 0.158`),
  )
  expect(reading.statistics.map(({ test: name, df, value }) => [name, df, value])).toEqual([
    ['r', [34], 0.57],
    ['r', [34], -0.24],
  ])
  expect(wordsOf(reading)).toEqual(['grooming: < 0.001/3 unknown -', 'fanning: = 0.158/3 unknown -'])
})

test('genes with raw values and q', () => {
  const reading = readRows(
    rowsOf(`
      gene | log2FC | t | df | P | q
      tr1000 | 0.244 | 0.641 | 18 | 0.52991 | 0.88269`),
  )
  expect(wordsOf(reading)).toEqual(['tr1000: = 0.52991/5 raw -', 'tr1000: = 0.88269/5 adjusted -'])
})

test('heads of statistical software', () => {
  const reading = readRows(
    rowsOf(`
      contrast | estimate | SE | df | t.ratio | p.value
      low - high | 1.2 | 0.4 | 57 | 3.00 | 0.0112
       |  |  |  |  |`),
  )
  expect(wordsOf(reading)).toEqual(['low v high: = 0.0112/4 unknown -'])
  expect(reading.statistics[0]).toMatchObject({ test: 't', df: [57] })
})

test('the two groups in two columns under (I) and (J)', () => {
  const reading = readRows(
    rowsOf(`
      (I) diet | (J) diet | Mean Difference (I-J) | Std. Error | Sig.
      kelp | krill | 2.4* | 0.7 | 0.004
      kelp | fish | 0.3 | 0.7 | 1.000`),
  )
  expect(wordsOf(reading)).toEqual([
    'kelp v krill: = 0.004/3 unknown significant',
    'kelp v fish: = 1/3 unknown not significant',
  ])
})

test('summaries without a p-value give no report', () => {
  const reading = readRows(
    rowsOf(`
      Stream | n | mean | sd
      Alder | 7 | 24.847 | 2.605
      Birch | 7 | 20.642 | 4.174`),
  )
  expect(reading.reports).toEqual([])
  expect(reading.statistics).toEqual([])
})

test('statistics without p-values are read', () => {
  const reading = readRows(
    rowsOf(`
      Outcome | Mean difference (SD units) | t | df
      lane keeping | 0,12 | 0,48 | 46`),
  )
  expect(reading.statistics).toMatchObject([{ test: 't', df: [46], value: 0.48, report: null }])
})

test('an empty table, a ragged one and one of words do not throw', () => {
  expect(readRows([]).reports).toEqual([])
  expect(readRows([['p'], ['0.03', 'x', ''], []]).reports.length).toBeLessThanOrEqual(1)
  expect(readRows([['a note'], ['another', 'word']]).reports).toEqual([])
})
