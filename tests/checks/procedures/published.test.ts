import { expect, test } from 'vitest'
import { adjust, type Procedure } from '@/lib/checks'

const expectClose = (found: readonly number[], wanted: readonly number[], digits: number) => {
  expect(found.length).toBe(wanted.length)
  found.forEach((value, i) => expect(value).toBeCloseTo(wanted[i] ?? NaN, digits))
}
const countKept = (procedure: Procedure, p: readonly number[], alpha = 0.05) =>
  adjust(procedure, p, { alpha }).filter((value) => value <= alpha).length

// Benjamini and Hochberg (1995), J R Stat Soc B 57, 289–300: fifteen p-values of a trial of thrombolysis in myocardial
// infarction. The vector, the four rejections by their procedure and the three by Bonferroni: read second hand in
// public test code that quotes the paper. Adjusted values: R 4.2.2.
const THROMBOLYSIS = [
  0.0001, 0.0004, 0.0019, 0.0095, 0.0201, 0.0278, 0.0298, 0.0344, 0.0459, 0.324, 0.4262, 0.5719, 0.6528,
  0.759, 1,
]

test('of the fifteen p-values of Benjamini and Hochberg 1995 theirs rejects four and Bonferroni three', () => {
  expect(countKept('bh', THROMBOLYSIS)).toBe(4)
  expect(countKept('bonferroni', THROMBOLYSIS)).toBe(3)
  // From memory: the paper says that Hochberg's procedure rejects the same three. R agrees, for the others too.
  for (const procedure of ['hochberg', 'holm', 'hommel', 'by'] as const) {
    expect(countKept(procedure, THROMBOLYSIS), procedure).toBe(3)
  }
})

test('their adjusted values are R’s', () => {
  const bh = [0.0015, 0.003, 0.0095, 0.035625, 0.0603, 0.063857, 0.063857, 0.0645, 0.0765]
  expectClose(adjust('bh', THROMBOLYSIS), [...bh, 0.486, 0.581182, 0.714875, 0.753231, 0.813214, 1], 6)
  const holm = [0.0015, 0.0056, 0.0247, 0.114, 0.2211, 0.278, 0.278, 0.278, 0.3213]
  expectClose(adjust('holm', THROMBOLYSIS), [...holm, ...new Array<number>(6).fill(1)], 4)
  const hommel = [0.0015, 0.0056, 0.0247, 0.095, 0.1608, 0.1946, 0.2086, 0.2408, 0.3213]
  expectClose(adjust('hommel', THROMBOLYSIS), [...hommel, ...new Array<number>(6).fill(1)], 4)
})

test('the two-stage procedure rejects eight of them; its values are those of a public help page times 1 + alpha', () => {
  // Read second hand: a package's help page prints these without the factor 1 + alpha.
  const page = [
    0.0011, 0.0022, 0.006966667, 0.026125, 0.04422, 0.046828571, 0.046828571, 0.0473, 0.0561, 0.3564,
  ]
  const rest = [0.4262, 0.524241667, 0.552369231, 0.596357143, 0.733333333]
  expect(countKept('bky', THROMBOLYSIS)).toBe(8)
  expectClose(
    adjust('bky', THROMBOLYSIS),
    [...page, ...rest].map((q) => q * 1.05),
    8,
  )
})

test('Holm keeps two of .01, .04, .03, .005, while Hochberg, Hommel and Benjamini–Hochberg keep all', () => {
  // Printed in an encyclopedia article on Holm's procedure and in a tutorial; adjusted values by R 4.2.2.
  const p = [0.01, 0.04, 0.03, 0.005]
  expectClose(adjust('holm', p), [0.03, 0.06, 0.06, 0.02], 12)
  expectClose(adjust('hochberg', p), [0.03, 0.04, 0.04, 0.02], 12)
  expectClose(adjust('hommel', p), [0.03, 0.04, 0.04, 0.02], 12)
  expectClose(adjust('bh', p), [0.02, 0.04, 0.04, 0.02], 12)
  expect(countKept('holm', p)).toBe(2)
})

test('Holm meets alpha exactly on a documented vector of six', () => {
  // The raw values stand in a public documentation page; adjusted ones by R 4.2.2.
  const found = adjust('holm', [0.01, 0.04, 0.2, 0.03, 0.005, 0.07])
  expectClose(found, [0.05, 0.12, 0.2, 0.12, 0.03, 0.14], 12)
})

test('24 raw p-values of a vendor’s guide give its Holm, Hochberg and false discovery rate columns', () => {
  // SAS/STAT User's Guide, MULTTEST, "Inputting Raw p-Values": raw values as printed there; the printed results
  // 0.8395, 0.9437 and 0.6305 from memory; the digits beyond them by R 4.2.2.
  const p = [
    0.28282, 0.30688, 0.71022, 0.77175, 0.7818, 0.88581, 0.54685, 0.84978, 0.24228, 0.58977, 0.03498, 0.41607,
    0.31631, 0.05254, 0.45061, 0.75758, 0.12496, 0.49485, 0.21572, 0.50505, 0.94372, 0.8126, 0.77596, 0.36889,
  ]
  adjust('holm', p).forEach((value, i) => expect(value).toBeCloseTo(i === 10 ? 0.83952 : 1, 10))
  adjust('hochberg', p).forEach((value, i) => expect(value).toBeCloseTo(i === 10 ? 0.83952 : 0.94372, 10))
  adjust('bh', p).forEach((value, i) => {
    if (i === 10 || i === 13) expect(value).toBeCloseTo(0.63048, 10)
    else expect([0.9243, 0.9437]).toContain(Number(value.toFixed(4)))
  })
})

test('six p-values by eight procedures, to the four digits that R prints', () => {
  // R 4.2.2, p.adjust; Šidák and Holm–Šidák by formula.
  const p = [0.001, 0.008, 0.012, 0.021, 0.039, 0.2]
  const columns: Partial<Record<Procedure, number[]>> = {
    bonferroni: [0.006, 0.048, 0.072, 0.126, 0.234, 1],
    sidak: [0.006, 0.0471, 0.0699, 0.1196, 0.2123, 0.7379],
    holm: [0.006, 0.04, 0.048, 0.063, 0.078, 0.2],
    'holm-sidak': [0.006, 0.0394, 0.0471, 0.0617, 0.0765, 0.2],
    hochberg: [0.006, 0.04, 0.048, 0.063, 0.078, 0.2],
    hommel: [0.006, 0.032, 0.042, 0.0585, 0.078, 0.2],
    bh: [0.006, 0.024, 0.024, 0.0315, 0.0468, 0.2],
    by: [0.0147, 0.0588, 0.0588, 0.0772, 0.1147, 0.49],
  }
  for (const procedure of Object.keys(columns) as Procedure[]) {
    expectClose(adjust(procedure, p), columns[procedure] ?? [], 4)
  }
})
