import { createHash } from 'node:crypto'
import { mkdirSync, readFileSync, utimesSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { zipSync } from 'fflate'
import { expect, test } from 'vitest'
import { storeFile } from '@/lib/intake/store-file'
import { cleanFileName } from '@/lib/intake/store/file-name'
import { removeStaleUploads } from '@/lib/intake/store/remove-stale-uploads'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import { listAll, makeFolder } from '../support/folder'
import { makePdf } from '../support/pdf'
import { makeWorkbook } from '../support/workbook'

const megabyte = 1024 * 1024
const table = 'comparison,p\nkelp vs rock,.021\nkelp vs sand,.300\n'

type Place = Partial<Parameters<typeof storeFile>[1]>

function store(folder: string, bytes: Uint8Array | string, kind: 'manuscript' | 'table', place: Place = {}) {
  const body = Readable.from(inPieces(Buffer.from(bytes)))
  return storeFile(body, { folder, kind, limit: 5 * megabyte, ...place })
}

function* inPieces(bytes: Buffer, size = 10_000) {
  for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size)
}

test('a PDF is stored under its hash, whole, and no temporary file stays', async () => {
  const folder = makeFolder()
  const pdf = await makePdf({
    pages: Array.from({ length: 30 }, (_, i) => `Page ${i}. ${'kelp '.repeat(400)}`),
  })
  const { sha256, bytes, mediaType } = await store(folder, pdf, 'manuscript')
  expect({ bytes, mediaType }).toEqual({ bytes: pdf.length, mediaType: 'application/pdf' })
  expect(sha256).toBe(createHash('sha256').update(pdf).digest('hex'))
  expect(listAll(folder)).toEqual([`${sha256.slice(0, 2)}/${sha256.slice(2)}`])
  expect(readFileSync(getStoredPath(folder, sha256)).equals(pdf)).toBe(true)
})

test('the same file twice is one file', async () => {
  const folder = makeFolder()
  const pdf = await makePdf()
  await store(folder, pdf, 'manuscript')
  await store(folder, pdf, 'manuscript')
  expect(listAll(folder)).toHaveLength(1)
})

test.each([
  ['CSV', table, 'text/csv'],
  ['CSV with semicolons and decimal commas', 'comparison;p;q\na;0,02;0,03\nb;0,04;0,05\n', 'text/csv'],
  ['TSV', table.replaceAll(',', '\t'), 'text/tab-separated-values'],
  ['CSV that begins like a bitmap', 'BMI,p\n1,.02\n', 'text/csv'],
  ['CSV in UTF-16', Buffer.from(`\ufeff${table}`, 'utf16le'), 'text/csv'],
  ['CSV in the Western code page', Buffer.from('Größe,p\nkühl,.02\n', 'latin1'), 'text/csv'],
  [
    'XLSX',
    makeWorkbook([
      ['comparison', 'p'],
      ['a', 0.02],
    ]),
    'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
  ],
])('a table as %s is taken by its content', async (_what, bytes, mediaType) => {
  const folder = makeFolder()
  await expect(store(folder, bytes, 'table')).resolves.toMatchObject({ mediaType })
})

const png = Buffer.from('89504e470d0a1a0a0000000d49484452000000010000000108060000001f15c489', 'hex')
const docx = zipSync({
  '[Content_Types].xml': Buffer.from(
    '<Types><Override PartName="/word/document.xml" ContentType="application/vnd.openxmlformats-officedocument.wordprocessingml.document.main+xml"/></Types>',
  ),
  'word/document.xml': Buffer.from('<w:document/>'),
})
const older = Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(2000)])
const bomb = zipSync({
  'xl/workbook.xml': Buffer.from('<workbook/>'),
  'xl/worksheets/sheet1.xml': Buffer.alloc(210 * megabyte),
})
/** The same bomb with its listing changed to say that the sheet has 100 bytes. */
const lyingBomb = (() => {
  const bytes = Buffer.from(
    zipSync({
      'xl/workbook.xml': Buffer.from('<workbook/>'),
      'xl/worksheets/sheet1.xml': Buffer.alloc(40 * megabyte),
    }),
  )
  const size = Buffer.alloc(4)
  size.writeUInt32LE(40 * megabyte)
  for (let at = bytes.indexOf(size); at >= 0; at = bytes.indexOf(size, at + 4)) bytes.writeUInt32LE(100, at)
  return bytes
})()

test.each([
  ['nothing', 'manuscript', '', 'unreadable', 'The file is empty'],
  ['a web page', 'manuscript', '<!DOCTYPE html><html><body>Log in</body></html>', 'unreadable', 'a web page'],
  ['a picture', 'manuscript', png, 'unreadable', 'a picture (PNG)'],
  [
    'a Word document without its text',
    'manuscript',
    zipSync({ 'word/styles.xml': Buffer.from('<w:styles/>') }),
    'unreadable',
    'a ZIP archive, not a PDF or a Word document (.docx); please save the manuscript as .docx or export it as PDF',
  ],
  ['an older Office file', 'manuscript', older, 'unreadable', 'an older or password-protected Office file'],
  ['plain text', 'manuscript', 'Kelp held on (p = .021).', 'unreadable', 'plain text'],
  ['a table', 'manuscript', table, 'unreadable', 'plain text'],
  ['nothing', 'table', '', 'unreadable', 'The file is empty'],
  [
    'an older workbook',
    'table',
    older,
    'unreadable',
    'an older or password-protected Office file, not a results table; please save',
  ],
  ['a Word document', 'table', docx, 'unreadable', 'a Word document'],
  ['an archive', 'table', zipSync({ 'a.csv': Buffer.from(table) }), 'unreadable', 'a ZIP archive'],
  ['a picture', 'table', png, 'unreadable', 'a picture (PNG)'],
  [
    'a web page called .xls',
    'table',
    '<html><table><tr><td>a,b</td></tr>\n<tr></tr></table></html>',
    'unreadable',
    'a web page',
  ],
  ['a sentence', 'table', 'Nothing to see here\nat all\n', 'unreadable', 'has no columns'],
  ['a header alone', 'table', 'comparison,p\n', 'unreadable', 'no row beneath its header'],
  [
    'bytes without sense',
    'table',
    Buffer.from([1, 2, 3, 0, 0, 7, 44, 10, 9, 200]),
    'unreadable',
    'of an unknown kind',
  ],
  [
    'a workbook cut off',
    'table',
    makeWorkbook([
      ['a', 'p'],
      ['x', 1],
    ]).subarray(0, 3000),
    'unreadable',
    'damaged or cut off',
  ],
  ['a workbook that unpacks without end', 'table', bomb, 'too-large', 'unpacks to more'],
  ['a workbook that lies about its size', 'table', lyingBomb, 'unreadable', 'damaged or cut off'],
] as const)(
  '%s handed in as a %s is refused in one sentence and leaves nothing',
  async (_w, kind, bytes, refusal, says) => {
    const folder = makeFolder()
    const stored = store(folder, bytes, kind)
    await expect(stored).rejects.toMatchObject({ refusal, message: expect.stringContaining(says) })
    expect(listAll(folder)).toEqual([])
  },
)

test.each([0.5, 0.9, 0.999])('a PDF cut off after %f of its length is refused as cut off', async (part) => {
  const folder = makeFolder()
  const pdf = await makePdf({ pages: ['one '.repeat(2000), 'two '.repeat(2000)] })
  const cut = pdf.subarray(0, Math.floor(pdf.length * part))
  await expect(store(folder, cut, 'manuscript')).rejects.toThrow('The file is cut off')
  expect(listAll(folder)).toEqual([])
})

test('the limit is held while the file arrives: what is too large is not read to its end', async () => {
  const folder = makeFolder()
  let sent = 0
  async function* endless() {
    for (;;) {
      sent += 100_000
      yield Buffer.alloc(100_000, '%PDF-1.7 ')
    }
  }
  const stored = storeFile(endless(), { folder, kind: 'manuscript', limit: megabyte })
  await expect(stored).rejects.toMatchObject({
    refusal: 'too-large',
    message: expect.stringContaining('larger than 1 MB'),
  })
  expect(sent).toBeLessThan(1.3 * megabyte)
  expect(listAll(folder)).toEqual([])
})

test('what is declared as too large is refused before a byte is read', async () => {
  const folder = makeFolder()
  const stored = store(folder, 'x', 'manuscript', { declaredBytes: 6 * megabyte })
  await expect(stored).rejects.toMatchObject({ refusal: 'too-large' })
})

test('fewer bytes than declared are a file cut off, even where its end looks whole', async () => {
  const folder = makeFolder()
  const stored = store(folder, table, 'table', { declaredBytes: table.length + 1 })
  await expect(stored).rejects.toThrow('The file is cut off')
  expect(listAll(folder)).toEqual([])
})

test('a stream that breaks in the middle leaves nothing', async () => {
  const folder = makeFolder()
  async function* breaking() {
    yield Buffer.from('%PDF-1.7 ')
    throw new Error('connection reset')
  }
  const stored = storeFile(breaking(), { folder, kind: 'manuscript', limit: megabyte })
  await expect(stored).rejects.toThrow('connection reset')
  expect(listAll(folder)).toEqual([])
})

test('a sender who leaves in the middle leaves nothing', async () => {
  const folder = makeFolder()
  const leaving = new AbortController()
  async function* left() {
    yield Buffer.from('%PDF-1.7 ')
    leaving.abort()
    yield Buffer.from('more')
  }
  const stored = storeFile(left(), { folder, kind: 'manuscript', limit: megabyte, signal: leaving.signal })
  await expect(stored).rejects.toThrow()
  expect(listAll(folder)).toEqual([])
})

test('what a crash left behind is removed after an hour, what is arriving stays', async () => {
  const folder = makeFolder()
  mkdirSync(join(folder, '.tmp'))
  for (const name of ['old', 'new']) writeFileSync(join(folder, '.tmp', name), 'x')
  const now = Date.now()
  utimesSync(join(folder, '.tmp', 'old'), new Date(now - 7_200_000), new Date(now - 7_200_000))
  expect(await removeStaleUploads(folder, now)).toBe(1)
  expect(listAll(folder)).toEqual(['.tmp/new'])
  expect(await removeStaleUploads(join(folder, 'absent'), now)).toBe(0)
})

test('only a hash names a stored file', () => {
  expect(() => getStoredPath('/uploads', '../../etc/passwd')).toThrow(RangeError)
  expect(() => getStoredPath('/uploads', 'A'.repeat(64))).toThrow(RangeError)
})

test.each([
  ['kelp.pdf', 'kelp.pdf'],
  ['../../etc/passwd', 'passwd'],
  ['C:\\papers\\kelp.pdf', 'kelp.pdf'],
  ['a\u0000b\nc.pdf', 'abc.pdf'],
  ['kelp\u202efdp.exe', 'kelpfdp.exe'],
  ['  Größe  und   Form.pdf ', 'Größe und Form.pdf'],
  ['..', 'manuscript.pdf'],
  ['folder/', 'manuscript.pdf'],
  ['', 'manuscript.pdf'],
])('the name %j is kept as %j', (given, kept) => {
  expect(cleanFileName(given, 'manuscript.pdf')).toBe(kept)
})

test('a name is at most 200 characters long and keeps its ending', () => {
  const name = cleanFileName(`${'😀'.repeat(300)}.pdf`, 'x')
  expect([...name]).toHaveLength(200)
  expect(name.endsWith('😀.pdf')).toBe(true)
})
