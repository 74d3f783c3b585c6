import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut } from '@/tests/support/prose'
import { CLAIM_PASSAGES } from './claim-passages'

test.each(CLAIM_PASSAGES.map((passage) => [passage.text, passage] as const))('reads: %s', (text, passage) => {
  const { claims } = read(makeLaidOut([{ kind: passage.section, text }]), null, defaultHouseRules)
  const found = claims.map(({ scope, ...claim }) => ({
    ...claim,
    design: scope.design,
    control: scope.control,
  }))
  expect(found).toEqual(passage.expect.map((wanted) => expect.objectContaining(wanted)))
})
