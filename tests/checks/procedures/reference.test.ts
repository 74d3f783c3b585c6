import { expect, test } from 'vitest'
import { adjust, type Procedure } from '@/lib/checks'
import { countRejected } from '@/lib/checks/procedures/two-stage'
import { differ, readReference, toNumber, type Printed } from '../reference'

// R 4.2.2, stats::p.adjust; Šidák, Holm–Šidák, two-stage and Storey by formula in R, compared with a second
// implementation (headers of the files). Tolerance here: 1e-12 relative.
const TOLERANCE = 1e-12

const NAMES: Record<string, Procedure> = {
  bonferroni: 'bonferroni',
  holm: 'holm',
  hochberg: 'hochberg',
  hommel: 'hommel',
  BH: 'bh',
  BY: 'by',
  sidak: 'sidak',
  'holm-sidak': 'holm-sidak',
}

type Vector = {
  kind: string
  length: number
  n: number | null
  p: Printed[]
  adjusted: Record<string, Printed[]>
  storey_lambda05?: { pi0: Printed; q: Printed[] }
  twostage?: {
    alpha: number
    bky: Printed[]
    bky_r1: number
    bky_m0: number
    tsbh: Printed[]
    tsbh_r1: number
    tsbh_m0: number
  }[]
  reject_count_at?: ({ alpha: number } & Record<string, number>)[]
}

type Large = {
  at_index: number[]
  sum: number
  sum_of_squares: number
  min: number
  max: number
  count_le: Record<string, number>
}

const { vectors } = readReference<{ vectors: Vector[] }>('padjust.json')
const big = readReference<{
  p: number[]
  index: number[]
  adjusted: Record<string, Large>
  storey_lambda05: Large & { pi0: number }
  bky_alpha05: Large & { r1: number; m0: number }
}>('padjust_20000.json')

for (const [name, procedure] of Object.entries(NAMES)) {
  test(`${procedure} agrees with R on every reference vector`, () => {
    expect(vectors.length).toBeGreaterThanOrEqual(200)
    for (const { kind, n, p, adjusted } of vectors) {
      const found = adjust(procedure, p.map(toNumber), n === null ? {} : { m: n })
      expect(differ(found, adjusted[name] ?? []), `${kind}, length ${p.length}, n ${n}`).toBeLessThan(
        TOLERANCE,
      )
    }
  })
}

test('the two-stage procedures agree with R at three levels on every vector, in all three conventions', () => {
  let compared = 0
  for (const { kind, p, twostage } of vectors) {
    const values = p.map(toNumber)
    const sorted = Float64Array.from(values.filter((value) => !Number.isNaN(value))).sort()
    for (const { alpha, bky, bky_r1, bky_m0, tsbh, tsbh_r1, tsbh_m0 } of twostage ?? []) {
      const where = `${kind}, length ${p.length}, alpha ${alpha}`
      expect(differ(adjust('bky', values, { alpha }), bky), where).toBeLessThan(TOLERANCE)
      expect(differ(adjust('tsbh', values, { alpha }), tsbh), where).toBeLessThan(TOLERANCE)
      const m = sorted.length
      expect(countRejected(sorted, m, alpha / (1 + alpha)), where).toBe(bky_r1)
      expect(countRejected(sorted, m, alpha), where).toBe(tsbh_r1)
      // BH (m0 / m) with the reference's m0, uncapped: the convention without the factor
      const share = m === 0 ? NaN : bky_m0 / m
      const unscaled = adjust('bh', values).map((q) => q * share)
      expect(differ(adjust('bky-unscaled', values, { alpha }), unscaled), where).toBeLessThan(TOLERANCE)
      expect(tsbh_m0, where).toBe(tsbh_r1 === 0 || tsbh_r1 === m ? m : m - tsbh_r1)
      compared++
    }
  }
  expect(compared).toBeGreaterThanOrEqual(600)
})

test('as many adjusted values are at most alpha as in R, but for those at alpha to the last bit', () => {
  let compared = 0
  for (const { kind, p, reject_count_at } of vectors) {
    for (const counts of reject_count_at ?? []) {
      for (const [name, procedure] of Object.entries(NAMES)) {
        const adjusted = adjust(procedure, p.map(toNumber))
        const least = adjusted.filter((value) => value <= counts.alpha * (1 - 1e-12)).length
        const most = adjusted.filter((value) => value <= counts.alpha * (1 + 1e-12)).length
        const wanted = counts[name] ?? NaN
        expect(least <= wanted && wanted <= most, `${procedure}, ${kind}, alpha ${counts.alpha}`).toBe(true)
        compared++
      }
    }
  }
  expect(compared).toBeGreaterThanOrEqual(4800)
})

test('Storey’s q-values agree with R on every vector', () => {
  let compared = 0
  for (const { kind, p, storey_lambda05 } of vectors) {
    if (storey_lambda05 === undefined) continue
    const q = adjust('storey', p.map(toNumber))
    expect(differ(q, storey_lambda05.q), kind).toBeLessThan(TOLERANCE)
    const scaled = adjust('bh', p.map(toNumber)).map((value) => value * toNumber(storey_lambda05.pi0))
    expect(differ(q, scaled), kind).toBeLessThan(TOLERANCE)
    compared++
  }
  expect(compared).toBeGreaterThanOrEqual(200)
})

test('of 20,000 p-values as many are rejected in the first stage, and as many taken for true, as in R', () => {
  const sorted = Float64Array.from(big.p).sort()
  const rejected = countRejected(sorted, sorted.length, 0.05 / 1.05)
  expect(rejected).toBe(big.bky_alpha05.r1)
  expect(sorted.length - rejected).toBe(big.bky_alpha05.m0)
  const scaled = adjust('bh', big.p).map((q) => q * big.storey_lambda05.pi0)
  expect(differ(adjust('storey', big.p), scaled)).toBeLessThan(TOLERANCE)
})

test('20,000 p-values agree with R at 609 places and in their sums', () => {
  const expected: [Procedure, Large][] = [
    ...Object.entries(NAMES).map(([name, procedure]): [Procedure, Large] => [
      procedure,
      big.adjusted[name] as Large,
    ]),
    ['storey', big.storey_lambda05],
    ['bky', big.bky_alpha05],
  ]
  expect(big.p.length).toBe(20_000)
  for (const [procedure, { at_index, sum, sum_of_squares, min, max, count_le }] of expected) {
    const found = adjust(procedure, big.p)
    const places = big.index.map((position) => found[position - 1] ?? NaN)
    expect(differ(places, at_index), procedure).toBeLessThan(TOLERANCE)
    const sums = [found.reduce((a, b) => a + b, 0), found.reduce((a, b) => a + b * b, 0)]
    expect(differ(sums, [sum, sum_of_squares]), procedure).toBeLessThan(1e-11)
    expect(differ([Math.min(...found), Math.max(...found)], [min, max]), procedure).toBeLessThan(TOLERANCE)
    for (const [level, count] of Object.entries(count_le)) {
      expect(found.filter((value) => value <= Number(level)).length, `${procedure} at ${level}`).toBe(count)
    }
  }
})
