import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut } from '@/tests/support/prose'
import { STATISTIC_PASSAGES } from './statistic-passages'

const readText = (text: string) => read(makeLaidOut(text), null, defaultHouseRules)

test.each(STATISTIC_PASSAGES.map(([text, ...expected]) => [text, expected] as const))(
  'reads: %s',
  (text, expected) => {
    const { reports, statistics } = readText(text)
    const words = statistics.map(({ test: name, df, value, decimals, report }) => {
      const p = reports.find(({ id }) => id === report)
      return `${name}(${df.join(',')}) ${value}/${decimals}${p ? ` → ${p.relation} ${p.value}` : ''}`
    })
    expect(words).toEqual(expected)
    for (const p of reports.filter(({ statistic }) => statistic !== null))
      expect(statistics.find(({ id }) => id === p.statistic)?.report).toBe(p.id)
  },
)

// computed with R: 2 * pt(-2.055, 28) = 0.0493, 2 * pt(-2.045, 28) = 0.0504
test('a statistic carries the p-values of its rounding interval', () => {
  const [statistic] = readText('Weights differed, t(28) = 2.05, p = .05.').statistics
  expect(statistic?.pLow).toBeCloseTo(0.0493, 4)
  expect(statistic?.pHigh).toBeCloseTo(0.0504, 4)
})

test('without degrees of freedom nothing is computed', () => {
  const [statistic] = readText('The slope was positive (t = 3.00, p = .003).').statistics
  expect(statistic).toMatchObject({ pLow: null, pHigh: null, df: [] })
})

test('a statistic known only by a bound carries no interval', () => {
  const [statistic] = readText('There was no effect, F(1, 62) < 0.01, p = .985.').statistics
  expect(statistic).toMatchObject({ pLow: null, value: 0.01 })
})
