import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { judge } from '@/lib/checks/families/judge'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut } from '@/tests/support/prose'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

test('pairs that a table prints both ways are counted once', () => {
  const table = makeResultsTable(
    rowsOf(`
      (I) diet | (J) diet | Mean Difference (I-J) | Sig.
      kelp | krill | 2.4 | 0.004
       | fish | 0.3 | 1.000
      krill | kelp | -2.4 | 0.004
       | fish | -2.1 | 0.012
      fish | kelp | -0.3 | 1.000
       | krill | 2.1 | 0.012`),
  )
  const laidOut = makeLaidOut([])
  const { families } = judge(read(laidOut, table, defaultHouseRules), laidOut, defaultHouseRules)
  expect(families.map(({ m, decisions }) => [m.printed, decisions.length])).toEqual([[3, 3]])
})
