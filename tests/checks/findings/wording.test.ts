import { expect, test } from 'vitest'
import { bibliography } from '@/lib/checks/bibliography'
import { showLevel, showP } from '@/lib/checks/findings/wording'
import { ruleTable } from '@/lib/checks/findings/table'
import { RULES, SEVERITIES } from '@/lib/checks/vocabulary'
import { judgeManuscript } from '../../support/manuscript'
import { claim, kelp, level, tellPairs } from './kelp'

const faulty = judgeManuscript(
  kelp(
    claim,
    `${tellPairs({ print: ['3.636', '.020', '.002', '.057', '.001', '.270'], called: [0, 1, 2, 4] })} Gull noise and quiet differed significantly in sleep (t(30) = 1.00, p = .000).`,
  ),
)

test('every rule of the vocabulary has one row in the table', () => {
  expect(ruleTable.map(({ rule }) => rule).sort()).toEqual([...RULES].sort())
})

test('findings are numbered, the gravest first', () => {
  expect(faulty.findings.length).toBeGreaterThan(3)
  expect(faulty.findings.map(({ id }) => id)).toEqual(faulty.findings.map((_, i) => `f${i + 1}`))
  const order = faulty.findings.map(({ severity }) => SEVERITIES.indexOf(severity))
  expect(order).toEqual([...order].sort((a, b) => a - b))
})

test('the wording asks for one thing, accuses nobody and cites what the bibliography holds', () => {
  for (const { says, asks, cites, place } of faulty.findings) {
    expect(`${says} ${asks}`).not.toMatch(/failed to|wrongly|cherry|hack|mistake|undefined|NaN|null/i)
    expect(asks).toMatch(/^Please /)
    expect(place?.quote).not.toBe('')
    for (const key of cites) expect(bibliography.has(key)).toBe(true)
  }
})

test('the same manuscript gives the same findings', () => {
  const source = kelp(claim, tellPairs({ print: 'raw', called: [1, 2, 4] }))
  expect(JSON.stringify(judgeManuscript(source))).toBe(JSON.stringify(judgeManuscript(source)))
})

test('an empty manuscript and one of numbers without words give no family and no error', () => {
  expect(judgeManuscript('')).toEqual({ families: [], findings: [] })
  expect(() =>
    judgeManuscript('# Results\np = .03, p = .04, p < .001, t(3) = 2, F(0, 0) = 1, p = .5'),
  ).not.toThrow()
})

test('small numbers are written as powers of ten with raised digits', () => {
  expect([0.0000123, 0.00004, 3.2e-12, 0.0083, 0.1214, 1].map(showP)).toEqual([
    '1.2 × 10⁻⁵',
    '4.0 × 10⁻⁵',
    '3.2 × 10⁻¹²',
    '0.0083',
    '0.121',
    '1',
  ])
  expect([0.05 / 6, 0.05 / 3, 0.01, 0.05 / 120000, 5e-8].map(showLevel)).toEqual([
    '0.00833',
    '0.0167',
    '0.01',
    '4.17 × 10⁻⁷',
    '5 × 10⁻⁸',
  ])
})

test('the sentence on a family keeps its numbers apart', () => {
  const why = (source: string) => judgeManuscript(source).families[0]?.why
  expect(why(kelp(level, tellPairs({ print: 'raw', called: [1, 2, 4] })))).toBe(
    'By Bonferroni with m = 6, one of the 6 stated calls at 0.05 does not agree.',
  )
  expect(why(kelp(level, tellPairs({ print: 'raw', called: [2, 4] })))).toBe(
    'By Bonferroni with m = 6, all 6 stated calls at 0.05 agree.',
  )
  expect(why(kelp('', tellPairs({ print: 'raw', called: [1, 2, 4] })))).toBe(
    '6 tests, and no correction was found; by Holm with m = 6, one of the 6 stated calls at 0.05 would not stand.',
  )
})

test('a family says that it is judged by Holm where Benjamini–Hochberg is named for the family-wise rate', () => {
  const told = judgeManuscript(
    kelp(
      'All six pairs of substrates were compared with t tests. The family-wise error rate was controlled by the Benjamini–Hochberg procedure for six comparisons.',
      tellPairs({ print: 'raw', called: [1, 2, 4] }),
    ),
  )
  expect(told.families[0]?.why).toMatch(
    /^By Holm with m = 6 \(Benjamini–Hochberg is named, but control of the family-wise error rate is claimed\), /,
  )
})
