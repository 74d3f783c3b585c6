import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjust, adjustBounds, fits, fitsJointly, type Fit, type Interval } from '@/lib/checks'

// Against a search that knows nothing of orders: a step-wise procedure is piecewise linear in the raw p-values, so that
// if any vector of the box fits, one fits whose values are ends of intervals or what a step takes to such an end.
const MULTIPLES = ['bonferroni', 'holm', 'hochberg', 'bh'] as const

/** A raw value and its print: both rounded, to two or three decimals. */
const rounded = (value: number, decimals: number): Interval => {
  const units = Math.round(value * 10 ** decimals)
  const half = 10 ** decimals * 2
  return { low: Math.max(0, (2 * units - 1) / half), high: Math.min(1, (2 * units + 1) / half) }
}
const smallP = fc.double({ min: 0.0005, max: 0.06, noNaN: true })

function listMarks(printed: readonly Interval[], raw: Interval, m: number): number[] {
  const factors = printed.flatMap((_, i) => [m, m - i, m / (i + 1)])
  const ends = printed.flatMap(({ low, high }) => [low, high])
  const reached = ends.flatMap((end) => factors.map((factor) => end / factor))
  return [...new Set([raw.low, raw.high, ...reached])].filter((p) => p >= raw.low && p <= raw.high)
}

function search(printed: readonly Interval[], raw: readonly Interval[], { procedure, m }: Fit): boolean {
  const points = raw.reduce<number[][]>(
    (rows, box) => rows.flatMap((row) => listMarks(printed, box, m).map((p) => [...row, p])),
    [[]],
  )
  return points.some((point) => holds(printed, point, { procedure, m }))
}

function holds(printed: readonly Interval[], point: readonly number[], { procedure, m }: Fit): boolean {
  const adjusted = procedure === 'raw' ? point : adjust(procedure, point, { m })
  return printed.every(
    ({ low, high }, i) => (adjusted[i] ?? NaN) >= low - 1e-9 && (adjusted[i] ?? NaN) <= high + 1e-9,
  )
}

const family = fc.record({
  p: fc.array(smallP, { minLength: 1, maxLength: 3 }),
  procedure: fc.constantFrom(...MULTIPLES),
  decimals: fc.array(fc.constantFrom(2, 3), { minLength: 3, maxLength: 3 }),
  at: fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 3, maxLength: 3 }),
})

test('joint fits are those that a search of the box finds, and are never left out wrongly', () => {
  let excluded = 0
  let open = 0
  fc.assert(
    fc.property(family, ({ p, procedure, decimals, at }) => {
      const raw = p.map((value, i) => rounded(value, decimals[i] ?? 3))
      // each printed value from anywhere in its own bounds: it fits by itself, but often not with the others
      const { low, high } = adjustBounds(
        procedure,
        raw.map((box) => box.low),
        raw.map((box) => box.high),
      )
      const printed = low.map((from, i) => rounded(from + (at[i] ?? 0) * ((high[i] ?? 1) - from), 3))
      const options = { mMax: p.length + 2 }
      const joint = fitsJointly(printed, raw, options)
      for (const fit of fits(printed, raw, options)) {
        if (!MULTIPLES.some((name) => name === fit.procedure)) continue
        const kept = joint.find((one) => one.procedure === fit.procedure && one.m === fit.m)
        const found = search(printed, raw, fit)
        if (found) expect(kept, `${fit.procedure} ${fit.m}`).toBeDefined()
        else expect(kept?.witness ?? null, `${fit.procedure} ${fit.m}`).toBeNull()
        if (kept === undefined) excluded++
        if (kept?.witness === null) open++
      }
    }),
    { numRuns: 300, seed: 1201 },
  )
  expect(excluded).toBeGreaterThan(10)
  expect(open).toBeGreaterThan(0)
})

test('value by value, fits are those of a search over every procedure and every size', () => {
  const PROCEDURES = ['bonferroni', 'sidak', 'holm', 'holm-sidak', 'hochberg', 'hommel', 'bh', 'by'] as const
  fc.assert(
    fc.property(family, fc.nat(3), ({ p, procedure, decimals }, more) => {
      const raw = p.map((value, i) => rounded(value, decimals[i] ?? 3))
      const printed = adjust(procedure, p, { m: p.length + more }).map((value) => rounded(value, 3))
      const low = raw.map((box) => box.low)
      const high = raw.map((box) => box.high)
      const wanted = PROCEDURES.flatMap((name) =>
        Array.from({ length: 41 - p.length }, (_, i) => p.length + i).flatMap((m) => {
          const bounds = adjustBounds(name, low, high, { m })
          const all = printed.every(
            (print, i) =>
              print.low <= (bounds.high[i] ?? NaN) + 1e-12 && (bounds.low[i] ?? NaN) <= print.high + 1e-12,
          )
          return all ? [`${name} ${m}`] : []
        }),
      )
      const found = fits(printed, raw, { mMax: 40 }).filter((fit) => fit.procedure !== 'raw')
      expect(found.map((fit) => `${fit.procedure} ${fit.m}`)).toEqual(wanted)
    }),
    { numRuns: 150 },
  )
})

test('every witness lies in its box and gives every printed value', () => {
  const larger = fc.record({
    p: fc.array(smallP, { minLength: 1, maxLength: 12 }),
    procedure: fc.constantFrom('sidak', 'holm', 'holm-sidak', 'hochberg', 'hommel', 'bh', 'by', 'bonferroni'),
    more: fc.nat(4),
  })
  fc.assert(
    fc.property(larger, ({ p, procedure, more }) => {
      const m = p.length + more
      const raw = p.map((value) => rounded(value, 3))
      const printed = adjust(procedure, p, { m }).map((value) => rounded(value, 3))
      const joint = fitsJointly(printed, raw, { mMax: m + 3 })
      const truth = joint.find((one) => one.procedure === procedure && one.m === m)
      expect(truth).toBeDefined()
      // values of the same precision have an order: what was done is proven
      if (procedure !== 'hommel') expect(truth?.witness).not.toBeNull()
      for (const { witness, ...fit } of joint) {
        if (witness === null) continue
        expect(holds(printed, witness, fit)).toBe(true)
        witness.forEach((value, i) => {
          expect(value).toBeGreaterThanOrEqual(raw[i]?.low ?? NaN)
          expect(value).toBeLessThanOrEqual(raw[i]?.high ?? NaN)
        })
      }
    }),
    { numRuns: 300 },
  )
})

test('Bonferroni fits at once whenever it fits value by value; unknown items stay out of the witness', () => {
  const printed = [rounded(0.03, 2), { low: NaN, high: NaN }, rounded(0.12, 2)]
  const raw = [rounded(0.01, 3), rounded(0.5, 3), rounded(0.04, 3)]
  const joint = fitsJointly(printed, raw)
  const sizes = (list: readonly Fit[]) =>
    list.filter(({ procedure }) => procedure === 'bonferroni').map(({ m }) => m)
  expect(sizes(joint)).toEqual(sizes(fits(printed, raw)))
  expect(joint.find(({ procedure }) => procedure === 'bonferroni')?.witness?.[1]).toBeNaN()
})

test('printed values in another order than the raw intervals suggest are not left out', () => {
  // Worked by hand, Benjamini–Hochberg of two: .006 and .015 lie in their overlapping intervals and give .012 and .015.
  const printed = [
    { low: 0.0145, high: 0.0155 },
    { low: 0.0115, high: 0.0125 },
  ]
  const raw = [
    { low: 0.005, high: 0.015 },
    { low: 0.006, high: 0.016 },
  ]
  const found = fitsJointly(printed, raw).find(({ procedure, m }) => procedure === 'bh' && m === 2)
  expect(found?.witness?.[0]).toBeGreaterThan(found?.witness?.[1] ?? NaN)
})

test('Holm that fits each value but not all at once is left out', () => {
  // Worked by hand: raw .01 and .02, each ±.005, so that 2 p(1) lies in .01 … .03 and max(2 p(1), p(2)) in .015 … .03.
  // Printed .030 for the first asks for p(1) = .015, printed .020 for the second forbids more than .010.
  const printed = [
    { low: 0.0295, high: 0.0305 },
    { low: 0.0195, high: 0.0205 },
  ]
  const raw = [
    { low: 0.005, high: 0.015 },
    { low: 0.015, high: 0.025 },
  ]
  const isHolm = ({ procedure, m }: Fit) => procedure === 'holm' && m === 2
  expect(fits(printed, raw).some(isHolm)).toBe(true)
  expect(fitsJointly(printed, raw).some(isHolm)).toBe(false)
})
