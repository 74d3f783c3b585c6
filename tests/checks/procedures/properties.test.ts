import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjust, adjustBounds, CATALOGUE, procedureTable, type CatalogueProcedure } from '@/lib/checks'

// Logical facts, true of every vector of p-values.
const COMPUTABLE = CATALOGUE.filter((procedure) => procedureTable[procedure].adjust !== null)
const MONOTONE = COMPUTABLE.filter((procedure) => procedureTable[procedure].firstStage === null)
const TWO_STAGE = COMPUTABLE.filter((procedure) => procedureTable[procedure].firstStage !== null)
const NOT_BELOW_RAW = MONOTONE.filter((procedure) => procedure !== 'storey')

/** p-values as papers have them: any, rounded with many ties, and very small. */
const pValue = fc.oneof(
  fc.double({ min: 0, max: 1, noNaN: true }),
  fc.integer({ min: 0, max: 100 }).map((n) => n / 100),
  fc.integer({ min: 0, max: 50 }).map((n) => n / 1000),
  fc.integer({ min: 1, max: 300 }).map((n) => 10 ** -n),
)
const vector = (maxLength: number) => fc.array(pValue, { minLength: 1, maxLength })
const vectorAndSize = fc.tuple(vector(20), fc.nat(40)).map(([p, more]) => ({ p, m: p.length + more }))

/** At most, but for rounding errors. */
const atMost = (a: number, b: number) => a <= b + 1e-12 * Math.max(Math.abs(b), 1e-300)
const expectOrdered = (lower: readonly number[], upper: readonly number[]) => {
  lower.forEach((value, i) => expect(atMost(value, upper[i] ?? NaN), `${value} <= ${upper[i]}`).toBe(true))
}

test('Hommel is at most Hochberg, Hochberg at most Holm, Holm at most Bonferroni', () => {
  fc.assert(
    fc.property(vectorAndSize, ({ p, m }) => {
      const [hommel, hochberg, holm, bonferroni] = (
        ['hommel', 'hochberg', 'holm', 'bonferroni'] as const
      ).map((procedure) => adjust(procedure, p, { m }))
      expectOrdered(hommel ?? [], hochberg ?? [])
      expectOrdered(hochberg ?? [], holm ?? [])
      expectOrdered(holm ?? [], bonferroni ?? [])
    }),
    { numRuns: 500 },
  )
})

test('Šidák is at most Bonferroni, Benjamini–Hochberg at most Hommel and at most Benjamini–Yekutieli', () => {
  fc.assert(
    fc.property(vectorAndSize, ({ p, m }) => {
      const run = (procedure: CatalogueProcedure) => adjust(procedure, p, { m })
      expectOrdered(run('sidak'), run('bonferroni'))
      expectOrdered(run('holm-sidak'), run('holm'))
      expectOrdered(run('bh'), run('hommel'))
      expectOrdered(run('bh'), run('by'))
    }),
    { numRuns: 500 },
  )
})

for (const procedure of NOT_BELOW_RAW) {
  test(`${procedure}: adjusted values lie between the raw value and 1, and grow with m`, () => {
    fc.assert(
      fc.property(vectorAndSize, ({ p, m }) => {
        const adjusted = adjust(procedure, p, { m })
        expectOrdered(p, adjusted)
        expect(adjusted.every((value) => value >= 0 && value <= 1)).toBe(true)
        expectOrdered(adjusted, adjust(procedure, p, { m: m + 1 }))
      }),
    )
  })
}

for (const procedure of COMPUTABLE) {
  test(`${procedure}: the order of the values does not matter, and adjusted values keep it`, () => {
    fc.assert(
      fc.property(vectorAndSize, fc.infiniteStream(fc.nat()), ({ p, m }, keys) => {
        const shuffled = p
          .map((value, i) => ({ value, i, key: keys.next().value ?? 0 }))
          .sort((a, b) => a.key - b.key)
        const adjusted = adjust(procedure, p, { m })
        const found = adjust(
          procedure,
          shuffled.map(({ value }) => value),
          { m },
        )
        expect(found).toEqual(shuffled.map(({ i }) => adjusted[i]))
        const ascending = p
          .map((value, i) => [value, adjusted[i] ?? NaN] as const)
          .sort((a, b) => a[0] - b[0])
        ascending
          .slice(1)
          .forEach(([, value], i) => expect(value).toBeGreaterThanOrEqual(ascending[i]?.[1] ?? NaN))
      }),
    )
  })

  test(`${procedure}: unknown values stay unknown and do not count`, () => {
    fc.assert(
      fc.property(fc.array(fc.option(pValue, { nil: NaN }), { maxLength: 12 }), (p) => {
        const adjusted = adjust(procedure, p)
        expect(adjusted.map(Number.isNaN)).toEqual(p.map(Number.isNaN))
        const known = p.filter((value) => !Number.isNaN(value))
        expect(adjusted.filter((value) => !Number.isNaN(value))).toEqual(adjust(procedure, known))
      }),
    )
  })

  test(`${procedure}: members that are not shown act as p = 1`, () => {
    fc.assert(
      fc.property(vector(10), fc.nat(15), (p, more) => {
        const padded = adjust(procedure, [...p, ...new Array<number>(more).fill(1)])
        const found = adjust(procedure, p, { m: p.length + more })
        found.forEach((value, i) => expect(value).toBeCloseTo(padded[i] ?? NaN, 12))
      }),
    )
  })
}

for (const procedure of TWO_STAGE) {
  test(`${procedure}: its bounds are reached by points near its first stage`, () => {
    // Boxes that straddle the level of the first stage, searched on a fine grid of two or three p-values.
    const level = procedureTable[procedure].firstStage?.(0.05) ?? NaN
    const narrow = fc.tuple(
      fc.double({ min: 0.1, max: 1.05, noNaN: true }),
      fc.double({ min: 0.01, max: 0.9, noNaN: true }),
    )
    fc.assert(
      fc.property(fc.array(narrow, { minLength: 2, maxLength: 3 }), (items) => {
        const low = items.map(([at]) => at * level)
        const high = items.map(([at, width]) => (at + width) * level)
        const bounds = adjustBounds(procedure, low, high)
        const marks = items.map((_, i) => {
          const [from, to] = [low[i] ?? NaN, high[i] ?? NaN]
          return [from, to, level, level * (1 + 1e-13)].filter((p) => p >= from && p <= to)
        })
        const points = marks.reduce<number[][]>(
          (rows, list) => rows.flatMap((row) => list.map((p) => [...row, p])),
          [[]],
        )
        const runs = points.map((point) => adjust(procedure, point))
        low.forEach((_, i) => {
          const reached = runs.map((run) => run[i] ?? NaN)
          expect(Math.abs(Math.min(...reached) - (bounds.low[i] ?? NaN))).toBeLessThan(1e-12)
          expect(Math.abs(Math.max(...reached) - (bounds.high[i] ?? NaN))).toBeLessThan(1e-12)
        })
      }),
      { numRuns: 300 },
    )
  })
}

test('with two p-values Hommel is Hochberg', () => {
  fc.assert(
    fc.property(fc.tuple(pValue, pValue), (p) => {
      expectOrdered(adjust('hommel', p), adjust('hochberg', p))
      expectOrdered(adjust('hochberg', p), adjust('hommel', p))
    }),
  )
})

test('what cannot be computed is refused, with the reason', () => {
  expect(() => adjust('tukey', [0.01, 0.2])).toThrow(/Tukey cannot be computed from p-values alone/)
  expect(() => adjust('none' as CatalogueProcedure, [0.01])).toThrow(RangeError)
  expect(() => adjust('holm', [1.2])).toThrow(RangeError)
  expect(() => adjust('holm', [-0.1])).toThrow(RangeError)
  expect(() => adjust('holm', [0.1, 0.2], { m: 1 })).toThrow(RangeError)
  expect(() => adjust('holm', [0.1, 0.2], { m: 2.5 })).toThrow(RangeError)
  expect(() => adjust('bky', [0.1, 0.2], { alpha: 0 })).toThrow(RangeError)
  expect(() => adjustBounds('holm', [0.1], [0.05])).toThrow(RangeError)
  expect(() => adjustBounds('holm', [0.1], [NaN])).toThrow(RangeError)
  expect(() => adjustBounds('holm', [0.1], [])).toThrow(RangeError)
  expect(adjust('holm', [])).toEqual([])
  expect(adjust('hommel', [0.2], { m: 1e9 })).toEqual([1])
})

test('every procedure of the catalogue has a row and one way at most', () => {
  for (const procedure of CATALOGUE) {
    const { label, source, assumption, needs, ...way } = procedureTable[procedure]
    for (const text of [label, source, assumption, needs]) expect(text, procedure).not.toBe('')
    expect(way.adjust !== null && way.adjustInOrder !== null, procedure).toBe(false)
    if (way.adjustEach !== null) expect(way.adjust, procedure).not.toBeNull()
  }
  expect(COMPUTABLE.length).toBe(12)
  expect(TWO_STAGE).toEqual(['bky', 'bky-unscaled', 'tsbh'])
})

test('adjusted values of two conventions of the two-stage procedure call the same, each against its own level', () => {
  fc.assert(
    fc.property(vectorAndSize, ({ p, m }) => {
      const call = (procedure: CatalogueProcedure) => {
        const level = procedureTable[procedure].heldAgainst(0.05)
        return adjust(procedure, p, { m, alpha: 0.05 }).map((q) => q <= level * (1 + 1e-12))
      }
      expect(call('bky-unscaled')).toEqual(call('bky'))
    }),
    { numRuns: 300 },
  )
})
