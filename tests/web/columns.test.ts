import { mkdirSync, writeFileSync } from 'node:fs'
import { dirname } from 'node:path'
import { expect, test } from 'vitest'
import { GET, PUT } from '@/app/api/files/[fileId]/columns/route'
import { describeTable, type ReadTable } from '@/lib/checks'
import { previewTable } from '@/lib/intake/preview-table'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { makeFolder } from '../support/folder'
import { addTableRow, makeManuscript, makePerson, makeWorld } from '../support/world'

function makeDesk() {
  const world = makeWorld()
  const uploads = makeFolder()
  const settings = getSettings({ ASSIZE_UPLOADS: uploads })
  const fileId = addTableRow(world.db, makeManuscript(world, 'in review'))
  // The row in the database names this content.
  const path = getStoredPath(uploads, 'e'.repeat(64))
  mkdirSync(dirname(path), { recursive: true })
  writeFileSync(path, 'Comparison,t,df,score\nA vs B,2.10,22,0.047\nA vs C,3.05,22,0.006\n')
  const url = `http://localhost:3000/api/files/${fileId}/columns`
  const around = (actor: Actor) => ({ db: world.db, settings, actor, now: world.now() })
  const params = { params: Promise.resolve({ fileId }) }
  const get = (actor: Actor) => GET(new Request(url), params, around(actor))
  const put = (actor: Actor, body: unknown) =>
    PUT(
      new Request(url, {
        method: 'PUT',
        body: JSON.stringify(body),
        headers: { origin: 'http://localhost:3000' },
      }),
      params,
      around(actor),
    )
  return { ...world, fileId, get, put }
}

test('a table is given with its rows, and what is named comes back with the next look at it', async () => {
  const { reviewer, get, put } = makeDesk()
  const first = (await (await get(reviewer)).json()) as { table: ReadTable; revision: number }
  expect(first).toMatchObject({
    revision: 0,
    columns: [],
    mayName: true,
    asksAudit: true,
    cut: false,
    round: 1,
  })
  expect(describeTable(first.table, { alpha: 0.05 })[0]?.columns.map(({ role }) => role)).toEqual([
    'comparison',
    't',
    'df',
    'unused',
  ])
  const columns = [{ sheet: 0, row: 0, column: 3, role: 'p-unadjusted' }]
  const saved = await put(reviewer, { revision: 0, columns })
  expect(await saved.json()).toMatchObject({ revision: 1, auditId: expect.stringMatching(/^au/) as string })
  expect(await (await get(reviewer)).json()).toMatchObject({ revision: 1, columns })
  expect((await put(reviewer, { revision: 0, columns: [] })).status).toBe(409)
})

test('a role that is none, or one column named twice, is refused', async () => {
  const { reviewer, put } = makeDesk()
  const column = { sheet: 0, row: 0, column: 3, role: 'p' }
  expect((await put(reviewer, { revision: 0, columns: [{ ...column, role: 'weight' }] })).status).toBe(422)
  expect((await put(reviewer, { revision: 0, columns: [column, { ...column, role: 't' }] })).status).toBe(422)
})

test('for whom the file is not, neither it nor its columns are there', async () => {
  const { db, administrator, get, put } = makeDesk()
  const others = [
    administrator,
    makePerson(db, ['reviewer'], 'Ona Reef'),
    makePerson(db, ['submitter'], 'Una Reef'),
  ]
  for (const actor of others) {
    expect((await get(actor)).status).toBe(404)
    expect((await put(actor, { revision: 0, columns: [] })).status).toBe(404)
  }
})

test('of a long table the first rows are shown, and a very large file is not opened', async () => {
  const path = `${makeFolder()}/long.csv`
  writeFileSync(path, `pair,p\n${'A vs B,0.02\n'.repeat(3000)}`)
  const { table, cut } = await previewTable({ path, name: 'long.csv', bytes: 36_000 })
  expect(table.sheets[0]?.rows).toHaveLength(1000)
  expect(cut).toBe(true)
  await expect(previewTable({ path, name: 'long.csv', bytes: 9e6 })).rejects.toMatchObject({
    refusal: 'too-large',
  })
})
