import { expect, test } from 'vitest'
import { adjust, type Procedure } from '@/lib/checks'
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
  twostage?: { alpha: number; bky: Printed[] }[]
}

type Large = { at_index: number[]; sum: number; sum_of_squares: number; min: number; max: number }

const { vectors } = readReference<{ vectors: Vector[] }>('padjust.json')
const big = readReference<
  { p: number[]; index: number[]; adjusted: Record<string, Large> } & Record<
    'storey_lambda05' | 'bky_alpha05',
    Large
  >
>('padjust_20000.json')

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

test('the two-stage procedure agrees with R at three levels on every vector', () => {
  let compared = 0
  for (const { kind, p, twostage } of vectors) {
    for (const { alpha, bky } of twostage ?? []) {
      const found = adjust('bky', p.map(toNumber), { alpha })
      expect(differ(found, bky), `${kind}, length ${p.length}, alpha ${alpha}`).toBeLessThan(TOLERANCE)
      compared++
    }
  }
  expect(compared).toBeGreaterThanOrEqual(600)
})

test('Storey’s q-values agree with R on every vector', () => {
  let compared = 0
  for (const { kind, p, storey_lambda05 } of vectors) {
    if (storey_lambda05 === undefined) continue
    expect(differ(adjust('storey', p.map(toNumber)), storey_lambda05.q), kind).toBeLessThan(TOLERANCE)
    compared++
  }
  expect(compared).toBeGreaterThanOrEqual(200)
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
  for (const [procedure, { at_index, sum, sum_of_squares, min, max }] of expected) {
    const found = adjust(procedure, big.p)
    const places = big.index.map((position) => found[position - 1] ?? NaN)
    expect(differ(places, at_index), procedure).toBeLessThan(TOLERANCE)
    const sums = [found.reduce((a, b) => a + b, 0), found.reduce((a, b) => a + b * b, 0)]
    expect(differ(sums, [sum, sum_of_squares]), procedure).toBeLessThan(1e-11)
    expect(differ([Math.min(...found), Math.max(...found)], [min, max]), procedure).toBeLessThan(TOLERANCE)
  }
})
