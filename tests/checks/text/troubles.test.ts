import { join } from 'node:path'
import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import { readPages } from '@/lib/intake/pdf/open-document'
import { makePdf } from '../../support/pdf'

type Pdf = PDFKit.PDFDocument
type Draw = (pdf: Pdf) => void

const serif = join(import.meta.dirname, '../../../node_modules/@fontsource/source-serif-4/files')

/** Lays out a real PDF of A4 that was drawn by hand, beginning with one empty page. */
async function layOutDrawn(draw: Draw) {
  const pdf = await makePdf({ pages: [''], options: { size: 'A4', margin: 60 }, draw })
  const document = await readPages(new Uint8Array(pdf), {
    maxPages: 100,
    recognition: { pages: 0, milliseconds: 0 },
    onPage: () => undefined,
    onRecognise: () => undefined,
  })
  return { document, ...layOut(document) }
}

const put = (pdf: Pdf, text: string, x: number, y: number, size = 10, font = 'Times-Roman') =>
  void pdf.font(font).fontSize(size).text(text, x, y, { lineBreak: false })

const filler = (n: number, name = 'line') =>
  Array.from({ length: n }, (_, i) => `${name} ${i} of the text is long enough to be one`)

const lines = (pdf: Pdf, texts: readonly string[], x: number, y: number, size = 10) =>
  texts.forEach((text, i) => put(pdf, text, x, y + 12 * i, size))

/** Pieces one after the other on a baseline: text, size, rise, font. */
function pieces(pdf: Pdf, x: number, y: number, all: readonly [string, number?, number?, string?][]) {
  let at = x
  for (const [text, size = 10, rise = 0, font = 'Times-Roman'] of all) {
    pdf.font(font).fontSize(size)
    pdf.text(text, at, y - rise, { lineBreak: false, baseline: 'alphabetic' })
    at += pdf.widthOfString(text)
  }
}

const textOf = async (draw: Draw) => (await layOutDrawn(draw)).prose.text

/** One line of text, drawn with this trouble, and what is read of it. */
const troubles: [name: string, draw: Draw, text: string][] = [
  ['plain text', (pdf) => put(pdf, 't(28) = 2.46, p = .021', 60, 100), 't(28) = 2.46, p = .021'],
  [
    'a raised power',
    (pdf) => pieces(pdf, 60, 100, [['p = 4.1 × 10'], ['–5', 6.5, 3.5], [' was small']]),
    'p = 4.1 × 10^-5 was small',
  ],
  [
    'lowered degrees of freedom',
    (pdf) => pieces(pdf, 60, 100, [['F'], ['2,38', 6.5, -2], [' = 3.60, p = .037']]),
    'F_2,38 = 3.60, p = .037',
  ],
  [
    'a raised mark behind a value',
    (pdf) => pieces(pdf, 60, 100, [['p = .037'], ['a', 6.5, 3.5], [' in all']]),
    'p = .037^a in all',
  ],
  [
    'ligatures',
    (pdf) =>
      put(
        pdf,
        'a significant first effect of flow',
        60,
        100,
        10,
        `${serif}/source-serif-4-latin-400-normal.woff`,
      ),
    'a significant first effect of flow',
  ],
  [
    'small capitals',
    (pdf) => pieces(pdf, 60, 100, [['the B'], ['ONFERRONI', 8], [' correction']]),
    'the BONFERRONI correction',
  ],
  [
    'italics in the middle of a statistic',
    (pdf) =>
      pieces(pdf, 60, 100, [
        ['(', 10],
        ['t', 10, 0, 'Times-Italic'],
        ['(28) = 2.46, '],
        ['p', 10, 0, 'Times-Italic'],
        [' = .021)'],
      ]),
    '(t(28) = 2.46, p = .021)',
  ],
  [
    'an equals sign that a damaged font draws as ¼',
    (pdf) => lines(pdf, ['(t(28) ¼ 2.46, p ¼ .021), (t(28) ¼ 1.20, p ¼ .240)'], 60, 100),
    '(t(28) = 2.46, p = .021), (t(28) = 1.20, p = .240)',
  ],
  [
    'a minus that a damaged font draws as À',
    (pdf) => put(pdf, '(t(28) = À2.46, r = À0.35, p = .021)', 60, 100),
    '(t(28) = -2.46, r = -0.35, p = .021)',
  ],
  [
    'a minus drawn as a dash, a space behind it',
    (pdf) => put(pdf, 't(28) = – 2.46 and t(28) = –1.20', 60, 100),
    't(28) = -2.46 and t(28) = -1.20',
  ],
  ['decimal commas', (pdf) => put(pdf, 't(28) = 2,46; p = 0,021', 60, 100), 't(28) = 2,46; p = 0,021'],
  ['a raised point for a decimal point', (pdf) => put(pdf, 'p = 0·021', 60, 100), 'p = 0.021'],
  [
    'characters drawn one by one',
    (pdf) =>
      pieces(
        pdf,
        60,
        100,
        [...'t(28) = 2.46, p = .021'].map((char): [string] => [char]),
      ),
    't(28) = 2.46, p = .021',
  ],
  [
    'a number drawn in two pieces',
    (pdf) => pieces(pdf, 60, 100, [['p = .0'], ['21 in the first week']]),
    'p = .021 in the first week',
  ],
  [
    'text drawn twice to look bold',
    (pdf) => {
      put(pdf, 'p = .021 in the first week', 60, 100)
      put(pdf, 'p = .021 in the first week', 60.3, 100)
    },
    'p = .021 in the first week',
  ],
  ['tiny text', (pdf) => put(pdf, 't(28) = 2.46, p = .021', 60, 100, 3), 't(28) = 2.46, p = .021'],
  [
    'invisible text, as a recogniser leaves it over a scan',
    (pdf) =>
      void pdf
        .font('Times-Roman')
        .fontSize(10)
        .text('p = .021 in the first week', 60, 100, { lineBreak: false, fill: false, stroke: false }),
    'p = .021 in the first week',
  ],
  [
    'a page that lies on its side in the file',
    (pdf) => {
      Object.assign(pdf.page.dictionary.data, { Rotate: 90 })
      pdf.rotate(-90, { origin: [300, 400] })
      put(pdf, 't(28) = 2.46, p = .021', 200, 400)
    },
    't(28) = 2.46, p = .021',
  ],
  [
    'a page upside down',
    (pdf) => {
      pdf.rotate(180, { origin: [300, 400] })
      put(pdf, 't(28) = 2.46, p = .021', 200, 400)
    },
    't(28) = 2.46, p = .021',
  ],
  [
    'four hundred fonts',
    (pdf) => {
      const words = Array.from({ length: 400 }, (_, i) => `w${i}`)
      words.forEach((word, i) => {
        const name = `font-${i}`
        pdf.registerFont(name, i % 2 === 0 ? 'Times-Roman' : 'Times-Italic')
        put(pdf, word, 60 + 24 * (i % 20), 100 + 12 * Math.floor(i / 20), 8, name)
      })
    },
    Array.from({ length: 400 }, (_, i) => `w${i}`).join(' '),
  ],
  [
    'a word broken at the end of a line',
    (pdf) => lines(pdf, ['The differences were not signi-', 'ficant after the correction.'], 60, 100),
    'The differences were not significant after the correction.',
  ],
  [
    'a compound broken at its hyphen',
    (pdf) => lines(pdf, ['All of the values were Bonferroni-', 'corrected for six comparisons.'], 60, 100),
    'All of the values were Bonferroni-corrected for six comparisons.',
  ],
]

test.each(troubles)('%s is read as it is meant', async (_name, draw, text) => {
  expect(await textOf(draw)).toBe(text)
})

test('three columns are read one after the other', async () => {
  const text = await textOf((pdf) =>
    ['one', 'two', 'three'].forEach((name, i) => lines(pdf, filler(20, name), 40 + 180 * i, 100, 7)),
  )
  const places = ['one 19', 'two 0', 'two 19', 'three 0'].map((words) => text.indexOf(words))
  expect(places).not.toContain(-1)
  expect(places).toEqual([...places].sort((a, b) => a - b))
})

test('columns with a narrow gutter are read one after the other, a word broken over them whole', async () => {
  const text = await textOf((pdf) => {
    lines(pdf, [...filler(24, 'left'), 'the differences were all signi-'], 60, 100, 9)
    lines(pdf, ['ficant after the correction here', ...filler(24, 'right')], 232, 100, 9)
  })
  expect(text).toContain(
    'left 23 of the text is long enough to be one the differences were all significant after',
  )
})

test('line numbers, running heads and page numbers are set aside', async () => {
  const text = await textOf((pdf) => {
    for (const [at, name] of ['kelp', 'slate', 'rope'].entries()) {
      if (at > 0) pdf.addPage()
      put(pdf, 'Attachment to surfaces', 60, 30, 8)
      put(pdf, String(at + 1), 300, 800, 8)
      Array.from({ length: 30 }, (_, i) => {
        put(pdf, String(30 * at + i + 1), 35, 101 + 18 * i, 7)
        put(pdf, `${name} and more of the text of a line that is long enough to be one`, 60, 100 + 18 * i)
      })
    }
  })
  expect(text).not.toContain('Attachment')
  expect(text).not.toMatch(/\d/)
  expect(text.match(/kelp and more/g)).toHaveLength(30)
  expect(text).toContain('long enough to be one slate and more')
})

test('a sentence goes on over a page, past a footnote and a picture', async () => {
  const text = await textOf((pdf) => {
    lines(pdf, [...filler(30), 'The difference was not significant (t(28) ='], 60, 100)
    put(pdf, '1 A note at the foot of the page.', 60, 780, 7)
    pdf.addPage().rect(60, 60, 300, 200).fill('#aaa')
    pdf.fill('black')
    lines(pdf, ['1.20, p = .240) in the second week.', ...filler(20)], 60, 300)
  })
  expect(text).toContain('(t(28) = 1.20, p = .240) in the second week.')
})

const rows = [
  ['Comparison', 't(28)', 'p', 'Adjusted p'],
  ['Slate – rope', '3.12', '.004', '.012'],
  ['Slate – shell', '–1.04', '.307', '.921'],
  ['Rope – shell', '2.31', '.028', '.084'],
]
const xs = [60, 180, 250, 320]
const table = (pdf: Pdf, y: number, all = rows, ruled = false) =>
  all.forEach((row, i) => {
    row.forEach((cell, j) => put(pdf, cell, xs[j] ?? 60, y + 14 * i, 9))
    if (ruled)
      for (const x of [55, 175, 245, 315, 400])
        pdf
          .moveTo(x, y + 14 * i - 3)
          .lineTo(x, y + 14 * i + 11)
          .lineTo(55, y + 14 * i + 11)
          .stroke()
  })
const cells = (found: { header: { text: string }[][]; rows: { text: string }[][] } | undefined) =>
  [...(found?.header ?? []), ...(found?.rows ?? [])].map((row) => row.map(({ text }) => text))
const expected = rows.map((row) => row.map((cell) => cell.replace(/^–/, '-')))

test.each([
  ['ruled', true],
  ['unruled', false],
])('a table that is %s is read cell by cell, its caption and notes with it', async (_how, ruled) => {
  const { tables, prose } = await layOutDrawn((pdf) => {
    lines(pdf, filler(6), 60, 60)
    put(pdf, 'Table 1. Pairwise comparisons of the surfaces.', 60, 150, 9)
    table(pdf, 170, rows, ruled)
    put(pdf, 'Note. Two-sided values; adjusted by Bonferroni.', 60, 230, 8)
    lines(pdf, filler(6, 'below'), 60, 270)
  })
  expect(cells(tables[0])).toEqual(expected)
  expect(tables[0]).toMatchObject({
    number: '1',
    caption: 'Table 1. Pairwise comparisons of the surfaces.',
    notes: 'Note. Two-sided values; adjusted by Bonferroni.',
  })
  expect(prose.text).not.toContain('.921')
})

test('a table turned by a quarter on its page is read cell by cell', async () => {
  const { tables } = await layOutDrawn((pdf) => {
    pdf.rotate(-90, { origin: [300, 400] })
    put(pdf, 'Table 1. Pairwise comparisons of the surfaces.', 60, 250, 9)
    table(pdf, 270)
  })
  expect(cells(tables[0])).toEqual(expected)
})

test('a head over two rows and over two columns stands above the columns it is meant for', async () => {
  const { tables } = await layOutDrawn((pdf) => {
    put(pdf, 'Table 2. Weeks one and two.', 60, 130, 9)
    put(pdf, 'Week one', 195, 150, 9)
    put(pdf, 'Week two', 335, 150, 9)
    const head = ['Surface', 't', 'p', 't', 'p']
    const body = [head, ['Slate', '3.12', '.004', '2.10', '.045'], ['Rope', '1.04', '.307', '0.92', '.365']]
    body.forEach((row, i) =>
      row.forEach((cell, j) => put(pdf, cell, [60, 180, 250, 320, 390][j] ?? 60, 164 + 14 * i, 9)),
    )
  })
  expect(tables[0]?.header.map((row) => row.map(({ text }) => text))).toEqual([
    ['', 'Week one', 'Week one', 'Week two', 'Week two'],
    ['Surface', 't', 'p', 't', 'p'],
  ])
  expect(tables[0]?.rows).toHaveLength(2)
})

test('a table goes on over the page with its head, and each part keeps its page', async () => {
  const many = Array.from({ length: 30 }, (_, i) => [
    `Trait ${String.fromCharCode(65 + i)}`,
    `${i % 4}.1${i % 10}`,
    `.${100 + i}`,
    `.${300 + i}`,
  ])
  const { tables } = await layOutDrawn((pdf) => {
    put(pdf, 'Table 1. Tests of thirty traits.', 60, 350, 9)
    table(pdf, 370, [rows[0] ?? [], ...many.slice(0, 28)])
    pdf.addPage()
    table(pdf, 60, [rows[0] ?? [], ...many.slice(28)])
  })
  expect(tables.map(({ page, number }) => [page, number])).toEqual([
    [1, '1'],
    [2, '1'],
  ])
  expect(tables.flatMap((one) => one.rows)).toHaveLength(30)
})

test('what a statistics program printed, set with spaces, is read cell by cell', async () => {
  const { tables } = await layOutDrawn((pdf) =>
    [
      'Comparison      estimate   SE   df  t.ratio  p.value',
      'slate - rope        3.41  0.83  28    4.108   0.0003',
      'slate - shell      -1.20  0.81  28   -1.481   0.1498',
      'rope - shell       -2.21  0.80  28   -2.763   0.0100',
    ].forEach((line, i) => put(pdf, line, 60, 100 + 12 * i, 9, 'Courier')),
  )
  expect(tables[0]?.rows.map((row) => row.at(-1)?.text)).toEqual(['0.0003', '0.1498', '0.0100'])
})

test('text of annotations and forms is not text of the manuscript', async () => {
  const text = await textOf((pdf) => {
    put(pdf, 'Kelp held on to slate (p = .021).', 60, 100)
    pdf.note(60, 140, 100, 20, 'p = .999')
    pdf.initForm()
    pdf.formText('answer', 60, 180, 200, 20, { value: 'p = .888' })
  })
  expect(text).toBe('Kelp held on to slate (p = .021).')
})

test('writing from right to left and from top to bottom harms nothing beside it', async () => {
  const text = await textOf((pdf) => {
    put(pdf, 'Kelp held on to slate (p = .021).', 60, 100)
    pdf.rotate(-90, { origin: [30, 400] })
    put(pdf, 'Downloaded on 1 December', 30, 400, 8)
  })
  expect(text).toContain('Kelp held on to slate (p = .021).')
})

test('an empty page and a page that is a picture are named as unread, and the rest is read', async () => {
  const { prose, unread } = await layOutDrawn((pdf) => {
    put(pdf, 'Kelp held on to slate (p = .021).', 60, 100)
    pdf.addPage()
    pdf.addPage().circle(200, 200, 80).fill('#777')
  })
  expect(prose.text).toBe('Kelp held on to slate (p = .021).')
  expect(unread.map(({ page }) => page)).toEqual([2, 3])
})
