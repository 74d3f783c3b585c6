import fc from 'fast-check'
import { expect, test } from 'vitest'
import { spreadLabels } from '@/components/charts/spread-labels'

test('labels that are far enough apart stay where they are', () => {
  expect(spreadLabels([10, 40, 80], 12, 0, 100)).toEqual([10, 40, 80])
})

test('labels at one height are moved apart and keep their order', () => {
  expect(spreadLabels([50, 50, 50], 10, 0, 100)).toEqual([50, 60, 70])
})

test('labels at the lower end are pushed up', () => {
  expect(spreadLabels([98, 99], 10, 0, 100)).toEqual([90, 100])
})

test('where there is room labels never overlap, never leave the frame and never change their order', () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: -50, max: 350, noNaN: true }), { maxLength: 10 }), (wishes) => {
      const placed = spreadLabels(wishes, 13, 0, 300)
      const sorted = [...placed].sort((a, b) => a - b)
      sorted.slice(1).forEach((at, index) => expect(at - (sorted[index] ?? 0)).toBeGreaterThan(12.999))
      placed.forEach((at) => expect(at >= -1e-9 && at <= 300 + 1e-9).toBe(true))
      wishes.forEach((wish, i) =>
        wishes.forEach((other, j) => {
          if (wish < other) expect(placed[i]).toBeLessThan(placed[j] ?? NaN)
        }),
      )
    }),
  )
})
