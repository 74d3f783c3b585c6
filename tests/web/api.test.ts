import { parse as parseCsv } from 'csv-parse/sync'
import { expect, test } from 'vitest'
import { GET as exportAudit } from '@/app/api/manuscripts/[id]/audit/export/route'
import { GET as getAudit } from '@/app/api/manuscripts/[id]/audit/route'
import { GET as getProgress } from '@/app/api/manuscripts/[id]/progress/route'
import { GET as getComments, POST as postComment } from '@/app/api/manuscripts/[id]/comments/route'
import { PATCH as patchComment } from '@/app/api/manuscripts/[id]/comments/[commentId]/route'
import { GET as getPoints } from '@/app/api/manuscripts/[id]/points/route'
import { PATCH as patchPoint } from '@/app/api/manuscripts/[id]/points/[pointId]/route'
import { GET as getManuscript, PATCH as patchDraft } from '@/app/api/manuscripts/[id]/route'
import { GET as getDocket } from '@/app/api/docket/route'
import { GET as getReviewers } from '@/app/api/reviewers/route'
import { writeAuditCsv } from '@/lib/letters/write-audit-csv'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { listPointIds, makeManuscript, makeWorld, type World } from '../support/world'
import { makeFamily, makeReport } from '../support/audit'
import { makeSmallAudit } from '../support/small-audit'

type Handler = (
  request: Request,
  context: { params: Promise<never> },
  given: { db: World['db']; settings: ReturnType<typeof getSettings>; actor: Actor; now: number },
) => Promise<Response>

/** Calls a handler as one actor, with JSON in and out. */
function makeCaller({ db, now }: World) {
  const settings = getSettings({})
  return async (
    handler: unknown,
    actor: Actor,
    params: Record<string, string>,
    given: { query?: string; body?: object; method?: string } = {},
  ) => {
    const { query = '', body, method = body ? 'POST' : 'GET' } = given
    const request = new Request(`http://localhost:3000/api/x${query}`, {
      method,
      headers: { origin: 'http://localhost:3000' },
      ...(body ? { body: JSON.stringify(body) } : {}),
    })
    const response = await (handler as Handler)(
      request,
      { params: Promise.resolve(params as never) },
      { db, settings, actor, now: now() },
    )
    const text = await response.text()
    return { status: response.status, headers: response.headers, text, json: (): unknown => JSON.parse(text) }
  }
}

test('an audit is given as data, its progress beside it, and null to who may not read it', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const id = makeManuscript(world, 'in review')
  expect((await call(getAudit, world.reviewer, { id })).json()).toMatchObject({
    round: 1,
    audit: makeSmallAudit(),
  })
  expect((await call(getProgress, world.submitter, { id })).json()).toMatchObject({ status: 'done' })
  expect((await call(getAudit, world.submitter, { id })).json()).toBeNull()
  expect((await call(getAudit, world.administrator, { id })).status).toBe(404)
  expect((await call(getManuscript, world.administrator, { id })).status).toBe(404)
})

test('an audit is exported as JSON and as CSV under a dated name', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const id = makeManuscript(world, 'in review')
  const json = await call(exportAudit, world.reviewer, { id }, { query: '?format=json' })
  expect(json.json()).toEqual(makeSmallAudit())
  expect(json.headers.get('content-disposition')).toMatch(
    /filename="audit-THC-2026-\d{4}-round-1-2026-03-02\.json"/,
  ) // with the day
  const csv = await call(exportAudit, world.reviewer, { id }, { query: '?format=csv' })
  const rows: Record<string, string>[] = parseCsv(csv.text, { columns: true })
  expect(rows.map((row) => Number(row.value))).toEqual(makeSmallAudit().reports.map((report) => report.value))
  const script = await call(exportAudit, world.reviewer, { id }, { query: '?format=r' })
  expect(script.text).toContain('check_statistics()')
  expect(script.headers.get('content-disposition')).toMatch(/round-1-2026-03-02\.R"/)
  const [family] = makeSmallAudit().families
  const one = await call(exportAudit, world.reviewer, { id }, { query: `?format=r&family=${family?.id}` })
  expect(one.text).toContain('Recomputation of one family')
  expect((await call(exportAudit, world.reviewer, { id }, { query: '?format=r&family=f99' })).status).toBe(
    404,
  )
  expect((await call(exportAudit, world.reviewer, { id }, { query: '?format=csv&family=f1' })).status).toBe(
    422,
  )
  expect((await call(exportAudit, world.submitter, { id }, { query: '?format=r' })).status).toBe(404)
  expect((await call(exportAudit, world.submitter, { id }, { query: '?format=csv' })).status).toBe(404)
  expect((await call(exportAudit, world.reviewer, { id }, { query: '?format=exe' })).status).toBe(422)
})

test('in the CSV no text begins a formula, numbers stay numbers, and quotes and line breaks survive', () => {
  const reports = [makeReport('r1', 0.021), makeReport('r2', 0.4)]
  const [first] = reports
  if (first) first.place = { ...first.place, quote: '=HYPERLINK("http://x.example"),\nnext' }
  const audit = {
    ...makeSmallAudit(),
    reports: reports.map((report) => ({ ...report, comparison: ['-sand', '@rock'] as [string, string] })),
    families: [makeFamily(reports, { label: '+all' })],
    statistics: [],
  }
  const text = writeAuditCsv(audit)
  expect(text.split('\r\n').length).toBe(reports.length + 2)
  const [row]: Record<string, string>[] = parseCsv(text, { columns: true })
  expect(row).toMatchObject({
    quote: `'=HYPERLINK("http://x.example"),\nnext`,
    comparison_a: "'-sand",
    comparison_b: "'@rock",
    family_label: "'+all",
    value: '0.021',
    significant: 'false',
    statistic: '',
  })
})

test('comments are written, changed and settled through their routes', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const id = makeManuscript(world, 'in review')
  const written = await call(
    postComment,
    world.reviewer,
    { id },
    { body: { audience: 'editor', body: 'Please look here.' } },
  )
  expect(written.status).toBe(200)
  const { commentId } = written.json() as { commentId: string }
  const patch = (body: object) =>
    call(patchComment, world.reviewer, { id, commentId }, { body, method: 'PATCH' })
  expect((await patch({ body: 'Please look there.' })).status).toBe(200)
  expect((await patch({ resolved: true })).status).toBe(200)
  const list = (await call(getComments, world.editor, { id })).json()
  expect(list).toMatchObject([{ id: commentId, body: 'Please look there.', resolvedAt: expect.any(Number) }])
  expect((await call(getComments, world.submitter, { id })).json()).toEqual([])
  expect(
    (await call(postComment, world.submitter, { id }, { body: { audience: 'editor', body: 'x' } })).status,
  ).toBe(404)
})

test('a point is decided on and moved through one route; a wrong field is named', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const id = makeManuscript(world, 'in review')
  const [first = '', second = ''] = listPointIds(world.db, id)
  const patch = (pointId: string, body: object, actor = world.reviewer) =>
    call(patchPoint, actor, { id, pointId }, { body, method: 'PATCH' })
  expect((await patch(first, { status: 'kept' })).status).toBe(200)
  expect((await patch(second, { position: 0 })).status).toBe(200)
  const points = (await call(getPoints, world.reviewer, { id })).json() as object[]
  expect(points.slice(0, 2)).toMatchObject([{ id: second }, { id: first, status: 'kept' }])
  const wrong = await patch(first, { status: 'maybe' })
  expect([wrong.status, wrong.json()]).toMatchObject([422, { fields: { status: expect.any(String) } }])
  expect((await patch(first, { status: 'kept' }, world.editor)).status).toBe(404)
})

test('what the address names goes before what the body names', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const mine = makeManuscript(world, 'draft')
  const other = makeManuscript(world, 'draft', world.submitter, 'Oysters')
  const body = { manuscriptId: other, title: 'Kelp under tow' }
  expect((await call(patchDraft, world.submitter, { id: mine }, { body, method: 'PATCH' })).status).toBe(200)
  expect((await call(getManuscript, world.submitter, { id: mine })).json()).toMatchObject({
    title: 'Kelp under tow',
  })
  expect((await call(getManuscript, world.submitter, { id: other })).json()).toMatchObject({
    title: 'Oysters',
  })
})

test('the docket and the reviewers are lists that a query narrows; a query that makes no sense is refused', async () => {
  const world = makeWorld()
  const call = makeCaller(world)
  const id = makeManuscript(world, 'ready')
  makeManuscript(world, 'in review')
  const docket = await call(getDocket, world.editor, {}, { query: '?states=ready&sort=title' })
  expect(docket.json()).toMatchObject({ total: 1, rows: [{ id }] })
  expect((await call(getDocket, world.editor, {}, { query: '?sort=mood' })).status).toBe(422)
  const reviewers = await call(getReviewers, world.editor, {}, { query: `?manuscriptIds=${id}` })
  expect(reviewers.json()).toMatchObject([{ id: world.reviewer.id, open: 1 }])
  expect((await call(getReviewers, world.submitter, {}, { query: `?manuscriptIds=${id}` })).json()).toEqual(
    [],
  )
})
