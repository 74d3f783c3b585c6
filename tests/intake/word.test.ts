import { createHash } from 'node:crypto'
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { strToU8, zipSync } from 'fflate'
import { expect, test } from 'vitest'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { layOut } from '@/lib/checks/text/lay-out'
import { auditFiles } from '@/lib/intake/audit-files'
import { checkManuscript } from '@/lib/intake/check/check-manuscript'
import { readManuscript } from '@/lib/intake/read-manuscript'
import { defaultLimits } from '@/lib/intake/thread/run-thread'
import { getReadingCopyPath, keepReadingCopy } from '@/lib/intake/store/reading-copy'
import { WORD_DOCUMENT } from '@/lib/rules/words'
import { listAll, makeFolder } from '../support/folder'
import { italic, lowered, makeWord, raised, wordParagraph, wordRun, wordTable } from '../support/word'

function put(bytes: Uint8Array, name = 'manuscript.docx'): string {
  const path = join(makeFolder(), name)
  writeFileSync(path, bytes)
  return path
}

async function readWord(given: Parameters<typeof makeWord>[0]) {
  const { document, readingCopy } = await readManuscript(put(makeWord(given)))
  return { document, readingCopy, ...layOut(document) }
}

const texts = (rows: { text: string }[][]) => rows.map((row) => row.map(({ text }) => text))

test('Greek, minus, signs, raised and lowered characters of a Word document survive', async () => {
  const { prose } = await readWord({
    body: wordParagraph(
      wordRun('F', italic) +
        wordRun('(3, 36) = 4.21, ') +
        wordRun('p', italic) +
        wordRun(' ≤ .012, η') +
        wordRun('2', raised) +
        wordRun(' = 0.26, t') +
        wordRun('38', lowered) +
        wordRun(' = −2.46, 4.1 × 10⁻⁵, χ²(2) = 6.15, 𝑝 ≥ .05, Å ± 3'),
    ),
  })
  expect(prose.text).toBe(
    'F(3, 36) = 4.21, p ≤ .012, η^2 = 0.26, t_38 = -2.46, 4.1 × 10^-5, χ2(2) = 6.15, p ≥ .05, Å ± 3',
  )
})

test('an equation is read as the line of text it stands for', async () => {
  const text = (t: string) => `<m:r><m:t>${t}</m:t></m:r>`
  const { prose } = await readWord({
    body: wordParagraph(
      `<m:oMathPara><m:oMath><m:sSup><m:e>${text('χ')}</m:e><m:sup>${text('2')}</m:sup></m:sSup><m:d><m:e>${text('3')}</m:e></m:d>${text(' = 9.10, p = .028')}</m:oMath></m:oMathPara>` +
        wordRun(' and ') +
        `<m:oMath><m:f><m:num>${text('0.05')}</m:num><m:den>${text('k')}<m:r><m:t>(k − 1)</m:t></m:r></m:den></m:f></m:oMath>`,
    ),
  })
  expect(prose.text).toBe('χ2(3) = 9.10, p = .028 and 0.05/(k(k - 1))')
})

test('letters of the Symbol font and fields are read as they are drawn; hidden text is not read', async () => {
  const { prose } = await readWord({
    body: wordParagraph(
      `<w:fldSimple w:instr=" SEQ Table ">${wordRun('Table 4')}</w:fldSimple>` +
        wordRun(' shows that ') +
        wordRun('c', '<w:rFonts w:ascii="Symbol" w:hAnsi="Symbol"/>') +
        wordRun('2', raised) +
        wordRun('(1) = 4.02') +
        wordRun(' p = .999', '<w:vanish/>') +
        wordRun('.'),
    ),
  })
  expect(prose.text).toBe('Table 4 shows that χ2(1) = 4.02.')
})

const rows = [
  ['Comparison', 'Difference', 't(36)', 'p', 'Adjusted p'],
  ['Slate – shell', '−1.20', '−1.48', '.148', '.444'],
  ['Slate – rope', '3.41', '4.11', '< .001', '< .001'],
  ['Shell – rope', '2.21', '2.76', '.009', '.027'],
]

test('a table of a Word document is read cell by cell, under its caption', async () => {
  const { tables, prose } = await readWord({
    body:
      wordParagraph('Results', 'Heading1') +
      wordParagraph('All pairs were compared, as Table 2 shows. '.repeat(8)) +
      wordParagraph('Table 2. Comparisons of the three surfaces.') +
      wordTable(rows) +
      wordParagraph('The rope held best. '.repeat(10)),
  })
  expect(tables).toHaveLength(1)
  expect(tables[0]).toMatchObject({ number: '2', columns: 5, page: 1 })
  expect(texts(tables[0]?.header ?? [])).toEqual([rows[0]])
  expect(texts(tables[0]?.rows ?? [])).toEqual(
    rows.slice(1).map((row) => row.map((cell) => cell.replace('−', '-'))),
  )
  expect(prose.text.match(/The rope held best/g)).toHaveLength(10)
})

test('a table longer than a page goes on under its head; a very wide one turns its page', async () => {
  const many = Array.from({ length: 90 }, (_, i) => [`Trait ${i}`, `${i}.21`, `.${String(i + 100)}`])
  const long = await readWord({
    body: wordParagraph('Table 1. Tests of ninety traits.') + wordTable([['Trait', 't(20)', 'p'], ...many]),
  })
  expect(long.document.pages.length).toBeGreaterThan(1)
  expect(long.tables.flatMap((table) => table.rows).map((row) => row[0]?.text)).toEqual(many.map(([a]) => a))
  const wide = await readWord({
    body:
      wordParagraph('Table 3. Means of many outcomes by surface.') +
      wordTable(
        Array.from({ length: 5 }, (_, i) =>
          Array.from({ length: 11 }, (__, j) => (i === 0 ? `Outcome ${j}` : `${i}.20 (1.14, 1.30)`)),
        ),
      ),
  })
  const turned = wide.document.pages.filter((page) => page.width > page.height)
  expect(turned).toHaveLength(1)
  expect(wide.tables[0]?.columns).toBe(11)
})

test('a number in a table is never broken over lines, in a narrow table or in one wider than the page', async () => {
  const plain = await readWord({
    body:
      wordParagraph(wordRun('Comparisons of lights are listed in the table that follows this line.')) +
      wordTable([
        ['Comparison', 't', 'df', 'p'],
        ['red vs blue', '2.43', '36', '.061'],
        ['red vs white', '3.31', '36', '.006'],
        ['red vs green', '0.52', '136', '.604'],
      ]),
  })
  expect(plain.tables.flatMap((table) => texts(table.rows))).toEqual([
    ['red vs blue', '2.43', '36', '.061'],
    ['red vs white', '3.31', '36', '.006'],
    ['red vs green', '0.52', '136', '.604'],
  ])
  const heads = Array.from({ length: 26 }, (_, i) => `p${i + 1}`)
  const row = heads.map((_, i) => `0.${10_000 + 37 * i}`)
  const wide = await readWord({
    body: wordParagraph(wordRun('All p-values stand in the table.')) + wordTable([heads, row, row, row]),
  })
  const drawn = wide.document.pages.flatMap(({ runs }) => runs.map(({ text }) => text.trim()))
  for (const number of row) expect(drawn.filter((text) => text === number)).toHaveLength(3)
}, 30_000)

test('a footnote stands at the foot of the page that refers to it', async () => {
  const { prose } = await readWord({
    body:
      wordParagraph(
        `${wordRun('The omnibus test was run first.')}<w:r><w:footnoteReference w:id="7"/></w:r>`,
      ) + wordParagraph('All pairs followed. '.repeat(400)),
    footnotes: { 7: wordParagraph('Kruskal–Wallis H(2) = 7.10, p = .029.') },
  })
  const at = prose.text.indexOf('H(2) = 7.10, p = .029')
  expect(at).toBeGreaterThan(0)
  expect(prose.pageOf(at)).toBe(1)
})

test('tracked changes are read as accepted, and that is said', async () => {
  const { prose, remarks } = await readWord({
    body: wordParagraph(
      `${wordRun('p = ')}<w:del><w:r><w:delText>.031</w:delText></w:r></w:del><w:ins>${wordRun('.013')}</w:ins>${wordRun('.')}`,
    ),
  })
  expect(prose.text).toBe('p = .013.')
  expect(remarks?.map(({ says }) => says)).toEqual([
    'The Word document has 2 tracked changes: it was read as if all were accepted.',
  ])
})

const picture =
  '<w:r><w:drawing><wp:inline><a:graphic><a:graphicData><pic:pic><pic:blipFill><a:blip r:link="rId9"/></pic:blipFill></pic:pic></a:graphicData></a:graphic></wp:inline></w:drawing></w:r>'

test('a picture, even one linked from elsewhere, is left out, and that is a note of the audit', async () => {
  const path = put(
    makeWord({
      body: wordParagraph('Figure 1 shows the means (p = .021).') + wordParagraph(picture),
      parts: {
        'word/_rels/document.xml.rels': strToU8(
          '<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId9" Type="image" Target="http://pictures.example/secret.png" TargetMode="External"/></Relationships>',
        ),
      },
    }),
  )
  const { audit } = await auditFiles({ manuscript: path, table: null, rules: defaultHouseRules })
  expect(audit.reports.map(({ value }) => value)).toEqual([0.021])
  expect(audit.findings.filter(({ rule }) => rule === 'unread-region')).toMatchObject([
    { severity: 'note', says: expect.stringContaining('1 picture of the Word document') },
  ])
})

test('an audit of a Word document is of the document handed in, and its pages are the copy’s', async () => {
  const docx = makeWord({
    body: wordParagraph('Kelp on rope', 'Title') + wordParagraph('Kelp held on, t(28) = 2.46, p = .020.'),
  })
  const files = { manuscript: put(docx, 'stored'), table: null, rules: defaultHouseRules }
  const first = await auditFiles(files)
  const again = await auditFiles(files)
  expect(first.audit.document).toEqual({
    pages: 1,
    sha256: createHash('sha256').update(docx).digest('hex'),
    title: 'Kelp on rope',
  })
  expect(first.audit.reports).toMatchObject([{ value: 0.02, place: { page: 1 } }])
  expect(Buffer.from(first.readingCopy ?? []).toString('latin1')).toMatch(/^%PDF-/) // a PDF
  expect(Buffer.from(first.readingCopy ?? []).equals(Buffer.from(again.readingCopy ?? []))).toBe(true)
})

test('the reading copy is kept beside its document and written anew by a later audit', async () => {
  const stored = put(Buffer.from('x'), 'abc')
  await keepReadingCopy(stored, Buffer.from('first'))
  await keepReadingCopy(stored, Buffer.from('second'))
  expect(readFileSync(getReadingCopyPath(stored), 'utf8')).toBe('second')
  expect(listAll(join(stored, '..'))).toEqual(['abc', 'abc.reading.pdf'])
})

const body = wordParagraph('Kelp held on (p = .021).')
const bomb = 'x'.repeat(301 * 1024 * 1024)

test.each([
  ['macros', makeWord({ body, parts: { 'word/vbaProject.bin': strToU8('x') } }), 'macros'],
  [
    'pictures that unpack without end',
    makeWord({ body, parts: { 'word/media/a.png': [strToU8(bomb), { level: 1 }] } }),
    'unpacks to more',
  ],
  [
    'a text that unpacks without end',
    makeWord({ body: `<w:p>${' '.repeat(41 * 1024 * 1024)}</w:p>` }),
    'unpacks to more',
  ],
  ['an archive of anything', zipSync({ 'a.txt': strToU8('x') }), 'a ZIP archive'],
  ['a workbook', zipSync({ 'xl/workbook.xml': strToU8('x') }), 'an Excel workbook'],
  ['an OpenDocument text', zipSync({ 'content.xml': strToU8('x') }), 'an OpenDocument file'],
  ['an end that is missing', makeWord({ body }).subarray(0, 1500), 'damaged or cut off'],
  [
    'a password or an old format',
    Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(2000)]),
    'an older or password-protected Office file, not a PDF or a Word document (.docx); please save',
  ],
])('a Word document with %s is refused in one sentence', async (_what, bytes, says) => {
  await expect(checkManuscript(put(bytes))).rejects.toMatchObject({ message: expect.stringContaining(says) })
})

test('a Word document is told by its content, whatever it is called', async () => {
  await expect(checkManuscript(put(makeWord({ body }), 'kelp.pdf'))).resolves.toBe(WORD_DOCUMENT)
})

const nested = (depth: number) =>
  `${'<w:sdt><w:sdtContent>'.repeat(depth)}${'</w:sdtContent></w:sdt>'.repeat(depth)}`

test.each([
  ['whose XML is broken', '<w:document><w:body></w:p>', 'damaged'],
  [
    'that declares entities',
    '<!DOCTYPE w [<!ENTITY a "aaaa"><!ENTITY b "&a;&a;&a;">]><w:document>&b;</w:document>',
    'damaged',
  ],
  ['without a body', '<x/>', 'damaged'],
])('a Word document %s is the document’s trouble', async (_what, xml, says) => {
  const path = put(makeWord({ body, parts: { 'word/document.xml': strToU8(xml) } }))
  await expect(readManuscript(path)).rejects.toMatchObject({
    refusal: 'unreadable',
    message: expect.stringContaining(says),
  })
})

test('a Word document that nests without end, is empty or is slow ends in a sentence about Word', async () => {
  await expect(readManuscript(put(makeWord({ body: nested(20_000) })))).rejects.toMatchObject({
    refusal: 'unreadable',
    message: expect.stringContaining('Word document'),
  })
  await expect(readManuscript(put(makeWord({ body: '' })))).rejects.toThrow('holds no text')
  const rushed = readManuscript(put(makeWord({ body })), { ...defaultLimits, milliseconds: 5 })
  await expect(rushed).rejects.toThrow('The Word document could not be read within 1 second')
})
