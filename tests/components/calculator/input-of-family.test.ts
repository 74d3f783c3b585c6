import { expect, test } from 'vitest'
import { inputOfFamily } from '@/components/calculator/input-of-family'
import { readInput, workOut } from '@/components/calculator/work-out'
import type { Report, Statistic } from '@/lib/checks/types'
import { makeClaim, makeFamily, makeReport } from '../../support/audit'

const byId = <T extends { id: string }>(list: readonly T[]) => new Map(list.map((one) => [one.id, one]))

const statistic: Statistic = {
  id: 's1',
  place: makeReport('x', 0.5).place,
  test: 't',
  df: [28],
  value: -2.05,
  decimals: 2,
  pLow: 0.0493,
  pHigh: 0.0504,
  report: 'r3',
}

const reports: Report[] = [
  makeReport('r1', 0.008, 3, { comparison: ['granite', 'slate = grey'] }),
  makeReport('r1a', 0.024, 3, { comparison: ['slate = grey', 'granite'], scale: 'adjusted' }),
  makeReport('r2', 0.001, 3, {
    comparison: ['granite', 'shell'],
    relation: '<',
    place: { ...makeReport('x', 0.5).place, quote: 'p < .001' },
  }),
  makeReport('r3', 0.15, 2, { comparison: ['slate', 'shell'], scale: 'adjusted', statistic: 's1' }),
  makeReport('r4', 0.3, 1, { comparison: ['slate', 'concrete'], scale: 'adjusted' }),
]
const family = makeFamily([], {
  decisions: ['r1', 'r2', 'r3', 'r4'].map((report) => ({
    report,
    called: null,
    adjusted: [0, 1],
    significant: null,
    survivesUpTo: null,
  })),
  m: { printed: 4, claimed: null, due: 6, why: '' },
  groups: 4,
})
const parts = {
  family,
  claim: makeClaim({ procedure: 'holm' }),
  alpha: 0.01,
  reports: byId(reports),
  statistics: byId([statistic]),
}

test('a family comes into the calculator with its names, prints, level, m and procedure', () => {
  const { input, left } = inputOfFamily(parts)
  expect(input.values.split('\n')).toEqual([
    'granite – slate grey: p = 0.008, adjusted p = 0.024',
    'granite – shell: p < .001',
    'slate – shell: t(28) = -2.05, adjusted p = 0.15',
  ])
  expect(left).toEqual(['slate – concrete'])
  expect(input).toMatchObject({ alpha: '0.01', m: '6', procedure: 'holm', beside: ['bonferroni', 'bh'] })
})

test('what was written for the calculator is read there as it was meant', () => {
  const { input } = inputOfFamily(parts)
  const read = readInput(input)
  expect(read.unread).toEqual([])
  expect(read.entries).toMatchObject([
    { name: 'granite – slate grey', low: 0.0075, high: 0.0085, adjusted: { low: 0.0235, high: 0.0245 } },
    { name: 'granite – shell', low: 0, high: 0.001, adjusted: null },
    { name: 'slate – shell', statistic: { test: 't', df: [28], alone: true }, adjusted: { low: 0.145 } },
  ])
  const { work, faults } = workOut(read, input)
  expect(faults).toEqual({})
  expect(work?.calculation.m).toBe(6)
  expect(work?.main.procedure).toBe('holm')
})

test('a claim that p-values do not suffice for starts with Bonferroni', () => {
  const { input } = inputOfFamily({ ...parts, claim: makeClaim({ procedure: 'tukey' }) })
  expect(input).toMatchObject({ procedure: 'bonferroni', beside: ['holm', 'bh'], groupCount: '4' })
})
