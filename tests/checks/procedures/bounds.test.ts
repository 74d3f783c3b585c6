import { expect, test } from 'vitest'
import { adjust, adjustBounds, CATALOGUE, procedureTable, type AdjustOptions } from '@/lib/checks'

// For each procedure ten boxes, wide and narrow, with 1,000 points each: 10,000 points from a fixed seed.
const BOXES = 10
const POINTS = 1000

/** A multiplicative congruential generator (Park and Miller 1988), in (0, 1). */
function createRandom(seed: number): () => number {
  let state = seed
  return () => (state = (state * 48271) % 2147483647) / 2147483647
}

const COMPUTABLE = CATALOGUE.filter((procedure) => {
  const { adjust: ofSet, adjustInOrder } = procedureTable[procedure]
  return ofSet !== null || adjustInOrder !== null
})

function drawOptions(
  takes: readonly string[],
  size: number,
  more: number,
  next: () => number,
): AdjustOptions {
  if (takes.includes('groups')) return { groups: 5 }
  const spread = (count: number) => {
    const raw = Array.from({ length: count }, next)
    const sum = raw.reduce((a, b) => a + b, 0)
    return raw.map((value) => (value / sum) * 0.999)
  }
  const rows = Array.from({ length: size }, (_, i) => {
    const row = spread(size - 1)
    return [...row.slice(0, i), 0, ...row.slice(i)]
  })
  return {
    m: size + more,
    ...(takes.includes('weights') ? { weights: spread(size) } : {}),
    ...(takes.includes('transitions') ? { transitions: rows } : {}),
  }
}

for (const procedure of COMPUTABLE) {
  test(`${procedure}: the bounds over a box hold 10,000 points of it`, () => {
    const next = createRandom(20261201)
    const { takes } = procedureTable[procedure]
    let outside = 0
    for (let box = 0; box < BOXES; box++) {
      const size = 2 + (box % 7)
      // every other box straddles the levels of the first stages, 0.0476 and 0.05
      const low = Array.from({ length: size }, () => (box % 2 === 0 ? 0.044 * next() : next() ** 3))
      const high = low.map((value) => Math.min(1, value + (box % 3 === 0 ? 0.4 : 0.02) * next()))
      const options = drawOptions(takes, size, box % 4 === 3 ? 2 : 0, next)
      const bounds = adjustBounds(procedure, low, high, options)
      for (let draw = 0; draw < POINTS; draw++) {
        const corner = draw % 4 === 0
        const point = low.map((from, i) => {
          const to = high[i] ?? NaN
          return corner ? (next() < 0.5 ? from : to) : Math.min(to, from + next() * (to - from))
        })
        adjust(procedure, point, options).forEach((value, i) => {
          const [from, to] = [bounds.low[i] ?? NaN, bounds.high[i] ?? NaN]
          if (!(value >= from - 1e-12 && value <= to + 1e-12)) outside++
        })
      }
    }
    expect(outside).toBe(0)
  })

  test(`${procedure}: bounds are refused for a box that is none`, () => {
    const options = drawOptions(procedureTable[procedure].takes, 1, 0, () => 0.5)
    expect(() => adjustBounds(procedure, [0.1], [0.05], options)).toThrow(RangeError)
    expect(() => adjustBounds(procedure, [0.1], [NaN], options)).toThrow(RangeError)
    expect(() => adjustBounds(procedure, [0.1], [], options)).toThrow(RangeError)
  })
}

const ofSets = CATALOGUE.filter((procedure) => procedureTable[procedure].adjust !== null)

for (const procedure of ofSets) {
  test(`${procedure}: members of which nothing is printed bound the others as members over [0, 1] would`, () => {
    const next = createRandom(411)
    for (let box = 0; box < 40; box++) {
      const size = 1 + (box % 6)
      const unprinted = 1 + (box % 4)
      const low = Array.from({ length: size }, () => next() ** 3)
      const high = low.map((value) => Math.min(1, value + 0.05 * next()))
      const m = size + unprinted + (box % 3)
      const found = adjustBounds(procedure, low, high, { m, unprinted })
      const written = adjustBounds(
        procedure,
        [...low, ...new Array<number>(unprinted).fill(0)],
        [...high, ...new Array<number>(unprinted).fill(1)],
        { m },
      )
      for (let i = 0; i < size; i++) {
        expect(found.low[i]).toBeCloseTo(written.low[i] ?? NaN, 12)
        expect(found.high[i]).toBeCloseTo(written.high[i] ?? NaN, 12)
      }
    }
  })
}

test('Holm with one value of .01 and five that are not printed: from .01 to .06, by hand', () => {
  const { low, high } = adjustBounds('holm', [0.01], [0.01], { unprinted: 5 })
  expect([low[0], high[0]]).toEqual([0.01, 0.06])
})

test('a million members that are not printed cost no more than the printed ones where that can be had', () => {
  const { low, high } = adjustBounds('hommel', [1e-8, 0.01], [2e-8, 0.02], {
    m: 1_000_000,
    unprinted: 999_998,
  })
  expect(low.map((p) => Number(p.toPrecision(6)))).toEqual([2e-8, 0.01])
  expect(high.map((p) => Number(p.toPrecision(6)))).toEqual([0.02, 1])
})

test('an order or weights cannot be told for members that are not printed, nor can there be more than m', () => {
  expect(() => adjustBounds('fixed-sequence', [0.01], [0.02], { unprinted: 1 })).toThrow(RangeError)
  expect(() => adjustBounds('holm', [0.01], [0.02], { m: 3, unprinted: 3 })).toThrow(RangeError)
  expect(() => adjustBounds('holm', [0.01], [0.02], { unprinted: 0.5 })).toThrow(RangeError)
})
