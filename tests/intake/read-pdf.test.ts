import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { auditFiles } from '@/lib/intake/audit-files'
import { readPdf } from '@/lib/intake/pdf/read-pdf'
import { defaultLimits } from '@/lib/intake/thread/run-thread'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeFolder } from '../support/folder'
import { makePdf } from '../support/pdf'

async function put(given: Parameters<typeof makePdf>[0]): Promise<string> {
  const path = join(makeFolder(), 'manuscript.pdf')
  writeFileSync(path, await makePdf(given))
  return path
}

test('the text of every page comes with its place, in points from the lower left corner', async () => {
  const path = await put({ pages: ['', ''], draw: (pdf) => void pdf.text('p = .021', 100, 200) })
  const seen: number[] = []
  const { pages, sha256 } = await readPdf(path, defaultLimits, (page) => seen.push(page))
  expect(seen).toEqual([1, 2])
  expect(sha256).toMatch(/^[0-9a-f]{64}$/) // a SHA-256
  const [run] = pages[1]?.runs ?? []
  expect(run).toMatchObject({ text: 'p = .021', size: 12, angle: 0 })
  expect(run?.x).toBeCloseTo(100, 1)
  // US letter is 792 points high; the text begins 200 from its top, the baseline an ascent below.
  expect(run?.y).toBeGreaterThan(792 - 200 - 12)
  expect(run?.y).toBeLessThan(792 - 200)
})

test('a PDF with a password says so', async () => {
  const path = await put({ options: { userPassword: 'kelp', pdfVersion: '1.7' } })
  await expect(readPdf(path)).rejects.toMatchObject({
    refusal: 'unreadable',
    message: expect.stringContaining('protected by a password'),
  })
})

test('a PDF of pictures alone says so', async () => {
  const path = await put({ pages: [''], draw: (pdf) => void pdf.rect(50, 50, 300, 300).fill('#333') })
  await expect(readPdf(path)).rejects.toThrow('pictures of its pages and no text')
})

test('a damaged PDF says so', async () => {
  const path = join(makeFolder(), 'damaged.pdf')
  writeFileSync(path, `%PDF-1.7\n${'x'.repeat(500)}\nstartxref\n9\n%%EOF`)
  await expect(readPdf(path)).rejects.toThrow('damaged')
})

test('a file that is not there is no fault of the file', async () => {
  const reading = readPdf(join(makeFolder(), 'absent.pdf'))
  await expect(reading).rejects.toMatchObject({ code: 'ENOENT' })
  await expect(reading).rejects.not.toHaveProperty('refusal')
})

test('a PDF with too many pages and one that takes too long are refused in words', async () => {
  const path = await put({ pages: Array.from({ length: 20 }, () => 'kelp '.repeat(800)) })
  await expect(readPdf(path, { ...defaultLimits, pages: 3 })).rejects.toThrow('more pages than can be read')
  const rushed = readPdf(path, { ...defaultLimits, milliseconds: 5 })
  await expect(rushed).rejects.toThrow('could not be read within')
})

test('a reading can be called off', async () => {
  const path = await put({ pages: Array.from({ length: 20 }, () => 'kelp '.repeat(800)) })
  const calling = new AbortController()
  const files = { manuscript: path, table: null, rules: defaultHouseRules }
  const audited = auditFiles(files, {
    signal: calling.signal,
    onProgress: () => calling.abort(new Error('called off')),
  })
  await expect(audited).rejects.toThrow('called off')
})

test('a table that cannot be read ends the audit with the table’s own sentence', async () => {
  const manuscript = await put({})
  const path = join(makeFolder(), 'results.xlsx')
  writeFileSync(path, 'PK and no archive')
  const files = { manuscript, table: { path, name: 'results.xlsx' }, rules: defaultHouseRules }
  await expect(auditFiles(files)).rejects.toMatchObject({
    refusal: 'unreadable',
    message: expect.stringContaining('spreadsheet'),
  })
})
