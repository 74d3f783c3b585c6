import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { WorkSheet } from '@e965/xlsx'
import { strFromU8, strToU8, unzipSync, zipSync } from 'fflate'
import { expect, test } from 'vitest'
import { guessDelimiter } from '@/lib/intake/table/delimited'
import { readTableFile } from '@/lib/intake/table/read-table'
import { makeFolder } from '../support/folder'
import { makeWorkbook } from '../support/workbook'

async function readRows(bytes: Buffer | string, name = 'results.csv') {
  const path = join(makeFolder(), name)
  writeFileSync(path, bytes)
  const { sheets } = await readTableFile(path)
  return sheets[0]?.rows ?? []
}

const texts = async (bytes: Buffer | string) =>
  (await readRows(bytes)).map((row) => row.map((cell) => cell.text))

test.each([
  ['commas', 'a,p\nx,.020\n'],
  ['semicolons', 'a;p\nx;.020\n'],
  ['tabs', 'a\tp\nx\t.020\n'],
  ['a mark of UTF-8', '\ufeffa,p\nx,.020\n'],
  ['a mark of UTF-16', Buffer.from('\ufeffa,p\nx,.020\n', 'utf16le')],
  ['UTF-16 without a mark', Buffer.from('a,p\nx,.020\n', 'utf16le')],
  ['carriage returns', 'a,p\r\nx,.020\r\n'],
  ['quotes', '"a","p"\n"x",".020"\n'],
])('a table with %s reads the same, digits as printed', async (_how, bytes) => {
  expect(await texts(bytes)).toEqual([
    ['a', 'p'],
    ['x', '.020'],
  ])
})

test('decimal commas do not pass for the delimiter', async () => {
  expect(await texts('a;t;p\nx;2,10;0,041\ny;3,00;0,004\n')).toEqual([
    ['a', 't', 'p'],
    ['x', '2,10', '0,041'],
    ['y', '3,00', '0,004'],
  ])
  expect(guessDelimiter('0,02;0,04\n0,03;0,05\n')).toBe(';')
  expect(guessDelimiter('"a, b",p,q\nx,.1,.2\n')).toBe(',')
  expect(guessDelimiter('one line of words')).toBeNull()
})

test('Western letters of an older spreadsheet are read by their code page', async () => {
  expect(await texts(Buffer.from('Größe,p\n± 2 µm,.02\n', 'latin1'))).toEqual([
    ['Größe', 'p'],
    ['± 2 µm', '.02'],
  ])
})

test('a quoted cell keeps its line break, and rows may differ in length', async () => {
  expect(await texts('a,p\n"x\ny",.02,extra\n')).toEqual([
    ['a', 'p'],
    ['x\ny', '.02', 'extra'],
  ])
})

const format = (cell: string, z: string) => (sheet: WorkSheet) => {
  sheet[cell].z = z
}

test('a number of a workbook is read as it is shown, with its value beside it', async () => {
  const rows = await readRows(makeWorkbook([['p'], [0.0212345]], format('A2', '0.000')))
  expect(rows[1]).toEqual([{ text: '0.021', value: 0.0212345 }])
})

test('a number without format is read in its shortest digits', async () => {
  const rows = await readRows(makeWorkbook([[0.1 + 0.2, 0.00123456789012, 1e-7, 3]]))
  expect(rows[0]?.map((cell) => cell.text)).toEqual(['0.3', '0.00123456789012', '1e-7', '3'])
})

test('a formula counts by its last result; an error, a truth and a date hold no number', async () => {
  const rows = await readRows(
    makeWorkbook([[0.04, 1, true, 45000]], (sheet) => {
      sheet.A1 = { t: 'n', v: 0.04, f: 'MIN(1,4*0.01)' }
      sheet.B1 = { t: 'e', v: 7, w: '#DIV/0!' }
      sheet.D1.z = 'yyyy-mm-dd'
    }),
  )
  expect(rows[0]).toEqual([
    { text: '0.04', value: 0.04 },
    { text: '#DIV/0!', value: null },
    { text: 'TRUE', value: null },
    { text: '2023-03-15', value: null, date: true },
  ])
})

test('text that looks like a number stays text, printed as it is', async () => {
  const rows = await readRows(makeWorkbook([['.020', '< .001']]))
  expect(rows[0]).toEqual([
    { text: '.020', value: null },
    { text: '< .001', value: null },
  ])
})

test('a sheet that declares the whole grid costs no more than its cells', async () => {
  const parts = unzipSync(
    makeWorkbook([
      ['a', 'p'],
      ['x', 0.02],
    ]),
  )
  const sheet = 'xl/worksheets/sheet1.xml'
  const xml = strFromU8(parts[sheet] ?? new Uint8Array()).replace('A1:B2', 'A1:XFD1048576')
  expect(xml).toContain('XFD1048576')
  const rows = await readRows(Buffer.from(zipSync({ ...parts, [sheet]: strToU8(xml) })))
  expect(rows).toHaveLength(2)
})

test('every sheet of a workbook is read under its name', async () => {
  const path = join(makeFolder(), 'results.xlsx')
  writeFileSync(path, makeWorkbook([['a']]))
  expect(await readTableFile(path, 'handed in.xlsx')).toMatchObject({
    file: 'handed in.xlsx',
    sheets: [{ name: 'results', rows: [[{ text: 'a' }]] }],
  })
})

test('more rows than a results table has are refused', async () => {
  const rows = readRows(`a,p\n${'x,.02\n'.repeat(200_000)}`)
  await expect(rows).rejects.toMatchObject({ refusal: 'too-large' })
})

test('bytes that are no table are refused', async () => {
  await expect(readRows(Buffer.from([0, 1, 2, 0, 200, 7]))).rejects.toMatchObject({ refusal: 'unreadable' })
  await expect(readRows(Buffer.from('PK\u0003\u0004 and no archive'))).rejects.toMatchObject({
    refusal: 'unreadable',
  })
})

test('a first line that declares the delimiter is no row', async () => {
  expect(await texts('sep=;\r\na;p\r\nx;0,02\r\n')).toEqual([
    ['a', 'p'],
    ['x', '0,02'],
  ])
})

test('row names without a head, and blanks between quoted names', async () => {
  expect(await texts('"t" "p"\n"A - B" 2.1 0.047\n"A - C" 3.0 0.006\n')).toEqual([
    ['', 't', 'p'],
    ['A - B', '2.1', '0.047'],
    ['A - C', '3.0', '0.006'],
  ])
  expect(await texts('t\tp\nA - B\t2.1\t0.047\nA - C\t3.0\t0.006\n')).toEqual([
    ['', 't', 'p'],
    ['A - B', '2.1', '0.047'],
    ['A - C', '3.0', '0.006'],
  ])
})

test('UTF-16 with its bytes the other way round, and quoted cells with a decimal comma', async () => {
  const swapped = Buffer.from('\ufeffa\tp\nx\t,020\n', 'utf16le').swap16()
  expect(await texts(swapped)).toEqual([
    ['a', 'p'],
    ['x', ',020'],
  ])
  expect(await texts('a,t,p\nx,"2,10","0,041"\ny,"3,00","0,004"\n')).toEqual([
    ['a', 't', 'p'],
    ['x', '2,10', '0,041'],
    ['y', '3,00', '0,004'],
  ])
})

async function readBook(bytes: Buffer) {
  const path = join(makeFolder(), 'results.xlsx')
  writeFileSync(path, bytes)
  return readTableFile(path)
}

test('a format that rounds a p-value away does not make it zero; percent keeps its sign', async () => {
  const bytes = makeWorkbook([['p'], [0.0000213], [0.0321], [0]], (sheet) => {
    for (const cell of ['A2', 'A4']) sheet[cell].z = '0.000'
    sheet.A3.z = '0.0%'
  })
  expect((await readBook(bytes)).sheets[0]?.rows.slice(1).map(([cell]) => cell)).toEqual([
    { text: '0.0000213', value: 0.0000213 },
    { text: '3.2%', value: 0.0321 },
    { text: '0.000', value: 0 },
  ])
})

test('merged cells are told by their first cell and their size', async () => {
  const bytes = makeWorkbook(
    [
      ['Grazing', '', 'x'],
      ['t', 'p', 'q'],
    ],
    (sheet) => {
      sheet['!merges'] = [{ s: { r: 0, c: 0 }, e: { r: 0, c: 1 } }]
    },
  )
  expect((await readBook(bytes)).sheets[0]?.merges).toEqual([[0, 0, 1, 2]])
})

test('hidden rows and columns are read, and said', async () => {
  const rows = [
    ['Pair', 'p', 'n'],
    ['A vs B', 0.02, 8],
    ['A vs C', 0.03, 8],
    ['B vs C', 0.04, 8],
  ]
  const bytes = makeWorkbook(rows, (sheet) => {
    sheet['!rows'] = [{}, { hidden: true }, { hidden: true }]
    sheet['!cols'] = [{}, {}, { hidden: true }]
  })
  const read = await readBook(bytes)
  expect(read.sheets[0]?.rows).toHaveLength(4)
  expect(read.remarks?.map(({ says }) => says)).toEqual([
    'Hidden in the results table: rows 2–3 and column C of the sheet "results". It was read with the rest; check whether it belongs to the results.',
  ])
  const hidden = makeWorkbook(rows, (_sheet, book) => {
    book.Workbook = { Sheets: [{ Hidden: 1 }] }
  })
  expect((await readBook(hidden)).remarks?.map(({ says }) => says)).toEqual([
    'Hidden in the results table: the sheet "results". It was read with the rest; check whether it belongs to the results.',
  ])
})
