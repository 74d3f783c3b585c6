import { expect, test } from 'vitest'
import { emptyInput, type CalculatorInput } from '@/components/calculator/calculator-input'
import { kelpGroups, kelpValues } from '@/components/calculator/examples'
import { outcomeOf, standOf } from '@/components/calculator/judge-entry'
import { pictureOf, MOST_DOTS } from '@/components/calculator/picture-of'
import { showSurvives } from '@/components/calculator/show-value'
import { getPower } from '@/components/calculator/shown-power'
import { summarizeInput } from '@/components/calculator/summarize-input'
import { readInput, workOut } from '@/components/calculator/work-out'

const run = (part: Partial<CalculatorInput>) => {
  const input = { ...emptyInput, ...part }
  return workOut(readInput(input), input)
}

test('the example leaves one comparison open by its rounding', () => {
  const { work } = workOut(readInput(kelpValues), kelpValues)
  expect(work?.main.significant).toEqual([false, null, true, false, true, false])
})

test('a setting that makes no sense is named by its field, and nothing is computed meanwhile', () => {
  expect(run({ values: '.01 .02', alpha: '5' })).toMatchObject({
    faults: { alpha: 'A number between 0 and 1.' },
    work: null,
  })
  expect(run({ values: '.01 .02', m: '1' }).faults).toEqual({ m: 'A whole number of at least 2.' })
  expect(run({ values: '.01 .02', m: '2.5' }).work).toBeNull()
  expect(run({ values: '.01 .02', weights: 'a b' }).faults).toHaveProperty('weights')
  expect(run({ values: '.01 .02', m: '10', alpha: '0,05' }).work?.calculation.m).toBe(10)
})

test('a procedure that lacks what it needs is refused with its reason beside those that are computed', () => {
  const { work } = run({ values: '.01 .02', procedure: 'shaffer', beside: ['holm', 'graphical'] })
  expect(work?.main.refused).toMatch(/number of groups/)
  expect(work?.beside.map((one) => [one.procedure, one.refused === null])).toEqual([
    ['holm', true],
    ['graphical', false],
  ])
  const many = run({ values: '.01\n'.repeat(200), procedure: 'graphical', transitions: '0 1\n1 0' })
  expect(many.work?.main.refused).toMatch(/up to 150 tests/)
})

test('weights come from what is typed, else from the column of a table', () => {
  const table = 'endpoint\tp\tweight\na\t.01\t.8\nb\t.02\t.2'
  const bonferroni = (part: Partial<CalculatorInput>) =>
    run({
      values: table,
      procedure: 'weighted-bonferroni',
      reading: 'exact',
      ...part,
    }).work?.main.adjusted.map((one) => one.low)
  expect(bonferroni({})).toEqual([0.01 / 0.8, 0.02 / 0.2])
  expect(bonferroni({ weights: '.5 .5' })).toEqual([0.02, 0.04])
})

test('printed adjusted values are paired with the list, and a different number of them is a fault', () => {
  expect(run({ values: '.01 .02', printed: '.02 .04' }).entries.map((one) => one.adjusted?.printed)).toEqual([
    '.02',
    '.04',
  ])
  const { faults, work } = run({ values: '.01 .02', printed: '.02' })
  expect(faults.printed).toBe('1 adjusted value for 2 raw ones.')
  expect(work).not.toBeNull()
})

test('the outcome tells what the correction takes away from what was there alone', () => {
  const of = (low: number, high: number, corrected: boolean | null) =>
    outcomeOf(standOf({ low, high }, corrected, 0.05))
  expect(of(0.01, 0.01, true)).toBe('holds')
  expect(of(0.01, 0.01, false)).toBe('fails')
  expect(of(0.045, 0.055, false)).toBe('fails')
  expect(of(0.2, 0.2, false)).toBeNull()
  expect(of(0.01, 0.02, null)).toBe('undecidable')
})

test('a picture draws raw values under fixed thresholds, adjusted ones under others, and the smallest of many', () => {
  const draw = (part: Partial<CalculatorInput>) => {
    const { entries, work, alpha } = run(part)
    if (!work) throw new Error('nothing to draw')
    return pictureOf(entries, work.calculation, work.main, alpha)
  }
  expect(draw({ values: '.01 .02', procedure: 'holm' }).reports[0]).toMatchObject({
    scale: 'raw',
    value: 0.01,
  })
  const hommel = draw({ values: '.01 .02', procedure: 'hommel' })
  expect(hommel.reports[0]).toMatchObject({ scale: 'adjusted' })
  expect(hommel.claim?.procedure).toBe('unspecified')
  const values = Array.from({ length: 1000 }, (_, i) => ((i + 1) / 1001).toFixed(4)).reverse()
  const many = draw({ values: values.join('\n') })
  expect(many.reports).toHaveLength(MOST_DOTS)
  expect(many.left).toBe(700)
  expect(Math.max(...many.reports.map((one) => one.value))).toBeLessThan(0.31)
})

test('how far a significance holds is one number, two where the rounding leaves some open', () => {
  expect(showSurvives({ certain: 5, possible: 6 })).toBe('5 – 6')
  expect(showSurvives({ certain: 4, possible: 4 })).toBe('4')
  expect(showSurvives({ certain: 0, possible: 0 })).toBe('–')
  expect(showSurvives({ certain: 50, possible: Infinity })).toBe('50 – ∞')
})

test('the power is that of the design, and a family that is no number of pairs asks for the groups', () => {
  const question = { m: 6, alpha: 0.05, size: '20', effect: '0.8', groupCount: '' } as const
  // R 4.2.2: power.t.test(n = 20, delta = .8, sig.level = .05 / c(1, 6), strict = TRUE)$power
  const rows = getPower({ ...question, design: 'independent' })?.rows ?? []
  expect(rows[0]?.power).toBeCloseTo(0.6934041966, 8)
  expect(rows[1]?.power).toBeCloseTo(0.4114555136, 8)
  expect(getPower({ ...question, design: 'pairs' })?.groups).toBe(4)
  expect(getPower({ ...question, m: 7, design: 'pairs' })).toMatchObject({ rows: null })
  expect(getPower({ ...question, m: 7, design: 'many-to-one' })?.groups).toBe(8)
  expect(getPower({ ...question, size: '1', design: 'independent' })).toBeNull()
  // R 4.2.2: power.t.test(n = 20, delta = .8, type = 'paired', strict = TRUE)$power
  expect(getPower({ ...question, design: 'paired' })?.rows?.[0]?.power).toBeCloseTo(0.9238987554, 8)
})

test('groups are summarized with their rounding, and what is wrong with them is said', () => {
  const { summary, read } = summarizeInput(kelpGroups)
  expect(read).toMatchObject({ spread: 'sd', unread: [] })
  expect(summary?.comparisons).toHaveLength(6)
  expect(summary?.bounds).not.toBeNull()
  expect(summarizeInput({ ...kelpGroups, reading: 'exact' }).summary?.bounds).toBeNull()
  expect(summarizeInput({ ...kelpGroups, control: 'slate' }).summary?.comparisons).toHaveLength(3)
  const one = summarizeInput({ ...kelpGroups, groups: 'a 10 1 2' })
  expect(one).toMatchObject({ summary: null, refused: 'a comparison takes at least two groups, not 1.' })
  const nine = Array.from({ length: 9 }, (_, i) => `g${i} 10 ${i}.5 2.1`).join('\n')
  const procedures = summarizeInput({ ...kelpGroups, groups: nine }).summary?.comparisons[0]?.adjusted.map(
    (each) => each.procedure,
  )
  expect(procedures).toContain('tukey')
  expect(procedures).not.toContain('games-howell')
})
