import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { readAccessTable, writeAccessTable } from '@/scripts/docs/access-table'

const read = (file: string) => readFileSync(join(import.meta.dirname, '..', file), 'utf8')

test('DEVELOPERS.md shows the permission table as it is', () => {
  expect(readAccessTable(read('DEVELOPERS.md'))).toBe(writeAccessTable())
})

test('the README names every environment variable of the settings', () => {
  const names = [...read('lib/settings.ts').matchAll(/^ {2}(ASSIZE_[A-Z_]+):/gm)].map((match) => match[1])
  expect(names.length).toBeGreaterThan(8)
  expect(names.filter((name) => !read('README.md').includes(`\`${name}\``))).toEqual([])
})

test('every script of package.json that the README names exists', () => {
  const scripts: unknown = JSON.parse(read('package.json'))
  const named = [...read('README.md').matchAll(/npm run (?:--silent )?([a-z0-9:-]+)/g)].map(
    (match) => match[1],
  )
  expect(named.length).toBeGreaterThan(3)
  for (const name of named) expect(scripts).toHaveProperty(['scripts', name ?? ''])
})
