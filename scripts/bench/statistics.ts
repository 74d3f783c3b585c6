/**
 * Prints how long the statistics of one family take, for families of 60, 200 and 20,000 tests: p-values over the
 * rounding of their statistics, bounds of adjusted values, decisions at the limits of rounding, how far each call
 * survives, and what fits the printed values. Wall time, median of 5. Reading and judging the text are not in it.
 */
import { median } from 'simple-statistics'
import {
  adjust,
  adjustBounds,
  fits,
  fitsFromStatistics,
  fitsJointly,
  pBounds,
  printedInterval,
  roundingInterval,
  survivesUpTo,
  survivesUpToByBh,
  survivesUpToByHolm,
  tail,
  type Interval,
} from '../../lib/checks'
import { createRandom } from './random'

const SIZES = [60, 200, 20_000]
const ROUNDS = 5
const ALPHA = 0.05
const DF = 57

type Test = { t: Interval; raw: Interval; printed: Interval }

const toPrinted = (p: number): Interval =>
  p < 0.001 ? printedInterval(0.001, 3, '<') : printedInterval(Number(p.toFixed(3)), 3)

/** t statistics printed with two decimals, a third of them off zero, and their Holm-adjusted p with three. */
function drawFamily(size: number): Test[] {
  const next = createRandom(20261201)
  const draw = (i: number) =>
    (i % 3 === 0 ? 2.2 : 0) + Math.sqrt(-2 * Math.log(next())) * Math.cos(2 * Math.PI * next())
  const t = Array.from({ length: size }, (_, i) => Number(draw(i).toFixed(2)))
  const adjusted = adjust(
    'holm',
    t.map((value) => tail('t', value, [DF])),
  )
  return t.map((value, i) => {
    const range = roundingInterval(value, 2)
    return {
      t: range,
      raw: pBounds('t', range.low, range.high, [DF]),
      printed: toPrinted(adjusted[i] ?? NaN),
    }
  })
}

function time(run: () => unknown): number {
  run()
  return median(
    Array.from({ length: ROUNDS }, () => {
      const start = performance.now()
      run()
      return performance.now() - start
    }),
  )
}

const PROCEDURES = ['bonferroni', 'holm', 'hochberg', 'hommel', 'bh', 'by', 'bky'] as const

function listSteps(family: readonly Test[]): [name: string, run: () => unknown][] {
  const low = family.map(({ raw }) => raw.low)
  const high = family.map(({ raw }) => raw.high)
  const raw = family.map((test) => test.raw)
  const printed = family.map((test) => test.printed)
  const statistics = family.map(({ t }) => ({ test: 't' as const, ...t, df: [DF] }))
  const bounds = adjustBounds('holm', low, high)
  const small = family.length <= 200
  return [
    ['p bounds of each t', () => family.map(({ t }) => pBounds('t', t.low, t.high, [DF]))],
    ...PROCEDURES.map((procedure): [string, () => unknown] => [
      `bounds by ${procedure}`,
      () => adjustBounds(procedure, low, high),
    ]),
    [
      'decisions',
      () =>
        bounds.low.map((from, i) => ((bounds.high[i] ?? NaN) <= ALPHA ? true : from > ALPHA ? false : null)),
    ],
    ['survives by Bonferroni', () => high.map((p) => survivesUpTo(p, ALPHA))],
    ['survives by Holm', () => survivesUpToByHolm(high, ALPHA)],
    ['survives by BH', () => survivesUpToByBh(high, ALPHA)],
    ['fits up to m + 200', () => fits(printed, raw, { mMax: family.length + 200 })],
    ...(small
      ? ([
          ['fits jointly', () => fitsJointly(printed, raw, { mMax: family.length + 200 })],
          ['fits from statistics', () => fitsFromStatistics(printed, statistics, { groupsMax: 24 })],
        ] satisfies [string, () => unknown][])
      : []),
  ]
}

console.log(`milliseconds, median of ${ROUNDS}`)
console.log('step'.padEnd(24), ...SIZES.map((size) => `${size}`.padStart(10)))
const columns = SIZES.map(
  (size) => new Map(listSteps(drawFamily(size)).map(([name, run]) => [name, time(run)])),
)
for (const name of columns[0]?.keys() ?? []) {
  const cells = columns.map((column) => (column.get(name)?.toPrecision(3) ?? '–').padStart(10))
  console.log(name.padEnd(24), ...cells)
}
