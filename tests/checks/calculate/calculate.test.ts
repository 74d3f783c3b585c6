import { expect, test } from 'vitest'
import { calculate, listComputable } from '@/lib/checks/calculate/calculate'
import { findDecidingDigit } from '@/lib/checks/calculate/deciding-digit'
import { fitPrinted } from '@/lib/checks/calculate/fit-printed'
import { readValues } from '@/lib/checks/calculate/read-values'
import { writeCalculationCsv } from '@/lib/checks/calculate/write-calculation-csv'

const list = 'A 0.001\nB 0.008\nC 0.012\nD 0.021\nE 0.039\nF 0.200'
const entriesOf = (text: string) => readValues(text).entries

// R 4.2.2, p.adjust(c(.001, .008, .012, .021, .039, .2), method); Šidák as 1 − (1 − p)^6, Holm–Šidák stepwise.
const fromR = {
  bonferroni: [0.006, 0.048, 0.072, 0.126, 0.234, 1],
  sidak: [0.006, 0.0471, 0.0699, 0.1196, 0.2123, 0.7379],
  holm: [0.006, 0.04, 0.048, 0.063, 0.078, 0.2],
  'holm-sidak': [0.006, 0.0394, 0.0471, 0.0617, 0.0765, 0.2],
  hochberg: [0.006, 0.04, 0.048, 0.063, 0.078, 0.2],
  hommel: [0.006, 0.032, 0.042, 0.0585, 0.078, 0.2],
  bh: [0.006, 0.024, 0.024, 0.0315, 0.0468, 0.2],
  by: [0.0147, 0.0588, 0.0588, 0.0772, 0.1147, 0.49],
} as const

test('the adjusted values of a pasted list are those of R', () => {
  const procedures = Object.keys(fromR) as (keyof typeof fromR)[]
  const { results, m } = calculate(entriesOf(list), { alpha: 0.05, reading: 'exact', procedures })
  expect(m).toBe(6)
  for (const { procedure, adjusted, refused } of results) {
    expect(refused).toBeNull()
    expect(adjusted.map((one) => one.low)).toEqual(adjusted.map((one) => one.high))
    adjusted.forEach((one, i) => {
      expect(one.low, procedure).toBeCloseTo(fromR[procedure as keyof typeof fromR][i] ?? NaN, 3)
    })
  }
  const kept = results.map(({ significant }) => significant.filter((one) => one === true).length)
  expect(kept).toEqual([2, 2, 3, 3, 3, 3, 5, 1])
})

test('the rounding of the list leaves open what its last digit would decide', () => {
  const { results, survives } = calculate(entriesOf(list), {
    alpha: 0.05,
    reading: 'printed',
    procedures: ['bonferroni', 'holm'],
  })
  // 6 × .0075 = .045 and 6 × .0085 = .051
  expect(results[0]?.adjusted[1]?.low).toBeCloseTo(0.045, 12)
  expect(results[0]?.adjusted[1]?.high).toBeCloseTo(0.051, 12)
  expect(results[0]?.significant).toEqual([true, null, false, false, false, false])
  // .05 / .0085 = 5.9 and .05 / .0075 = 6.7
  expect(survives.bonferroni[1]).toEqual({ certain: 5, possible: 6 })
  // .05 / .0125 = 4, .05 / .0115 = 4.3
  expect(survives.bonferroni[2]).toEqual({ certain: 4, possible: 4 })
})

test('the digit that would decide is told value by value', () => {
  const options = { alpha: 0.05, reading: 'printed' } as const
  const digits = findDecidingDigit(entriesOf(list), 1, 'bonferroni', options)
  expect(digits.map((one) => one.value)).toEqual([
    0.0075, 0.0076, 0.0077, 0.0078, 0.0079, 0.008, 0.0081, 0.0082, 0.0083, 0.0084, 0.0085,
  ])
  // .05 / 6 = .008333…: .0083 stands for .00825 to .00835
  expect(digits.map((one) => one.significant)).toEqual([
    ...new Array<boolean>(8).fill(true),
    null,
    false,
    false,
  ])
  expect(findDecidingDigit(entriesOf('A <0.01'), 0, 'bonferroni', options)).toEqual([])
  expect(findDecidingDigit(entriesOf(list), 1, 'bonferroni', { ...options, reading: 'exact' })).toEqual([])
})

test('m may exceed the list and not fall short of it; the others are computed all the same', () => {
  const run = (m: number) =>
    calculate(entriesOf(list), {
      alpha: 0.05,
      reading: 'exact',
      procedures: ['bonferroni', 'tukey'],
      family: { m },
    })
  expect(run(10).results[0]?.adjusted[0]?.low).toBeCloseTo(0.01, 12)
  expect(run(10).results[1]?.refused).toMatch(/needs/)
  expect(run(3).results[0]?.refused).toMatch(/at least the number of p-values, 6/)
  expect(() => calculate([], { alpha: 5, reading: 'exact', procedures: [] })).toThrow(RangeError)
})

test('an inequality stays an interval when values are taken as exact', () => {
  const { raw } = calculate(entriesOf('<0.001 0.02'), { alpha: 0.05, reading: 'exact', procedures: [] })
  expect(raw).toEqual([
    { low: 0, high: 0.001 },
    { low: 0.02, high: 0.02 },
  ])
})

test('every procedure that works on p-values alone is offered', () => {
  const offered = listComputable()
  for (const procedure of Object.keys(fromR)) expect(offered).toContain(procedure)
  expect(offered).not.toContain('games-howell')
})

test('printed adjusted values beside raw ones tell what was done', () => {
  const table =
    'pair\tp\tp adj\nA\t.001\t.006\nB\t.008\t.040\nC\t.012\t.048\nD\t.021\t.063\nE\t.039\t.078\nF\t.200\t.200'
  const found = fitPrinted(entriesOf(table), 'printed')
  expect(found.compared).toBe(6)
  expect(found.fits.map(({ procedure, m }) => `${procedure} ${m}`)).toEqual(['holm 6', 'hochberg 6'])
  expect(fitPrinted(entriesOf(list), 'printed')).toEqual({ compared: 0, fits: [] })
  const wrong = 'pair\tp\tp adj\nA\t.001\t.5\nB\t.2\t.3'
  expect(fitPrinted(entriesOf(wrong), 'printed')).toEqual({ compared: 2, fits: [] })
})

test('the CSV holds every entry and guards its names against formulas', () => {
  const entries = entriesOf('pair,p\n=SUM(A1),0.01\n"a, ""b""",<0.001')
  const csv = writeCalculationCsv(
    entries,
    calculate(entries, { alpha: 0.05, reading: 'printed', procedures: ['holm', 'tukey'] }),
  )
  const [header, first, second, rest] = csv.split('\r\n')
  expect(header).toBe(
    'line,name,printed,p_low,p_high,holm_low,holm_high,holm_significant,bonferroni_holds_up_to,bonferroni_fails_above,holm_holds_up_to,holm_fails_above,bh_holds_up_to,bh_fails_above,printed_adjusted,weight',
  )
  expect(first).toMatch(/^2,'=SUM\(A1\),0\.01,0\.005,0\.015,/)
  expect(second).toMatch(/^3,"a, ""b""",<0\.001,0,0\.001,0,0\.002,true,50,,/)
  expect(rest).toBe('')
})
