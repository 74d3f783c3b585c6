import { expect, test } from 'vitest'
import {
  adjust,
  compareProcedurePower,
  computePower,
  noncentralTBeyond,
  type ComparedDesign,
  type Procedure,
} from '@/lib/checks'

const rowsOf = (design: ComparedDesign) =>
  new Map(compareProcedurePower(design).map((row) => [row.procedure, row]))

/** The power of a two-sample test of its own at any level, 0 and 1 included. */
const powerAt = (n: number, effect: number, alpha: number) =>
  alpha <= 0 ? 0 : alpha >= 1 ? 1 : computePower({ design: 'two-sample', n, effect, alpha })

/**
 * The average power by going through every way in which the p-values can fall between the thresholds: what a procedure
 * rejects depends on that alone. `effects` first, then `nulls`.
 */
function enumeratePower(
  procedure: Procedure,
  thresholds: readonly number[],
  nulls: number,
  effects: number,
  n: number,
  effect: number,
  alpha: number,
) {
  const edges = [0, ...thresholds, 1]
  const reached = edges.map((level) => powerAt(n, effect, level))
  const cells = edges.slice(1).map((high, i) => ({
    middle: (high + (edges[i] ?? 0)) / 2,
    null: high - (edges[i] ?? 0),
    effect: (reached[i + 1] ?? 0) - (reached[i] ?? 0),
  }))
  const count = nulls + effects
  let power = 0
  for (let code = 0; code < cells.length ** count; code++) {
    const chosen = Array.from(
      { length: count },
      (_, i) => cells[Math.floor(code / cells.length ** i) % cells.length],
    )
    const chance = chosen.reduce(
      (product, cell, i) => product * ((i < effects ? cell?.effect : cell?.null) ?? 0),
      1,
    )
    const p = chosen.map((cell) => cell?.middle ?? NaN)
    const rejected = adjust(procedure, p)
      .slice(0, effects)
      .filter((value) => value <= alpha).length
    power += (chance * rejected) / effects
  }
  return power
}

test('step-wise power of independent tests is that of every way the p-values can fall', () => {
  const alpha = 0.05
  for (const [m, trueEffects] of [
    [1, 1],
    [2, 1],
    [3, 2],
    [4, 4],
    [4, 1],
    [5, 3],
  ] as const) {
    const rows = rowsOf({ design: 'independent', m, n: 20, effect: 0.8, trueEffects, alpha })
    const ranks = Array.from({ length: m }, (_, i) => i + 1)
    const steps: [Procedure, number[]][] = [
      ['holm', ranks.map((i) => alpha / (m - i + 1))],
      ['hochberg', ranks.map((i) => alpha / (m - i + 1))],
      ['holm-sidak', ranks.map((i) => 1 - (1 - alpha) ** (1 / (m - i + 1)))],
      ['bh', ranks.map((i) => (alpha * i) / m)],
    ]
    for (const [procedure, thresholds] of steps) {
      const wanted = enumeratePower(procedure, thresholds, m - trueEffects, trueEffects, 20, 0.8, alpha)
      expect(rows.get(procedure)?.power, `${procedure}, ${trueEffects} of ${m}`).toBeCloseTo(wanted, 10)
    }
  }
})

test('two independent tests with an effect: Holm and Hochberg by hand', () => {
  // With g(x) the power at level x: Holm g(α/2) + (g(α) − g(α/2)) g(α/2), Hochberg g(α/2) + (g(α) − g(α/2)) g(α).
  const rows = rowsOf({ design: 'independent', m: 2, n: 30, effect: 0.6 })
  const half = powerAt(30, 0.6, 0.025)
  const full = powerAt(30, 0.6, 0.05)
  expect(rows.get('holm')?.power).toBeCloseTo(half + (full - half) * half, 11)
  expect(rows.get('hochberg')?.power).toBeCloseTo(half + (full - half) * full, 11)
  expect(rows.get('bh')?.power).toBeCloseTo(half + (full - half) * full, 11)
  expect(rows.get('bonferroni')?.power).toBeCloseTo(half, 11)
  expect(rows.get('none')?.power).toBeCloseTo(full, 11)
})

test('what is won back stands in the order of the procedures', () => {
  for (const trueEffects of [1, 10, 20]) {
    const rows = rowsOf({ design: 'independent', m: 20, n: 40, effect: 0.7, trueEffects })
    const order = ['bonferroni', 'holm', 'hochberg', 'bh', 'none'] as const
    const powers = order.map((procedure) => rows.get(procedure)?.power ?? NaN)
    for (let i = 1; i < powers.length; i++) expect(powers[i]).toBeGreaterThan(powers[i - 1] ?? NaN)
    const sizes = order.map((procedure) => rows.get(procedure)?.nFor80 ?? NaN)
    for (let i = 1; i < sizes.length; i++) expect(sizes[i]).toBeLessThanOrEqual(sizes[i - 1] ?? NaN)
  }
})

test('all pairs of four groups: critical values seen in print, and the power at each', () => {
  // q(4, 20) = 3.96: statistics program's output in the supplement of Montgomery and Runger's textbook. The others
  // by R 4.2.2: qt(1 − .025 / 6, 20) = 2.9271, sqrt(3 qf(.95, 3, 20)) = 3.0488, qt(.975, 20) = 2.0860; power
  // 1 − pt(c, 20, ncp = √3) + pt(−c, 20, ncp = √3) for n = 6 and an effect of 1.
  const rows = rowsOf({ design: 'pairs', groups: 4, n: 6, effect: 1 })
  expect((rows.get('tukey')?.criticalValue ?? NaN) * Math.SQRT2).toBeCloseTo(3.96, 2)
  expect(rows.get('bonferroni')?.criticalValue).toBeCloseTo(2.9271, 4)
  expect(rows.get('scheffe')?.criticalValue).toBeCloseTo(3.0488, 4)
  expect(rows.get('none')?.criticalValue).toBeCloseTo(2.086, 4)
  for (const { power, criticalValue } of rows.values()) {
    if (criticalValue !== null)
      expect(power).toBeCloseTo(noncentralTBeyond(criticalValue, 20, Math.sqrt(3)), 12)
  }
  expect(rows.get('tukey')?.perTestLevel).toBeCloseTo(0.01108, 5)
})

test('three treatments and a control: Dunnett’s critical value, between Bonferroni’s and none', () => {
  // df 12, two-sided 5%: 2.6829 by double integration in R 4.2.2.
  const rows = rowsOf({ design: 'many-to-one', groups: 4, n: 4, effect: 1.5 })
  expect(rows.get('dunnett')?.criticalValue).toBeCloseTo(2.6829, 4)
  const powers = ['scheffe', 'bonferroni', 'sidak', 'dunnett', 'none'] as const
  const found = powers.map((procedure) => rows.get(procedure)?.power ?? NaN)
  for (let i = 1; i < found.length; i++) expect(found[i]).toBeGreaterThan(found[i - 1] ?? NaN)
})

test('the size for 80% is the smallest that reaches it', () => {
  for (const design of [
    { design: 'pairs', groups: 5, effect: 0.6 },
    { design: 'many-to-one', groups: 4, effect: 0.6 },
    { design: 'independent', m: 6, effect: 0.6, trueEffects: 3 },
  ] as const) {
    for (const { procedure, nFor80 } of compareProcedurePower({ ...design, n: 10 })) {
      if (nFor80 === null) continue
      const at = (n: number) => rowsOf({ ...design, n }).get(procedure)?.power ?? NaN
      expect(at(nFor80), procedure).toBeGreaterThanOrEqual(0.8)
      expect(at(nFor80 - 1), procedure).toBeLessThan(0.8)
    }
  }
})

test('Holm for dependent comparisons has bounds, and no number that would claim more', () => {
  const holm = rowsOf({ design: 'many-to-one', groups: 4, n: 20, effect: 0.8, trueEffects: 1 }).get('holm')
  const bonferroni = rowsOf({ design: 'many-to-one', groups: 4, n: 20, effect: 0.8 }).get('bonferroni')
  expect(holm?.power).toBeNull()
  expect(holm?.nFor80).toBeNull()
  expect(holm?.bounds.low).toBeCloseTo(bonferroni?.power ?? NaN, 12)
  // One effect among three: α / 3 even in the last of its steps, plus the 5% with a false rejection.
  expect(holm?.bounds.high).toBeCloseTo((bonferroni?.power ?? NaN) + 0.05, 12)
})

test('the exact power of Holm lies within the bounds that hold for any dependence', () => {
  for (const trueEffects of [1, 4, 8]) {
    const exact =
      rowsOf({ design: 'independent', m: 8, n: 25, effect: 0.8, trueEffects }).get('holm')?.power ?? NaN
    const low = powerAt(25, 0.8, 0.05 / 8)
    const high = Math.min(powerAt(25, 0.8, 0.05), powerAt(25, 0.8, 0.05 / (9 - trueEffects)) + 0.05)
    expect(exact).toBeGreaterThan(low)
    expect(exact).toBeLessThan(high)
  }
})

test('many independent tests get bounds', () => {
  const rows = rowsOf({ design: 'independent', m: 20_000, n: 40, effect: 1.2, trueEffects: 200 })
  expect(rows.get('bonferroni')?.power).toBeGreaterThan(0)
  for (const procedure of ['holm', 'hochberg', 'bh'] as const) {
    const { power, bounds } = rows.get(procedure) ?? {}
    expect(power).toBeNull()
    expect(bounds?.low).toBeLessThan(bounds?.high ?? NaN)
  }
})

test('what cannot be compared is refused', () => {
  const good = { design: 'pairs', groups: 3, n: 10, effect: 0.5 } as const
  for (const given of [
    { n: 1 },
    { n: 4.5 },
    { effect: 0 },
    { effect: NaN },
    { alpha: 0 },
    { groups: 1 },
    { groups: 2.5 },
    { trueEffects: 4 },
    { trueEffects: 0 },
  ]) {
    expect(() => compareProcedurePower({ ...good, ...given }), JSON.stringify(given)).toThrow(RangeError)
  }
  expect(() => compareProcedurePower({ design: 'independent', m: 0, n: 5, effect: 1 })).toThrow(RangeError)
})
