import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { files, record } from '@/db/schema'
import { GET, DELETE } from '@/app/api/files/[fileId]/route'
import { POST } from '@/app/api/manuscripts/[id]/files/route'
import { createDraft } from '@/lib/desk/create-draft'
import { handIn } from '@/lib/desk/hand-in'
import { changeDraft } from '@/lib/desk/change-draft'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { describeDisposition } from '@/lib/web/file-response'
import { listAll, makeFolder } from '../support/folder'
import { makePdf } from '../support/pdf'
import { finishAudit, makePerson, makeWorld, type World } from '../support/world'
import { offerAssignment } from '@/lib/desk/offer-assignment'
import { answerAssignment } from '@/lib/desk/answer-assignment'

const own = { origin: 'http://localhost:3000' }

type Sending = { kind?: string; name?: string; headers?: Record<string, string>; as?: Actor }

function makeDesk(world: World = makeWorld(), env: Record<string, string> = {}) {
  const uploads = makeFolder()
  const settings = getSettings({ ASSIZE_UPLOADS: uploads, ...env })
  const { manuscriptId } = createDraft(world.db, world.submitter, { title: 'Kelp' }, world.now())
  const around = (actor: Actor | null) => ({ db: world.db, settings, actor, now: world.now() })
  const send = (
    body: BodyInit | null,
    { kind = 'manuscript', name = 'kelp.pdf', headers = {}, as = world.submitter }: Sending = {},
  ) => {
    const request = new Request(`http://localhost:3000/api/manuscripts/${manuscriptId}/files`, {
      method: 'POST',
      body,
      headers: { ...own, 'X-File-Kind': kind, 'X-File-Name': encodeURIComponent(name), ...headers },
      ...(body instanceof ReadableStream ? { duplex: 'half' } : {}),
    } as RequestInit)
    return POST(request, { params: Promise.resolve({ id: manuscriptId }) }, around(as))
  }
  const get = (fileId: string, as: Actor | null = world.submitter, headers: Record<string, string> = {}) =>
    GET(
      new Request(`http://localhost:3000/api/files/${fileId}`, { headers }),
      { params: Promise.resolve({ fileId }) },
      around(as),
    )
  return { ...world, uploads, manuscriptId, send, get, around }
}

async function sendPdf(desk: ReturnType<typeof makeDesk>, pdf: Buffer, name?: string): Promise<string> {
  const response = await desk.send(new Uint8Array(pdf), name === undefined ? {} : { name })
  expect(response.status).toBe(200)
  return ((await response.json()) as { fileId: string }).fileId
}

test('a PDF that is uploaded is stored, listed with its cleaned name and read back byte for byte', async () => {
  const desk = makeDesk()
  const pdf = await makePdf()
  const fileId = await sendPdf(desk, pdf, '../über/Kelp été.pdf')
  expect(desk.db.select().from(files).get()).toMatchObject({
    id: fileId,
    name: 'Kelp été.pdf',
    bytes: pdf.length,
    mediaType: 'application/pdf',
  })
  const response = await desk.get(fileId)
  expect(Buffer.from(await response.arrayBuffer()).equals(pdf)).toBe(true)
  expect(Object.fromEntries(response.headers)).toMatchObject({
    'content-type': 'application/pdf',
    'content-disposition': `inline; filename="Kelp _t_.pdf"; filename*=UTF-8''Kelp%20%C3%A9t%C3%A9.pdf`,
    'x-content-type-options': 'nosniff',
    'cache-control': 'private, no-store',
    'content-length': String(pdf.length),
  })
})

test('whoever may not add a file is refused before a byte of it is read', async () => {
  const desk = makeDesk()
  const stranger = makePerson(desk.db, ['submitter'], 'Ona Reef')
  let read = 0
  const body = () =>
    new ReadableStream(
      {
        pull(controller) {
          read++
          controller.enqueue(new Uint8Array(1000))
        },
      },
      { highWaterMark: 0 },
    )
  for (const as of [stranger, desk.editor, desk.reviewer, desk.administrator]) {
    expect((await desk.send(body(), { as })).status).toBe(404)
  }
  expect(read).toBe(0)
  expect(listAll(desk.uploads)).toEqual([])
})

test('an upload from another site, without a kind, or with a name that cannot be read changes nothing', async () => {
  const desk = makeDesk()
  const pdf = new Uint8Array(await makePdf())
  expect((await desk.send(pdf, { headers: { origin: 'https://elsewhere.example' } })).status).toBe(403)
  expect((await desk.send(pdf, { kind: 'virus' })).status).toBe(422)
  expect((await desk.send(pdf, { headers: { 'X-File-Name': '%E0%A4%A' } })).status).toBe(422)
  expect(desk.db.select().from(files).all()).toEqual([])
  expect(listAll(desk.uploads)).toEqual([])
})

test('a refused file answers with its sentence, leaves nothing and is recorded without its name', async () => {
  const desk = makeDesk()
  const response = await desk.send('<!doctype html><p>Log in</p>', { name: 'secret plan.pdf' })
  expect(response.status).toBe(422)
  expect(await response.json()).toMatchObject({ detail: expect.stringContaining('a web page, not a PDF') })
  expect(listAll(desk.uploads)).toEqual([])
  const [line] = desk.db.select().from(record).where(eq(record.event, 'file refused')).all()
  expect(line).toMatchObject({
    manuscriptId: desk.manuscriptId,
    detail: { kind: 'manuscript', refusal: 'unreadable' },
  })
  expect(JSON.stringify(line)).not.toContain('secret plan')
})

test('a file above the limit answers 413, whether it says so or not', async () => {
  const desk = makeDesk(makeWorld(), { ASSIZE_UPLOAD_LIMIT_MB: '0.01' })
  const body = new Uint8Array(20_000)
  expect((await desk.send(body, { headers: { 'content-length': '20000' } })).status).toBe(413)
  expect((await desk.send(new Blob([body]).stream())).status).toBe(413)
  expect(listAll(desk.uploads)).toEqual([])
})

test('a connection that breaks in the middle leaves no row and no file', async () => {
  const desk = makeDesk()
  const body = new ReadableStream({
    start: (controller) => controller.enqueue(Buffer.from('%PDF-1.7 half of it')),
    pull: (controller) => controller.error(new Error('connection reset')),
  })
  expect((await desk.send(body)).status).toBe(500)
  expect(desk.db.select().from(files).all()).toEqual([])
  expect(listAll(desk.uploads)).toEqual([])
})

test('a second file of a kind replaces the first, which is kept', async () => {
  const desk = makeDesk()
  await sendPdf(desk, await makePdf({ pages: ['one p = .020'] }))
  const second = await sendPdf(desk, await makePdf({ pages: ['two p = .030'] }))
  const rows = desk.db.select({ id: files.id, replacedAt: files.replacedAt }).from(files).all()
  expect(rows.filter((row) => row.replacedAt === null)).toEqual([{ id: second, replacedAt: null }])
  expect(listAll(desk.uploads)).toHaveLength(2)
})

test.each([
  ['bytes=0-99', 206, 0, 100],
  ['bytes=100-', 206, 100, null],
  ['bytes=-50', 206, -50, null],
  ['bytes=5-5', 206, 5, 6],
  ['bytes=0-999999999', 206, 0, null],
  ['bytes=0-1,5-6', 200, 0, null],
  ['lines=1-2', 200, 0, null],
])('the range %s is answered by %i and its bytes', async (range, status, from, to) => {
  const desk = makeDesk()
  const pdf = await makePdf()
  const response = await desk.get(await sendPdf(desk, pdf), desk.submitter, { range })
  expect(response.status).toBe(status)
  const wanted = pdf.subarray(from, to ?? undefined)
  expect(Buffer.from(await response.arrayBuffer()).equals(wanted)).toBe(true)
  expect(response.headers.get('content-length')).toBe(String(wanted.length))
})

test('a range beyond the end answers 416 with the length; a stale If-Range answers the whole', async () => {
  const desk = makeDesk()
  const pdf = await makePdf()
  const fileId = await sendPdf(desk, pdf)
  const beyond = await desk.get(fileId, desk.submitter, { range: `bytes=${pdf.length}-` })
  expect([beyond.status, beyond.headers.get('content-range')]).toEqual([416, `bytes */${pdf.length}`])
  const stale = await desk.get(fileId, desk.submitter, { range: 'bytes=0-9', 'if-range': '"other"' })
  expect([stale.status, (await stale.arrayBuffer()).byteLength]).toEqual([200, pdf.length])
  const same = await desk.get(fileId, desk.submitter, { 'if-none-match': stale.headers.get('etag') ?? '' })
  expect(same.status).toBe(304)
})

test('reading a file is recorded once, however many parts it is read in', async () => {
  const desk = makeDesk()
  const fileId = await sendPdf(desk, await makePdf())
  for (const range of ['bytes=0-99', 'bytes=100-199', 'bytes=200-299']) {
    await (await desk.get(fileId, desk.submitter, { range })).arrayBuffer()
  }
  expect(desk.db.select().from(record).where(eq(record.event, 'file read')).all()).toHaveLength(1)
})

test('who may not see a file is told nothing of it; who may, under double blinding, not its name', async () => {
  const desk = makeDesk(makeWorld({ blinding: 'double' }))
  const { db, submitter, editor, reviewer, administrator, manuscriptId, now } = desk
  const author = { correspondingAuthor: 'Corin Inglis', correspondingEmail: 'corin.inglis@kelpbay.example' }
  changeDraft(db, submitter, { manuscriptId, ...author }, now())
  const fileId = await sendPdf(desk, await makePdf(), 'Inglis kelp v7.pdf')
  const statuses = async () =>
    Promise.all(
      [editor, reviewer, administrator, null].map(async (as) => (await desk.get(fileId, as)).status),
    )
  expect(await statuses()).toEqual([404, 404, 404, 401])
  handIn(db, submitter, { manuscriptId }, now())
  finishAudit(desk, manuscriptId)
  offerAssignment(db, editor, { manuscriptIds: [manuscriptId], reviewerId: reviewer.id }, now())
  expect(await statuses()).toEqual([200, 404, 404, 401])
  answerAssignment(db, reviewer, { manuscriptId, accept: true, reason: '', conflict: false }, now())
  const response = await desk.get(fileId, reviewer)
  expect(response.status).toBe(200)
  expect(response.headers.get('content-disposition')).not.toContain('Inglis')
  expect((await desk.get(fileId, editor)).headers.get('content-disposition')).toContain('Inglis')
})

test('a table is saved and never shown as a page', async () => {
  const desk = makeDesk()
  const response = await desk.send('comparison,p\n<script>,.02\n', { kind: 'table', name: 'kelp.csv' })
  const { fileId } = (await response.json()) as { fileId: string }
  const sent = await desk.get(fileId)
  expect(sent.headers.get('content-disposition')).toMatch(/^attachment;/) // saved, not shown
  expect(sent.headers.get('content-type')).toBe('text/csv; charset=utf-8')
})

test('its submitter removes a file of a draft; another does not', async () => {
  const desk = makeDesk()
  const fileId = await sendPdf(desk, await makePdf())
  const remove = (as: Actor) =>
    DELETE(
      new Request(`http://localhost:3000/api/files/${fileId}`, { method: 'DELETE', headers: own }),
      { params: Promise.resolve({ fileId }) },
      desk.around(as),
    )
  expect((await remove(desk.editor)).status).toBe(404)
  expect((await remove(desk.submitter)).status).toBe(200)
  expect(desk.db.select().from(files).get()?.replacedAt).not.toBeNull()
})

test('a name in a header ends no line and no quotation', () => {
  expect(describeDisposition('attachment', 'a"b\\c\r\nX: y%41.pdf')).toBe(
    `attachment; filename="a_b_c__X: y_41.pdf"; filename*=UTF-8''a%22b%5Cc%0D%0AX%3A%20y%2541.pdf`,
  )
  expect(describeDisposition('inline', '\ud800.pdf')).toContain("UTF-8''_.pdf")
})
