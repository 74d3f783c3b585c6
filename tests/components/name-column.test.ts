import { expect, test } from 'vitest'
import { isSameNaming, nameColumn } from '@/components/columns/name-column'
import { letterOf, roleOptions } from '@/components/columns/role-words'
import { describeTable } from '@/lib/checks'
import { NAMED_ROLES } from '@/lib/checks/vocabulary'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

const found = describeTable(
  makeResultsTable(
    rowsOf(`
      Comparison | t | score
      A vs B | 2.10 | 0.047`),
  ),
  { alpha: 0.05 },
)
const spot = { sheet: 0, row: 0, column: 2 }

test('a column is named once, the newest role counts', () => {
  const once = nameColumn([], spot, 'p', found)
  expect(once).toEqual([{ ...spot, role: 'p' }])
  expect(nameColumn(once, spot, 'p-adjusted', found)).toEqual([{ ...spot, role: 'p-adjusted' }])
})

test('the role that is found anyway takes the name back', () => {
  const named = nameColumn([], spot, 'p', found)
  expect(nameColumn(named, spot, 'unused', found)).toEqual([])
})

test('the order of names does not matter', () => {
  const a = { ...spot, role: 'p' as const }
  const b = { ...spot, column: 1, role: 'z' as const }
  expect(isSameNaming([a, b], [b, a])).toBe(true)
  expect(isSameNaming([a], [{ ...a, role: 't' }])).toBe(false)
  expect(isSameNaming([a], [])).toBe(false)
})

test('every role can be chosen, and columns have the letters of a spreadsheet', () => {
  expect(new Set(roleOptions.map(({ value }) => value))).toEqual(new Set(NAMED_ROLES))
  expect([0, 25, 26, 27, 701, 702].map(letterOf)).toEqual(['A', 'Z', 'AA', 'AB', 'ZZ', 'AAA'])
})
