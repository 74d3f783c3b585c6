import { expect, test } from 'vitest'
import { audit } from '@/lib/checks/audit'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { printAudit } from '@/lib/letters/print-audit'
import { judgeManuscript } from '../../support/manuscript'
import { claim, kelp, tellPairs } from './kelp'

const empty = audit({ sha256: '0'.repeat(64), title: null, pages: [], fonts: {} }, null, defaultHouseRules)

test('the report in text names the outcome, keeps to 100 columns and ends with the two cautions', () => {
  const told = judgeManuscript(kelp(claim, tellPairs({ print: 'raw', called: [1, 2, 4] })))
  const text = printAudit({ ...empty, ...told })
  expect(text).toContain('FAILS')
  expect(text).toContain('call-not-upheld')
  expect(Math.max(...text.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100)
  expect(text.trimEnd().split('\n').slice(-2).join(' ')).toMatch(/decides nothing.*protocol/)
})
