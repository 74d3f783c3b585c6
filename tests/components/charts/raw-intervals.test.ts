import { expect, test } from 'vitest'
import { rawIntervals } from '@/components/charts/raw-intervals'
import { staircaseGeometry } from '@/components/charts/staircase-geometry'
import type { Report, Statistic } from '@/lib/checks/types'
import { makeClaim, makeFamily, makeReport } from '@/tests/support/audit'

const mapOf = <T extends { id: string }>(items: readonly T[]) => new Map(items.map((item) => [item.id, item]))

function makeStatistic(id: string, report: Report, pLow: number, pHigh: number): Statistic {
  return {
    id,
    place: report.place,
    test: 't',
    df: [40],
    value: 2.38,
    decimals: 2,
    pLow,
    pHigh,
    report: report.id,
  }
}

// t(40) = 2.38 stands for 2.375 to 2.385: two-sided p from 0.0219 to 0.0224 (R: 2 * pt(-2.375, 40) = 0.02242)
const inText = makeReport('r1', 0.134, 3, {
  scale: 'adjusted',
  comparison: ['dense', 'bare'],
  statistic: 's1',
})
const statistic = makeStatistic('s1', inText, 0.0219, 0.0224)

test('the unadjusted p behind an adjusted one comes from its statistic', () => {
  const raw = rawIntervals(makeFamily([inText]), mapOf([inText]), mapOf([statistic]))
  expect(raw.get('r1')).toEqual({ low: 0.0219, high: 0.0224 })
})

test('or from the same comparison in the results table, whichever way round it is named', () => {
  const without = { ...inText, statistic: null }
  const inTable = makeReport('r2', 0.0222, 4, { comparison: ['Bare', 'Dense'] })
  const elsewhere = makeReport('r3', 0.9, 4, { comparison: ['bare', 'dense'], family: 'f2' })
  const raw = rawIntervals(makeFamily([without]), mapOf([elsewhere, without, inTable]), new Map())
  expect(raw.get('r1')).toEqual({ low: inTable.low, high: inTable.high })
})

test('nothing is made up where the manuscript gives the adjusted value alone', () => {
  expect(rawIntervals(makeFamily([inText]), mapOf([inText]), new Map()).size).toBe(0)
})

test('a comparison that is printed three times is one dot, on the scale of the thresholds', () => {
  const again = makeReport('r2', 0.134, 3, { scale: 'adjusted', comparison: ['dense', 'bare'] })
  const family = { ...makeFamily([inText]), members: ['r1', 'r2'] }
  const raw = rawIntervals(family, mapOf([inText, again]), mapOf([statistic]))
  const frame = { width: 620, height: 320 }
  const { dots, lines } = staircaseGeometry(family, [inText, again], makeClaim(), 0.05, frame, raw)
  expect(dots.map((dot) => dot.report.id)).toEqual(['r1'])
  expect(lines.some((line) => line.kind === 'claimed')).toBe(true)
})

test('a procedure without thresholds of its own is held against alpha on the adjusted scale', () => {
  const raw = new Map([['r1', { low: 0.0219, high: 0.0224 }]])
  const picture = staircaseGeometry(
    makeFamily([inText]),
    [inText],
    makeClaim({ procedure: 'tukey' }),
    0.05,
    { width: 620, height: 320 },
    raw,
  )
  expect(picture.adjustedOnly).toBe(true)
  expect(picture.lines.map((line) => line.kind)).toEqual(['alpha'])
})
