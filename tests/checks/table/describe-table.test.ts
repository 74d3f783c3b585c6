import { expect, test } from 'vitest'
import { defaultHouseRules, describeTable, type NamedColumn, type ReadTable } from '@/lib/checks'
import { readResultsTable } from '@/lib/checks/table/results-table'
import { nameRole, toColumnRole } from '@/lib/checks/table/named-role'
import { NAMED_ROLES } from '@/lib/checks/vocabulary'
import { makeResultsTable, rowsOf } from '@/tests/support/results-table'

// The column of p-values is misnamed: nothing in its head says what it holds.
const misnamed = rowsOf(`
  Holdfasts under tow |  |  |  |
  Comparison | t | df | size | score
  still vs slow | 2.10 | 22 | 12 | 0.0474
  still vs fast | 3.05 | 22 | 12 | 0.0059
  slow vs fast | 0.90 | 22 | 12 | 0.3779`)

const describe = (table: ReadTable) => describeTable(table, defaultHouseRules)
const withRoles = (rows: string[][], roles: NamedColumn[]): ReadTable => ({
  ...makeResultsTable(rows),
  roles,
})

test('a description tells where a table begins and what each column was taken for', () => {
  const [table] = describe(makeResultsTable(misnamed))
  expect(table).toMatchObject({
    sheet: 0,
    sheetName: null,
    row: 1,
    title: 'Holdfasts under tow',
    rows: 3,
    sample: [1, 2, 3],
    reports: 0,
    statistics: 3,
  })
  expect(
    table?.columns.map(({ column, header, role, reads, filled }) => [column, header, role, reads, filled]),
  ).toEqual([
    [0, 'Comparison', 'comparison', 3, 3],
    [1, 't', 't', 3, 3],
    [2, 'df', 'df', 3, 3],
    [3, 'size', 'unused', 0, 3],
    [4, 'score', 'unused', 0, 3],
  ])
  expect(table?.columns[4]?.cells).toEqual(['0.0474', '0.0059', '0.3779'])
})

test('a role that a person gives turns the misread column right, and nothing else changes', () => {
  const before = describe(makeResultsTable(misnamed))[0]
  const named = withRoles(misnamed, [{ sheet: 0, row: 1, column: 4, role: 'p-unadjusted' }])
  const [after] = describe(named)
  expect(after?.columns[4]).toMatchObject({ role: 'p-unadjusted', named: true, scale: 'raw', reads: 3 })
  expect(after?.columns.slice(0, 4)).toEqual(before?.columns.slice(0, 4))
  expect(
    after?.values.map((v) => [v.comparison?.join(' v '), v.relation, v.value, v.scale, v.statistic?.value]),
  ).toEqual([
    ['still v slow', '=', 0.0474, 'raw', 2.1],
    ['still v fast', '=', 0.0059, 'raw', 3.05],
    ['slow v fast', '=', 0.3779, 'raw', 0.9],
  ])
  const read = readResultsTable(named, 0.05)
  expect(read.reports.map(({ place }) => place.row)).toEqual([1, 2, 3])
  expect(read.statistics.map(({ value, df }) => [value, df])).toEqual(
    readResultsTable(makeResultsTable(misnamed), 0.05).statistics.map(({ value, df }) => [value, df]),
  )
})

test('a column that a person sets aside is not read, and one said to be without scale stays so', () => {
  const rows = rowsOf(`
    Comparison | p | p adj
    A vs B | 0.010 | 0.030
    A vs C | 0.020 | 0.040`)
  const read = (roles: NamedColumn[]) => readResultsTable(withRoles(rows, roles), 0.05).reports
  expect(read([]).map(({ value, scale }) => `${value} ${scale}`)).toEqual([
    '0.01 raw',
    '0.03 adjusted',
    '0.02 raw',
    '0.04 adjusted',
  ])
  expect(
    read([{ sheet: 0, row: 0, column: 2, role: 'unused' }]).map(({ value, scale }) => `${value} ${scale}`),
  ).toEqual(['0.01 raw', '0.02 raw'])
  expect(read([{ sheet: 0, row: 0, column: 1, role: 'p' }]).map(({ scale }) => scale)).toEqual([
    'unknown',
    'adjusted',
    'unknown',
    'adjusted',
  ])
})

test('roles belong to one table of one sheet; those for no table are passed over', () => {
  const rows = rowsOf(`
    Pair | a |  | Pair | b
    A vs B | 0.01 |  | C vs D | 0.02
    A vs C | 0.03 |  | C vs E | 0.04`)
  const heads = [['Pair', 'p', '', 'Pair', 'p'], ...rows.slice(1)]
  const [, right] = describe(makeResultsTable(heads))
  expect(right).toMatchObject({ row: 0, columns: [{ column: 3 }, { column: 4, role: 'p' }] })
  const named = withRoles(heads, [
    { sheet: 0, row: 0, column: 4, role: 'p-adjusted' },
    { sheet: 0, row: 7, column: 1, role: 'unused' },
    { sheet: 3, row: 0, column: 1, role: 'unused' },
  ])
  expect(describe(named).map(({ columns }) => columns.map(({ role }) => role))).toEqual([
    ['comparison', 'p'],
    ['comparison', 'p-adjusted'],
  ])
})

test('without roles the reading is the same to the byte', () => {
  const table = makeResultsTable(misnamed)
  const text = JSON.stringify(readResultsTable(table, 0.05))
  expect(JSON.stringify(readResultsTable({ ...table, roles: [] }, 0.05))).toBe(text)
  const same = describe(table)[0]?.columns.map(({ column, role }) => ({ sheet: 0, row: 1, column, role }))
  expect(JSON.stringify(readResultsTable({ ...table, roles: same ?? [] }, 0.05))).toBe(text)
})

test('every name of a role stands for one role and comes back from it', () => {
  expect(NAMED_ROLES.map((name) => nameRole(toColumnRole(name, '', { kind: 'other' })))).toEqual(NAMED_ROLES)
  expect(toColumnRole('t', 'score t(28)', { kind: 'other' })).toEqual({
    kind: 'statistic',
    test: 't',
    df: [28],
  })
})
