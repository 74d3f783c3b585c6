import { expect } from 'vitest'
import { calculate, listComputable, type Reading } from '@/lib/checks/calculate/calculate'
import { fitPrinted } from '@/lib/checks/calculate/fit-printed'
import { readValues } from '@/lib/checks/calculate/read-values'
import { writeCalculationScript, type ShownBeside } from '@/lib/checks/r-script/calculation-script'
import { familyWiseError } from '@/lib/checks/sensitivity/family-wise-error'
import { compareProcedurePower } from '@/lib/checks/sensitivity/compare-power'
import type { CatalogueProcedure } from '@/lib/checks/vocabulary'
import { runR, testWithR } from '../support/rscript'

// R computes again what the calculator shows; the lists are invented.

const nothing: ShownBeside = { correlated: null, pairs: null, power: null, fits: null }
const pairs =
  'rock – sand .62\nrock – shell .008\nrock – silt <.001\nsand – shell .019\nsand – silt t(36) = 3.31\nshell – silt r(48) = -.35, p = .013'
const overP: CatalogueProcedure[] = listComputable().filter((one) => one !== 'graphical')

function write(
  text: string,
  reading: Reading,
  family: object,
  procedures = overP,
  beside = nothing,
  sides?: 'less',
): string {
  const { entries } = readValues(text, sides ? { sides } : {})
  const calculation = calculate(entries, { alpha: 0.05, reading, procedures, family })
  return writeCalculationScript(entries, calculation, { alpha: 0.05, reading, family }, beside)
}

for (const reading of ['printed', 'exact'] as const) {
  testWithR(`R agrees with every procedure on a list whose values count as ${reading}`, () => {
    expect(runR(write(pairs, reading, { groups: 4 })).trim()).toBe('agrees')
    expect(runR(write(pairs, reading, { m: 9, weights: [0.2, 0.1, 0.05, 0.3, 0.25, 0] })).trim()).toBe(
      'agrees',
    )
  })
}

testWithR('R agrees with one-sided statistics, tiny and huge values, and a family of one', () => {
  expect(
    runR(
      write(
        't(28) = -2.05\nz = 1.2\nr(20) = -.5\nF(2, 38) = 3.60',
        'printed',
        {},
        ['holm', 'bh'],
        nothing,
        'less',
      ),
    ).trim(),
  ).toBe('agrees')
  expect(runR(write('1e-400 1e-30 0 1 0.000 >.9 ns', 'printed', {}, ['holm', 'by', 'hommel'])).trim()).toBe(
    'agrees',
  )
  expect(
    runR(
      write(
        '.03',
        'printed',
        {},
        overP.filter((one) => one !== 'shaffer'),
      ),
    ).trim(),
  ).toBe('agrees')
})

testWithR('R agrees with graphs', () => {
  const family = {
    weights: [0.5, 0.5, 0, 0],
    transitions: [
      [0, 0.5, 0.5, 0],
      [0.5, 0, 0, 0.5],
      [0, 1, 0, 0],
      [1, 0, 0, 0],
    ],
  }
  expect(runR(write('.01 .02 .005 .03', 'printed', family, ['graphical', 'fallback'])).trim()).toBe('agrees')
})

testWithR('R agrees with the error rates, the power and what was really done', () => {
  const table =
    'pair\tp\tp adj\nA\t.001\t.006\nB\t.008\t.040\nC\t.012\t.048\nD\t.021\t.063\nE\t.039\t.078\nF\t.200\t.200'
  const { entries } = readValues(table)
  for (const design of ['independent', 'pairs', 'many-to-one'] as const) {
    const shape = { n: 20, effect: 0.8, alpha: 0.05 }
    const rows =
      design === 'independent'
        ? compareProcedurePower({ design, m: 6, ...shape })
        : compareProcedurePower({ design, groups: 4, ...shape })
    const script = write(table, 'printed', {}, ['holm'], {
      correlated: { rho: 0.5, error: familyWiseError(0.05, 6, { rho: 0.5 }) },
      pairs: { groups: 4, error: familyWiseError(0.05, 6, { allPairsOf: 4 }) },
      power: { design, groups: design === 'independent' ? null : 4, rows, ...shape },
      fits: { found: fitPrinted(entries, 'printed').fits, upTo: 60 },
    })
    expect(runR(script).trim()).toBe('agrees')
  }
})

testWithR('R tells a number that was changed', () => {
  const { entries } = readValues(pairs)
  const calculation = calculate(entries, { alpha: 0.05, reading: 'printed', procedures: ['holm'] })
  const [holm] = calculation.results
  if (holm?.adjusted[1]) holm.adjusted[1] = { low: 0.9, high: 0.95 }
  const script = writeCalculationScript(
    entries,
    calculation,
    { alpha: 0.05, reading: 'printed', family: {} },
    nothing,
  )
  expect(() => runR(`${script}`)).toThrow(/ended with 1/)
})

testWithR('a name that looks like R does nothing there', () => {
  const list = '"); stop("x") # 0.02\n\'`\\n${1} .03\n€ “Ω” .04'
  expect(runR(write(list, 'printed', {}, ['holm'])).trim()).toBe('agrees')
})
