import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import type { ReadReport } from '@/lib/checks/types'
import { makeLaidOut } from '@/tests/support/prose'
import { REPORT_PASSAGES } from './report-passages'

/** A report in the words of the expectation: only what the expectation names is compared. */
function toWords(
  { relation, value, decimals, scale, called }: ReadReport,
  wanted: string | undefined,
): string {
  const words = [`${relation} ${value}/${decimals}`]
  if (wanted && /\b(?:adjusted|raw|unknown)\b/.test(wanted)) words.push(scale)
  if (wanted && /\b(?:significant|null)\b/.test(wanted)) words.push(called ?? 'null')
  return words.join(' ')
}

test.each(REPORT_PASSAGES.map((passage) => [passage.text, passage] as const))('reads: %s', (_, passage) => {
  const laidOut = makeLaidOut([{ kind: passage.section ?? 'results', text: passage.text }])
  const { reports } = read(laidOut, null, defaultHouseRules)
  const wanted = passage.expect.map((words) => {
    const [relation = '', number = '', ...rest] = words.split(' ')
    const [value = '', decimals = ''] = number.split('/')
    return [`${relation} ${Number(value)}/${decimals}`, ...rest].join(' ')
  })
  expect(reports.map((report, i) => toWords(report, wanted[i]))).toEqual(wanted)
})
