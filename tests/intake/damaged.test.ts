import { beforeAll, expect, test } from 'vitest'
import { makeCase } from '@/scripts/damage/cases'
import { DAMAGES } from '@/scripts/damage/damages'
import { makeFixtures } from '@/scripts/damage/fixtures'
import { leaks, takeIn } from '@/scripts/damage/intake'

let fixtures: Awaited<ReturnType<typeof makeFixtures>>

beforeAll(async () => {
  fixtures = await makeFixtures()
})

/** Every damage in turn, so that each of them meets a few files; the script of the same name runs thousands. */
const sample = Array.from({ length: 60 }, (_, i) => i)

test.each(
  DAMAGES.map(({ name }, i) => [name, sample.filter((number) => number % DAMAGES.length === i)] as const),
)(
  'files with damage (%s) are read, or refused in a sentence, and nothing else happens',
  async (_name, numbers) => {
    for (const number of numbers) {
      const { format, bytes } = makeCase(fixtures, 1, number)
      const outcome = await takeIn(format, bytes, fixtures.pdf)
      expect(outcome, `file ${number}`).toMatchObject({ kind: expect.stringMatching(/^(?:read|refused)$/) })
    }
  },
)

test('whole files are read, all of them', async () => {
  for (const format of ['pdf', 'docx', 'xlsx', 'csv'] as const)
    expect(await takeIn(format, fixtures[format], fixtures.pdf)).toEqual({ kind: 'read', says: '' })
})

test('a message that holds a path or a stack is seen as a leak', () => {
  expect(leaks('ENOENT: no such file, open /tmp/x/y')).toBe(true)
  expect(leaks('at read (file.ts:3)')).toBe(true)
  expect(
    leaks('This file is a PDF, not a results table; please save it as CSV, TSV or XLSX and/or hand it in.'),
  ).toBe(false)
})
