import { expect, test } from 'vitest'
import { parsePrintedP, pBounds, pBoundsOverSphericity } from '@/lib/checks'
import { combine, join } from '@/lib/checks/families/interval'

const read = (text: string) => {
  const printed = parsePrintedP(text)
  if (printed === null) throw new Error(`${text} is no p-value`)
  return { low: printed.low, high: printed.high }
}

test('t(28) = 2.05 with p = .05 printed: the statistic leaves less than the print', () => {
  // R 4.2.2: 2 pt(-2.055, 28) = 0.04931583, 2 pt(-2.045, 28) = 0.05035685; p = .05 is [.045, .055].
  const found = combine([read('.05'), pBounds('t', 2.045, 2.055, [28])])
  expect(found?.conflict).toBe(false)
  expect(found?.range.low).toBeCloseTo(0.04931583, 8)
  expect(found?.range.high).toBeCloseTo(0.05035685, 8)
})

test('r(48) = .35 with p = .0127 printed: the print leaves less than the statistic', () => {
  // R 4.2.2: r = .35 on 48 df has p = 0.01271545; .345 and .355 reach from .0114 to .0141.
  const statistic = pBounds('r', 0.345, 0.355, [48])
  const found = combine([read('.0127'), statistic])
  expect(found).toEqual({ range: read('.0127'), conflict: false })
  expect(statistic.low).toBeLessThan(0.01265)
  expect(statistic.high).toBeGreaterThan(0.01275)
})

test('F(2, 38) = 3.60 with p = .062: in conflict as it stands, in agreement with sphericity corrected', () => {
  const printed = read('.062')
  const uncorrected = pBounds('F', 3.595, 3.605, [2, 38])
  const joined = combine([printed, uncorrected])
  expect(joined?.conflict).toBe(true)
  expect(joined?.range).toEqual(join(printed, uncorrected))
  expect(joined?.range.low).toBeCloseTo(0.0368, 4)
  expect(joined?.range.high).toBe(0.0625)
  const corrected = pBoundsOverSphericity(3.595, 3.605, [2, 38], { low: 0.615, high: 0.625 })
  const agreed = combine([printed, corrected])
  expect(agreed?.conflict).toBe(false)
  expect(agreed?.range.high).toBeLessThanOrEqual(0.0625)
})

test('three sources are intersected, and joined all together where one contradicts', () => {
  const wide = { low: 0.01, high: 0.05 }
  const middle = { low: 0.02, high: 0.06 }
  expect(combine([wide, middle, { low: 0, high: 0.03 }])).toEqual({
    range: { low: 0.02, high: 0.03 },
    conflict: false,
  })
  expect(combine([wide, middle, { low: 0.2, high: 0.3 }])).toEqual({
    range: { low: 0.01, high: 0.3 },
    conflict: true,
  })
  // In pairs all three overlap here, but together they do not.
  const apart = combine([
    { low: 0.01, high: 0.03 },
    { low: 0.02, high: 0.05 },
    { low: 0.04, high: 0.06 },
  ])
  expect(apart).toEqual({ range: { low: 0.01, high: 0.06 }, conflict: true })
})

test('ends that touch agree, one source stands for itself, and none says nothing', () => {
  expect(combine([read('<.05'), { low: 0.05, high: 0.1 }])).toEqual({
    range: { low: 0.05, high: 0.05 },
    conflict: false,
  })
  expect(combine([read('.030')])).toEqual({ range: read('.030'), conflict: false })
  expect(combine([])).toBeNull()
})
