import { expect, test } from 'vitest'
import { bibliography } from '@/lib/checks/bibliography'
import { ruleTable } from '@/lib/checks/findings/table'
import { RULES, SEVERITIES } from '@/lib/checks/vocabulary'
import { judgeManuscript } from '../../support/manuscript'
import { claim, kelp, tellPairs } from './kelp'

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
