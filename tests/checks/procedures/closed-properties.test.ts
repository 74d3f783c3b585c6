import fc from 'fast-check'
import { expect, test } from 'vitest'
import { adjust, adjustShafferS2, listPairs } from '@/lib/checks'

// Closed testing by brute force: every intersection of up to eight hypotheses, its weights worked out here anew.
const pValue = fc.oneof(
  fc.double({ min: 0, max: 1, noNaN: true }),
  fc.double({ min: 0, max: 0.1, noNaN: true }),
  fc.integer({ min: 0, max: 50 }).map((n) => n / 1000),
)
const vector = (maxLength: number) => fc.array(pValue, { minLength: 1, maxLength })

/** Weights with a sum of at most 1, some of them 0. */
const shares = (size: number) =>
  fc
    .array(fc.oneof(fc.constant(0), fc.double({ min: 0.01, max: 1, noNaN: true })), {
      minLength: size,
      maxLength: size,
    })
    .chain((raw) => fc.constantFrom(1, 0.7).map((total) => scale(raw, total)))
function scale(raw: readonly number[], total: number): number[] {
  const sum = raw.reduce((a, b) => a + b, 0)
  return raw.map((value) => (sum === 0 ? 0 : (value / sum) * total))
}

const weighted = vector(8).chain((p) => fc.record({ p: fc.constant(p), weights: shares(p.length) }))
const graph = vector(6).chain((p) =>
  fc.record({
    p: fc.constant(p),
    weights: shares(p.length),
    transitions: fc.tuple(
      ...p.map((_, i) => shares(p.length - 1).map((row) => [...row.slice(0, i), 0, ...row.slice(i)])),
    ),
  }),
)

type Local = (members: readonly number[]) => number

/** The largest local p-value among all intersections that hold hypothesis i. */
function closeBy(size: number, local: Local, allowed: (members: readonly number[]) => boolean = () => true) {
  const adjusted = new Array<number>(size).fill(0)
  for (let subset = 1; subset < 1 << size; subset++) {
    const members = adjusted.flatMap((_, i) => ((subset >> i) & 1 ? [i] : []))
    if (!allowed(members)) continue
    const value = Math.min(1, local(members))
    for (const i of members) adjusted[i] = Math.max(adjusted[i] ?? 0, value)
  }
  return adjusted
}

const expectSame = (found: readonly number[], wanted: readonly number[]) => {
  expect(found.length).toBe(wanted.length)
  found.forEach((value, i) => expect(Math.abs(value - (wanted[i] ?? NaN))).toBeLessThan(1e-12))
}
const expectAtMost = (lower: readonly number[], upper: readonly number[]) =>
  lower.forEach((value, i) => expect(value).toBeLessThanOrEqual((upper[i] ?? NaN) + 1e-12))
const inTurn = (p: number, weight: number) => (weight > 0 ? p / weight : Infinity)

test('Holm is closed testing with Bonferroni’s local tests', () => {
  fc.assert(
    fc.property(vector(8), (p) => {
      const local: Local = (members) => members.length * Math.min(...members.map((i) => p[i] ?? NaN))
      expectSame(adjust('holm', p), closeBy(p.length, local))
    }),
    { numRuns: 200 },
  )
})

test('Hommel is closed testing with Simes’s local tests, and Hochberg is nowhere below it', () => {
  fc.assert(
    fc.property(vector(8), (p) => {
      const local: Local = (members) => {
        const sorted = members.map((i) => p[i] ?? NaN).sort((a, b) => a - b)
        return Math.min(...sorted.map((value, i) => (sorted.length * value) / (i + 1)))
      }
      const closed = closeBy(p.length, local)
      expectSame(adjust('hommel', p), closed)
      expectAtMost(closed, adjust('hochberg', p))
    }),
    { numRuns: 200 },
  )
})

test('weighted Holm is the closure of weighted Bonferroni with weights in proportion', () => {
  fc.assert(
    fc.property(weighted, ({ p, weights }) => {
      const rest = Math.max(0, 1 - weights.reduce((a, b) => a + b, 0))
      const local: Local = (members) => {
        const held = members.reduce((sum, i) => sum + (weights[i] ?? 0), rest)
        return Math.min(
          ...members.map((i) => (p[i] === 0 ? 0 : ((p[i] ?? NaN) / (weights[i] ?? NaN)) * held)),
        )
      }
      // without any weight in the intersection 0 / 0 is no level: nothing but p = 0 is rejected
      const known: Local = (members) => {
        const value = local(members)
        return Number.isNaN(value) ? (members.some((i) => p[i] === 0) ? 0 : 1) : value
      }
      expectSame(adjust('weighted-holm', p, { weights }), closeBy(p.length, known))
    }),
    { numRuns: 200 },
  )
})

test('fallback is closed testing in which weight moves on to the next member', () => {
  fc.assert(
    fc.property(weighted, ({ p, weights }) => {
      const local: Local = (members) =>
        Math.min(
          ...members.map((i, place) => {
            const since = weights.slice((members[place - 1] ?? -1) + 1, i + 1).reduce((a, b) => a + b, 0)
            return inTurn(p[i] ?? NaN, since)
          }),
        )
      expectSame(adjust('fallback', p, { weights }), closeBy(p.length, local))
    }),
    { numRuns: 200 },
  )
})

/** The weights of an intersection, by taking out of the graph what does not belong to it. */
function weightsOf(
  members: readonly number[],
  weights: readonly number[],
  rows: readonly (readonly number[])[],
) {
  let w = [...weights]
  let g = rows.map((row) => [...row])
  const left = new Set(w.keys())
  const at = (i: number, j: number) => g[i]?.[j] ?? 0
  for (const j of w.keys()) {
    if (members.includes(j)) continue
    left.delete(j)
    w = w.map((value, l) => (left.has(l) ? value + (w[j] ?? 0) * at(j, l) : value))
    g = g.map((row, l) =>
      row.map((value, k) => {
        if (!left.has(l) || !left.has(k)) return value
        if (l === k) return 0
        const back = at(l, j) * at(j, l)
        return back < 1 ? (value + at(l, j) * at(j, k)) / (1 - back) : 0
      }),
    )
  }
  return w
}

test('the graphical procedure is closed testing with the weights of the reduced graph', () => {
  fc.assert(
    fc.property(graph, ({ p, weights, transitions }) => {
      const local: Local = (members) => {
        const w = weightsOf(members, weights, transitions)
        return Math.min(...members.map((i) => inTurn(p[i] ?? NaN, w[i] ?? 0)))
      }
      expectSame(adjust('graphical', p, { weights, transitions }), closeBy(p.length, local))
    }),
    { numRuns: 300 },
  )
})

test('the graphical procedure is closed testing for graphs of eight', () => {
  const eight = fc.record({
    p: fc.array(pValue, { minLength: 8, maxLength: 8 }),
    weights: shares(8),
    transitions: fc.tuple(
      ...Array.from({ length: 8 }, (_, i) =>
        shares(7).map((row) => [...row.slice(0, i), 0, ...row.slice(i)]),
      ),
    ),
  })
  fc.assert(
    fc.property(eight, ({ p, weights, transitions }) => {
      const local: Local = (members) => {
        const w = weightsOf(members, weights, transitions)
        return Math.min(...members.map((i) => inTurn(p[i] ?? NaN, w[i] ?? 0)))
      }
      expectSame(adjust('graphical', p, { weights, transitions }), closeBy(8, local))
    }),
    { numRuns: 20 },
  )
})

const rowsOf = (size: number, fill: (i: number, j: number) => number) =>
  Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => fill(i, j)))

test('Holm, fixed sequence and fallback are graphs', () => {
  fc.assert(
    fc.property(weighted, ({ p, weights }) => {
      const n = p.length
      const apart = rowsOf(n, (i, j) => (i === j ? 0 : 1 / (n - 1)))
      expectSame(adjust('graphical', p, { transitions: apart }), adjust('holm', p))
      const chain = rowsOf(n, (i, j) => (j === i + 1 ? 1 : 0))
      expectSame(adjust('graphical', p, { weights, transitions: chain }), adjust('fallback', p, { weights }))
      const first = p.map((_, i) => (i === 0 ? 1 : 0))
      expectSame(adjust('graphical', p, { weights: first, transitions: chain }), adjust('fixed-sequence', p))
      expectSame(adjust('fallback', p, { weights: first }), adjust('fixed-sequence', p))
    }),
    { numRuns: 200 },
  )
})

test('equal weights give the unweighted procedures, also in a family that is not all shown', () => {
  fc.assert(
    fc.property(vector(12), fc.nat(20), (p, more) => {
      const m = p.length + more
      expectSame(adjust('weighted-bonferroni', p, { m }), adjust('bonferroni', p, { m }))
      expectSame(adjust('weighted-holm', p, { m }), adjust('holm', p, { m }))
      const weights = p.map(() => 1 / m)
      expectSame(adjust('weighted-bonferroni', p, { weights }), adjust('bonferroni', p, { m }))
      expectSame(adjust('weighted-holm', p, { weights }), adjust('holm', p, { m }))
      expectAtMost(adjust('fallback', p, { m }), adjust('bonferroni', p, { m }))
    }),
    { numRuns: 200 },
  )
})

test('the order of hypotheses with their weights does not matter to weighted Bonferroni, weighted Holm and graphs', () => {
  fc.assert(
    fc.property(graph, ({ p, weights, transitions }) => {
      const turn = <T>(list: readonly T[]) => list.toReversed()
      const turned = { weights: turn(weights), transitions: turn(transitions).map(turn) }
      for (const procedure of ['weighted-bonferroni', 'weighted-holm'] as const) {
        const found = adjust(procedure, turn(p), { weights: turned.weights })
        expectSame(turn(found), adjust(procedure, p, { weights }))
      }
      expectSame(turn(adjust('graphical', turn(p), turned)), adjust('graphical', p, { weights, transitions }))
    }),
  )
})

test('adjusted values lie between the raw value and 1, and none falls where a p grows', () => {
  fc.assert(
    fc.property(graph, fc.nat(), fc.double({ min: 0, max: 1, noNaN: true }), (item, pick, share) => {
      const { p, weights, transitions } = item
      const grown = p.map((value, i) => (i === pick % p.length ? value + share * (1 - value) : value))
      for (const [procedure, options] of [
        ['weighted-bonferroni', { weights }],
        ['weighted-holm', { weights }],
        ['fixed-sequence', {}],
        ['fallback', { weights }],
        ['graphical', { weights, transitions }],
        ['shaffer', { groups: 4 }],
      ] as const) {
        const adjusted = adjust(procedure, p, options)
        expectAtMost(p, adjusted)
        expect(Math.max(...adjusted)).toBeLessThanOrEqual(1)
        expectAtMost(adjusted, adjust(procedure, grown, options))
      }
    }),
    { numRuns: 300 },
  )
})

const pairs = fc.integer({ min: 2, max: 5 }).chain((groups) =>
  fc.record({
    groups: fc.constant(groups),
    p: fc.array(pValue, { minLength: 1, maxLength: (groups * (groups - 1)) / 2 }),
  }),
)

test('Shaffer’s S2 is at most S1, and S1 at most Holm for all pairs', () => {
  fc.assert(
    fc.property(pairs, ({ groups, p }) => {
      const s1 = adjust('shaffer', p, { groups })
      const s2 = adjustShafferS2(p, listPairs(groups).slice(0, p.length), groups)
      expectAtMost(p, s2)
      expectAtMost(s2, s1)
      expectAtMost(s1, adjust('holm', p, { m: (groups * (groups - 1)) / 2 }))
      const turned = adjust('shaffer', p.toReversed(), { groups }).toReversed()
      expect(turned).toEqual(s1)
    }),
    { numRuns: 300 },
  )
})

test('S2 is nowhere below closed testing with Bonferroni over the sets of pairs that can be equal at once', () => {
  // Four groups: a set of pairs can be equal alone if and only if it is closed under "equal to the same".
  const all = listPairs(4)
  const closed = (members: readonly number[]) => {
    const equal = (a: number, b: number) =>
      members.some((i) => all[i]?.[0] === Math.min(a, b) && all[i]?.[1] === Math.max(a, b))
    return [0, 1, 2, 3].every((a) =>
      [0, 1, 2, 3].every((b) =>
        [0, 1, 2, 3].every((c) => a === c || !equal(a, b) || !equal(b, c) || equal(a, c)),
      ),
    )
  }
  fc.assert(
    fc.property(fc.array(pValue, { minLength: 6, maxLength: 6 }), (p) => {
      const local: Local = (members) => members.length * Math.min(...members.map((i) => p[i] ?? NaN))
      expectAtMost(closeBy(6, local, closed), adjustShafferS2(p, all, 4))
    }),
    { numRuns: 200 },
  )
})

test('in procedures that work in order an unknown value holds its place and its weight', () => {
  const options = { weights: [0.5, 0.3, 0.2] }
  expect(adjust('fixed-sequence', [0.01, NaN, 0.02])).toEqual([0.01, NaN, 1])
  expect(adjust('fallback', [0.01, NaN, 0.02], options)).toEqual([0.02, NaN, 0.02 / 0.2])
  expect(adjust('weighted-holm', [0.01, NaN, 0.02], options)).toEqual([0.02, NaN, expect.closeTo(0.05, 12)])
  expect(adjust('weighted-bonferroni', [0, 0.01, NaN], { weights: [0, 0, 1] })).toEqual([0, 1, NaN])
})

test('weights, graphs and groups that do not fit are refused', () => {
  const p = [0.01, 0.2]
  expect(() => adjust('weighted-holm', p, { weights: [0.6, 0.6] })).toThrow(/more than 1/)
  expect(() => adjust('weighted-holm', p, { weights: [1] })).toThrow(RangeError)
  expect(() => adjust('weighted-holm', p, { weights: [-0.1, 0.5] })).toThrow(RangeError)
  expect(() => adjust('weighted-holm', p, { weights: [NaN, 0.5] })).toThrow(RangeError)
  expect(() => adjust('holm', p, { weights: [0.5, 0.5] })).toThrow(/Holm takes no weights/)
  expect(() => adjust('fallback', p, { groups: 3 })).toThrow(RangeError)
  expect(() => adjust('fallback', p, { m: 1 })).toThrow(RangeError)
  const graphOf = (transitions: number[][]) => () => adjust('graphical', p, { transitions })
  expect(() => adjust('graphical', p)).toThrow(RangeError)
  expect(graphOf([[0, 1]])).toThrow(RangeError)
  expect(
    graphOf([
      [0.5, 0.5],
      [1, 0],
    ]),
  ).toThrow(/diagonal/)
  expect(
    graphOf([
      [0, 1.5],
      [1, 0],
    ]),
  ).toThrow(RangeError)
  expect(() =>
    adjust('graphical', [0.1, 0.1, 0.1], {
      transitions: [
        [0, 0.7, 0.7],
        [0, 0, 1],
        [1, 0, 0],
      ],
    }),
  ).toThrow(/more than 1/)
  expect(() => adjust('shaffer', p)).toThrow(RangeError)
  expect(() => adjust('shaffer', p, { groups: 2 })).toThrow(RangeError)
  expect(() => adjust('shaffer', p, { groups: 3.5 })).toThrow(RangeError)
  expect(() => adjust('shaffer', p, { groups: 4, m: 5 })).toThrow(RangeError)
  expect(() =>
    adjustShafferS2(
      p,
      [
        [0, 1],
        [1, 0],
      ],
      3,
    ),
  ).toThrow(/stands twice/)
  expect(() =>
    adjustShafferS2(
      p,
      [
        [0, 1],
        [1, 3],
      ],
      3,
    ),
  ).toThrow(RangeError)
  expect(() => adjustShafferS2(p, [[0, 1]], 3)).toThrow(RangeError)
  expect(() =>
    adjustShafferS2(
      p,
      [
        [0, 1],
        [1, 2],
      ],
      9,
    ),
  ).toThrow(RangeError)
  expect(() => adjustShafferS2([1.1], [[0, 1]], 3)).toThrow(RangeError)
})
