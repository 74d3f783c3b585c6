import fc from 'fast-check'
import { expect, test } from 'vitest'
import { MOST_GROUPS, readGroups } from '@/lib/checks/calculate/read-groups'

test('groups are read with and without a header, by tabs, semicolons, commas and spaces', () => {
  const rows = [
    { group: 'granite', n: 10, mean: 41.2, meanDecimals: 1, spread: 5.9, spreadDecimals: 1 },
    { group: 'oyster shell', n: 12, mean: 27.95, meanDecimals: 2, spread: 6, spreadDecimals: 0 },
  ]
  const lists = [
    'granite\t10\t41.2\t5.9\noyster shell\t12\t27.95\t6',
    'granite;10;41.2;5.9\r\noyster shell;12;27.95;6\r\n',
    'granite, 10, 41.2, 5.9\n"oyster shell", 12, 27.95, 6',
    'granite 10 41.2 5.9\n\noyster shell 12 27.95 6',
    'granite;10;41,2;5,9\noyster shell;12;27,95;6',
  ]
  for (const list of lists) expect(readGroups(list)).toMatchObject({ groups: rows, unread: [], spread: null })
})

test('a header names the columns in any order and says what the spread is', () => {
  const found = readGroups('site\tSE\tn\tmean\nrock\t1.9\t10\t-41.2')
  expect(found.spread).toBe('se')
  expect(found.groups).toMatchObject([{ group: 'rock', n: 10, mean: -41.2, spread: 1.9, line: 2 }])
  expect(readGroups('group,n,mean,standard deviation\na,3,1,2').spread).toBe('sd')
})

test('what is no group is listed with its line and reason', () => {
  const { groups, unread } = readGroups('a 10 1 2\nb 1 1 2\nc 10 1 -2\nd 10 x 2\ne 2.5 1 2')
  expect(groups.map((one) => one.group)).toEqual(['a'])
  expect(unread.map((one) => one.line)).toEqual([2, 3, 4, 5])
  const many = readGroups(Array.from({ length: MOST_GROUPS + 5 }, (_, i) => `g${i} 10 1 2`).join('\n'))
  expect(many.groups).toHaveLength(MOST_GROUPS)
  expect(many.unread).toHaveLength(5)
})

test('any text is read without a throw', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme' }), (text) => {
      for (const one of readGroups(text).groups) expect(one.n >= 2 && one.spread >= 0).toBe(true)
    }),
    { numRuns: 1000 },
  )
})
