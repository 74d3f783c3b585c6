import { expect, test } from 'vitest'
import { indexAudit, outcomeOfReport, placeOf } from '@/components/bench/audit-index'
import { subjectOf, targetOfComment } from '@/components/bench/subject-of'
import type { Audit, Box, Finding, Place } from '@/lib/checks/types'
import { makeClaim, makeDecision, makeFamily, makeReport } from '@/tests/support/audit'

const at = (page: number | null, box: Box, quote = 'p = 0.03'): Place => ({
  source: 'text',
  page,
  row: page === null ? 4 : null,
  sheet: null,
  quote,
  boxes: page === null ? [] : [box],
})

const reports = [
  makeReport('r1', 0.03, 3, { place: at(2, [300, 500, 340, 512]), comparison: ['rock', 'sand'] }),
  makeReport('r2', 0.01, 3, { place: at(2, [100, 501, 140, 513]) }),
  makeReport('r3', 0.2, 3, { place: at(2, [100, 700, 140, 712]) }),
  makeReport('r4', 0.5, 3, { place: at(null, [0, 0, 0, 0]) }),
]

const family = makeFamily(reports, {
  outcome: 'fails',
  decisions: [
    makeDecision('r1', { called: true, significant: false }),
    makeDecision('r2', { called: true, significant: true }),
  ],
})

const finding: Finding = {
  id: 'f9',
  rule: 'call-not-upheld',
  severity: 'major',
  family: 'f1',
  reports: ['r1'],
  place: null,
  says: '',
  asks: '',
  cites: [],
}

const audit: Audit = {
  engine: '0',
  document: { pages: 2, sha256: '', title: null },
  table: null,
  alpha: { value: 0.05, quote: null, page: null },
  reports,
  statistics: [],
  claims: [makeClaim({ place: at(1, [50, 50, 90, 62], 'Bonferroni-corrected') })],
  families: [family],
  findings: [finding],
}
const index = indexAudit(audit)

test('the marks of a page run from its top, and along a line from the left', () => {
  expect(index.marks.get(2)?.map((mark) => mark.target.id)).toEqual(['r3', 'r2', 'r1'])
})

test('a number of the results table has no mark on a page', () => {
  expect([...index.marks.values()].flat().some((mark) => mark.target.id === 'r4')).toBe(false)
})

test('a mark carries how its call stands, a value outside every family none', () => {
  expect(outcomeOfReport(index, 'r1')).toBe('fails')
  expect(outcomeOfReport(index, 'r2')).toBe('holds')
  expect(outcomeOfReport(index, 'r3')).toBeNull()
})

test('a finding without a place of its own stands where its first number does', () => {
  expect(placeOf(index, { kind: 'finding', id: 'f9' })?.page).toBe(2)
})

test('a family stands where it is claimed', () => {
  expect(placeOf(index, { kind: 'family', id: 'f1' })?.quote).toBe('Bonferroni-corrected')
})

test('what is not in the audit stands nowhere', () => {
  expect(placeOf(index, { kind: 'report', id: 'r99' })).toBeNull()
})

test('a comment on a number leads back to it', () => {
  const subject = subjectOf(index, { kind: 'report', id: 'r1' })
  expect(subject).toMatchObject({ target: 'report', targetLabel: 'rock and sand', page: 2 })
  expect(targetOfComment(subject)).toEqual({ kind: 'report', id: 'r1' })
})

test('a comment on a claim is one on its place, and leads back to the claim', () => {
  const subject = subjectOf(index, { kind: 'claim', id: 'c1' })
  expect(subject).toMatchObject({ target: 'place', targetLabel: 'Bonferroni-corrected', page: 1 })
  expect(targetOfComment(subject)).toEqual({ kind: 'claim', id: 'c1' })
})

test('a comment on the whole leads nowhere', () => {
  expect(targetOfComment({ target: 'whole', targetKey: null })).toBeNull()
})
