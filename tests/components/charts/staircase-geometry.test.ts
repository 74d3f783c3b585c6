import { expect, test } from 'vitest'
import { staircaseGeometry } from '@/components/charts/staircase-geometry'
import { makeClaim, makeDecision, makeFamily, makeReport } from '@/tests/support/audit'

const frame = { width: 620, height: 320 }
const four = [0.03, 0.005, 0.04, 0.01].map((p, index) => makeReport(`r${index + 1}`, p))

test('p-values are ranked from the smallest and the smallest stands lowest', () => {
  const { dots } = staircaseGeometry(makeFamily(four), four, makeClaim(), 0.05, frame)
  expect(dots.map((dot) => dot.report.value)).toEqual([0.005, 0.01, 0.03, 0.04])
  const heights = dots.map((dot) => dot.y)
  expect([...heights].sort((a, b) => b - a)).toEqual(heights)
  expect(dots.map((dot) => dot.rank)).toEqual([1, 2, 3, 4])
})

test('a dot on the claimed step line stands at the height of its threshold', () => {
  // Holm at m = 4 and alpha = 0.05 has the thresholds 0.0125, 0.0167, 0.025, 0.05 (by hand: 0.05/4 … 0.05/1)
  const reports = [
    makeReport('r1', 0.0125, 4),
    makeReport('r2', 0.025, 4),
    makeReport('r3', 0.025, 4),
    makeReport('r4', 0.05, 4),
  ]
  const { dots, lines } = staircaseGeometry(
    makeFamily(reports),
    reports,
    makeClaim({ procedure: 'holm' }),
    0.05,
    frame,
  )
  const holm = lines.find((line) => line.kind === 'claimed')
  expect(holm?.points[0]?.y).toBeCloseTo(dots[0]?.y ?? NaN, 6)
  expect(holm?.end.y).toBeCloseTo(dots[3]?.y ?? NaN, 6)
  expect(holm?.points).toHaveLength(8)
})

test('the claimed procedure is named with the m that is due, and with the claimed m where that differs', () => {
  const family = makeFamily(four, { m: { printed: 4, claimed: 3, due: 6, why: '' } })
  const { lines } = staircaseGeometry(family, four, makeClaim(), 0.05, frame)
  expect(lines.find((line) => line.kind === 'claimed')?.label).toBe('Bonferroni, m = 6')
  expect(lines.find((line) => line.kind === 'as-claimed-m')?.label).toBe('as claimed, m = 3')
  const [due, used] = ['claimed', 'as-claimed-m'].map(
    (kind) => lines.find((line) => line.kind === kind)?.end.y ?? NaN,
  )
  expect(due).toBeGreaterThan(used ?? NaN)
})

test('labels at the right end never overlap and stay inside the picture', () => {
  for (const procedure of ['bonferroni', 'holm', 'hochberg', 'bh', 'by', 'tukey', 'none'] as const) {
    for (const size of [frame, { width: 320, height: 260 }]) {
      const { lines, plot } = staircaseGeometry(makeFamily(four), four, makeClaim({ procedure }), 0.05, size)
      const heights = lines.map((line) => line.labelY).sort((a, b) => a - b)
      heights.slice(1).forEach((height, index) => {
        expect(height - (heights[index] ?? 0)).toBeGreaterThanOrEqual(12.99)
      })
      expect(heights[0]).toBeGreaterThanOrEqual(plot.top)
      expect(heights[heights.length - 1]).toBeLessThanOrEqual(plot.bottom)
    }
  }
})

test('a p-value printed as 0.000 or < 0.001 has a whisker that runs out of the picture below', () => {
  const reports = [
    makeReport('r1', 0, 3),
    makeReport('r2', 0.001, 3, { relation: '<', low: 0, high: 0.001 }),
    makeReport('r3', 0.02),
  ]
  const { dots, plot } = staircaseGeometry(makeFamily(reports), reports, makeClaim(), 0.05, frame)
  expect(dots.map((dot) => dot.openBelow)).toEqual([true, true, false])
  for (const dot of dots) {
    expect(Number.isFinite(dot.y)).toBe(true)
    expect(dot.y).toBeLessThanOrEqual(plot.bottom)
    expect(dot.y).toBeGreaterThanOrEqual(plot.top)
  }
})

test('the whisker covers the rounding interval', () => {
  const reports = [makeReport('r1', 0.01, 2), makeReport('r2', 0.3, 2)]
  const { dots } = staircaseGeometry(makeFamily(reports), reports, makeClaim(), 0.05, frame)
  const [first] = dots
  expect(first?.whisker?.top).toBeLessThan(first?.y ?? 0)
  expect(first?.whisker?.bottom).toBeGreaterThan(first?.y ?? Infinity)
})

test('an extremely small p-value neither flattens the picture nor leaves it', () => {
  const reports = [makeReport('r1', 1e-80, 82), makeReport('r2', 0.02)]
  const { dots, ticks, plot } = staircaseGeometry(makeFamily(reports), reports, makeClaim(), 0.05, frame)
  expect(ticks.length).toBeLessThanOrEqual(8)
  expect(dots[0]?.y).toBe(plot.bottom)
})

test('values given only as adjusted are held against alpha alone', () => {
  const reports = four.map((report) => ({ ...report, scale: 'adjusted' as const }))
  const picture = staircaseGeometry(makeFamily(reports), reports, makeClaim(), 0.05, frame)
  expect(picture.adjustedOnly).toBe(true)
  expect(picture.lines.map((line) => line.kind)).toEqual(['alpha'])
})

test('an adjusted value among raw ones is left out of the picture and named apart', () => {
  const reports = four.map((report, index) =>
    index === 0 ? { ...report, scale: 'adjusted' as const } : report,
  )
  const picture = staircaseGeometry(makeFamily(reports), reports, makeClaim(), 0.05, frame)
  expect(picture.dots).toHaveLength(3)
  expect(picture.apart.map((report) => report.id)).toEqual(['r1'])
})

test('a family of 20 000 draws only as many ranks as it has use for', () => {
  const family = makeFamily(four, { m: { printed: 4, claimed: null, due: 20_000, why: '' } })
  const { lines, ranks } = staircaseGeometry(family, four, makeClaim({ procedure: 'bh' }), 0.05, frame)
  expect(ranks.length).toBeLessThanOrEqual(12)
  expect(Math.max(...lines.map((line) => line.points.length))).toBeLessThanOrEqual(24)
})

test('a dot carries the outcome of its call', () => {
  const family = makeFamily(four, {
    outcome: 'fails',
    decisions: [
      makeDecision('r1', { called: true, significant: false }),
      makeDecision('r2', { called: true, significant: true }),
      makeDecision('r3', { called: true, significant: null }),
      makeDecision('r4'),
    ],
  })
  const { dots } = staircaseGeometry(family, four, makeClaim(), 0.05, frame)
  expect(dots.map((dot) => [dot.report.id, dot.outcome])).toEqual([
    ['r2', 'holds'],
    ['r4', null],
    ['r1', 'fails'],
    ['r3', 'undecidable'],
  ])
})
