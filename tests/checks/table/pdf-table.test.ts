import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut, makePdfTable, type Part } from '@/tests/support/prose'
import { rowsOf } from '@/tests/support/results-table'

type Extra = Parameters<typeof makePdfTable>[1]
const readTable = (lines: string, extra: Extra = {}, text: Part[] = []) =>
  read(makeLaidOut(text, [makePdfTable(rowsOf(lines), extra)]), null, defaultHouseRules)

const wordsOf = ({ reports }: ReturnType<typeof read>) =>
  reports.map(
    (r) =>
      `${r.comparison?.join(' v ') ?? r.outcome ?? '-'}: ${r.relation} ${r.value} ${r.scale} ${r.called ?? '-'}`,
  )

test('the caption says that p_B is corrected', () => {
  const reading = readTable(
    `
    Comparison | Difference | SE | t | p_B
    Reef vs Bank | -31.7 | 12.9 | -2.46 | 0.123
    Reef vs Creek | -39.5 | 12.9 | -3.06 | 0.029`,
    {
      caption: 'Table 1: Pairwise comparisons. p_B: Bonferroni-corrected p-value.',
      notes: '28 residual degrees of freedom throughout.',
    },
  )
  expect(wordsOf(reading)).toEqual(['Reef v Bank: = 0.123 adjusted -', 'Reef v Creek: = 0.029 adjusted -'])
  expect(reading.statistics.map(({ df }) => df)).toEqual([[28], [28]])
  expect(reading.claims.map(({ procedure }) => procedure)).toEqual(['bonferroni'])
})

test('raw beside adjusted values, the caption names the procedure', () => {
  const reading = readTable(
    `
    Depth | Diff. | t | P | adj. P
    0.5 mm | 0.32 | 0.24 | 0.8141 | 0.814
    1.0 mm | -1.95 | -1.43 | 0.1581 | 0.316`,
    {
      caption:
        'Table 2: Hardness by depth, compared with the surface; adjusted P after Holm (54 degrees of freedom).',
    },
  )
  expect(wordsOf(reading)).toEqual([
    '0.5 mm v surface: = 0.8141 raw -',
    '0.5 mm v surface: = 0.814 adjusted -',
    '1.0 mm v surface: = 0.1581 raw -',
    '1.0 mm v surface: = 0.316 adjusted -',
  ])
  expect(reading.statistics.map(({ df }) => df)).toEqual([[54], [54]])
})

test('the text names the control that the rows are compared with', () => {
  const reading = readTable(
    `
    Additive | t | p
    Brine | 3.41 | 0.004
    Lactate | 1.71 | 0.262`,
    { caption: 'Table 1. Additives.' },
    [{ kind: 'methods', text: 'Each additive was compared with the untreated control by Dunnett’s test.' }],
  )
  expect(wordsOf(reading)).toEqual([
    'Brine v untreated control: = 0.004 adjusted -',
    'Lactate v untreated control: = 0.262 adjusted -',
  ])
})

test('degrees of freedom in the head', () => {
  const reading = readTable(`
    Levels | Difference | t(613) | p
    Reef vs Bank | 0.72 | 4.98 | <0.001`)
  expect(reading.statistics).toMatchObject([{ test: 't', df: [613], value: 4.98 }])
})

test('an analysis of variance takes its error df from the line of the residuals', () => {
  const reading = readTable(
    `
    Source | SS | df | MS | F | p
    Zone | 80.74 | 1 | 80.74 | 33.4 | <0.001
    Zone × Sex | 0.51 | 2 | 0.26 | 0.22 | 0.804
    Residuals | 1486.69 | 615 | 2.42 |  |`,
    { caption: 'Table 2. ANOVA of the score.' },
  )
  expect(reading.statistics.map(({ test: name, df, value }) => [name, df, value])).toEqual([
    ['F', [1, 615], 33.4],
    ['F', [2, 615], 0.22],
  ])
  expect(reading.reports.map(({ role }) => role)).toEqual(['omnibus', 'interaction'])
})

test('two df columns', () => {
  const reading = readTable(`
    Effect | num df | den df | F | p
    Light | 2 | 57 | 4.78 | .012`)
  expect(reading.statistics).toMatchObject([{ test: 'F', df: [2, 57] }])
})

test('asterisks after the value, their key in the note', () => {
  const reading = readTable(
    `
    Outcome | Difference | p
    Weight | 2.1 | .003**
    Length | 0.2 | .410`,
    { notes: '* p < .05, ** p < .01' },
  )
  expect(wordsOf(reading)).toEqual([
    'Weight: = 0.003 unknown significant',
    'Length: = 0.41 unknown not significant',
  ])
})

test('a table of asterisks alone', () => {
  const reading = readTable(
    `
    Comparison | Difference | Sig.
    Reef vs Bank | -8.1 | **
    Reef vs Creek | -2.3 | n.s.`,
    { notes: '*p<0.05; **p<0.01; n.s., not significant' },
  )
  expect(wordsOf(reading)).toEqual([
    'Reef v Bank: < 0.01 unknown significant',
    'Reef v Creek: > 0.05 unknown not significant',
  ])
})

test('asterisks on the difference', () => {
  const reading = readTable(
    `
    Comparison | Difference | SE
    Reef vs Bank | -8.1*** | 1.2
    Reef vs Creek | -2.3 | 1.2`,
    { notes: '***P < 0.001' },
  )
  expect(wordsOf(reading)).toEqual(['Reef v Bank: < 0.001 unknown significant'])
})

test('a footnote on the head says that p is corrected', () => {
  const reading = readTable(
    `
    Comparison | t(60) | p †
    Reef vs Bank | 2.4 | 0.030`,
    { notes: 'SE, standard error. †, false discovery rate (FDR) correction of p values.' },
  )
  expect(wordsOf(reading)).toEqual(['Reef v Bank: = 0.03 adjusted -'])
})

test('a baseline table is told from results', () => {
  const reading = readTable(
    `
    Variable | Drug (n = 14) | Placebo (n = 15) | p-value
    Age (years) | 54.1 (9.2) | 55.3 (8.7) | 0.714`,
    { caption: 'Table 1. Baseline characteristics' },
  )
  expect(reading.reports).toMatchObject([{ value: 0.714, role: 'baseline', outcome: 'Age (years)' }])
})

test('lines of one text name the outcome of the rows below', () => {
  const reading = readTable(`
    Comparison | t | p
    Grip strength |  |
    Tape vs Cast | 2.1 | .040
    Pain |  |
    Tape vs Cast | 0.4 | .690`)
  expect(reading.reports.map(({ outcome }) => outcome)).toEqual(['Grip strength', 'Pain'])
})

test('values written out within cells', () => {
  const reading = readTable(`
    Contrast | Result
    Reef vs Bank | t(28) = 2.05, p = .050
    Reef vs Creek | 0.82 (0.70–0.96; P = 0.01)`)
  expect(wordsOf(reading)).toEqual(['Reef v Bank: = 0.05 unknown -', 'Reef v Creek: = 0.01 unknown -'])
  expect(reading.statistics).toMatchObject([{ test: 't', df: [28], value: 2.05 }])
})

test('a head repeated within the table, and one without a head of its own', () => {
  const first = makePdfTable(
    rowsOf(
      `
       | Estimate | Std. Error | z value | Pr(>|z|)`.replace('Pr(>|z|)', 'Pr(>z)'),
    ),
  )
  const laidOut = makeLaidOut(
    [],
    [
      { ...first, columns: 5, rows: makePdfTable(rowsOf('h\nhosp | 0.16 | 0.02 | 7.51 | 5.9e-14')).rows },
      {
        ...makePdfTable([
          ['', '', '', '', ''],
          ['school', '0.03', '0.01', '5.14', '2.7e-07'],
        ]),
        page: 2,
      },
    ],
  )
  const reading = read(laidOut, null, defaultHouseRules)
  expect(wordsOf(reading)).toEqual(['hosp: = 5.9e-14 unknown -', 'school: = 2.7e-7 unknown -'])
  expect(reading.statistics.map(({ test: name, value }) => [name, value])).toEqual([
    ['z', 7.51],
    ['z', 5.14],
  ])
})

test('a matrix of correlations: coefficients, and the starred ones as reports', () => {
  const reading = readTable(
    `
     | 1 | 2 | 3
    1. Light | – | .45** | .12
    2. Salinity |  | – | −.31*
    3. Depth |  |  | –`,
    { caption: 'Table 3. Correlations (N = 62).', notes: '* p < .05. ** p < .01.' },
  )
  expect(reading.statistics.map(({ df, value }) => [df, value])).toEqual([
    [[60], 0.45],
    [[60], 0.12],
    [[60], -0.31],
  ])
  expect(reading.reports.map(({ relation, value, outcome }) => `${outcome} ${relation} ${value}`)).toEqual([
    'Light × Salinity < 0.01',
    'Salinity × Depth < 0.05',
  ])
})

test('tables without results give nothing', () => {
  const reading = readTable(`
    Group | n | Mean | SD
    Splint | 14 | 31.3 | 3.2
    No support | 14 | 30.2 | 3.7`)
  expect(reading.reports).toEqual([])
  expect(reading.statistics).toEqual([])
})

test('heads and numbers that stand a blank apart are columns of their own, and a loss of df counts by its size', () => {
  const reading = readTable(`
    | Res.Df Df Chisq | Pr(>Chisq)
    1 | 4389 |
    2 | 4391 -2 4.12 | 0.1274`)
  expect(reading.statistics.map(({ test: kind, df, value }) => [kind, df, value])).toEqual([
    ['chi2', [2], 4.12],
  ])
  // P(χ² > 4.12) on 2 df is exp(−2.06) = 0.1274, by hand
  expect(reading.statistics[0]?.pLow).toBeLessThan(0.1275)
  expect(reading.statistics[0]?.pHigh).toBeGreaterThan(0.1273)
  expect(reading.reports.map(({ value }) => value)).toEqual([0.1274])
})

test('a mean with its spread in brackets stays one cell', () => {
  const reading = readTable(`
    Site | Mean (SD) | p
    Reef vs Bank | 4.1 (0.3) | 0.031
    Reef vs Creek | 4.4 (0.2) | 0.012`)
  expect(reading.reports.map(({ value }) => value)).toEqual([0.031, 0.012])
})
