import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import type { PdfTable, TextRun } from '@/lib/checks/types'
import { block, document, page, prose, row, run } from './runs'

const texts = (table: PdfTable | undefined) => table?.rows.map((cells) => cells.map(({ text }) => text))
const heads = (table: PdfTable | undefined) => table?.header.map((cells) => cells.map(({ text }) => text))

const pairs = [
  ['A vs B', '-2.46', '0.021'],
  ['A vs C', '1.20', '0.240'],
  ['B vs C', '3.66', '<0.001'],
]

/** A table of three pairs with its caption above, its first column at `x`. */
function pairTable(x: number, top: number, more: Partial<TextRun> = {}): TextRun[] {
  return [
    run('Table 1. Pairwise comparisons.', x, top, more),
    ...row(
      [
        ['Pair', x],
        ['t', x + 80],
        ['P', x + 130],
      ],
      top - 16,
      more,
    ),
    ...pairs.flatMap(([a = '', b = '', c = ''], i) =>
      row(
        [
          [a, x],
          [b, x + 80],
          [c, x + 130],
        ],
        top - 28 - i * 12,
        more,
      ),
    ),
  ]
}

test('a table is read with caption, number, header and rows, and its text is not in the prose', () => {
  const { tables, prose: read } = layOut(
    document(
      page([
        ...prose(4, 60, 700),
        ...pairTable(60, 620),
        run('Note. Holm-adjusted values.', 60, 546, { size: 8 }),
        ...prose(4, 60, 500),
      ]),
    ),
  )
  expect(tables).toHaveLength(1)
  expect(tables[0]).toMatchObject({
    page: 1,
    number: '1',
    caption: 'Table 1. Pairwise comparisons.',
    notes: 'Note. Holm-adjusted values.',
    columns: 3,
  })
  expect(heads(tables[0])).toEqual([['Pair', 't', 'P']])
  expect(texts(tables[0])).toEqual(pairs)
  expect(read.text).not.toContain('0.021')
  expect(read.text.slice(0, tables[0]?.offset)).toMatch(/Readings were taken/)
})

test('the box of a cell is where the cell was drawn', () => {
  const { tables } = layOut(document(page([...prose(4, 60, 700), ...pairTable(60, 620)])))
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = tables[0]?.rows[0]?.[2]?.boxes[0] ?? []
  expect([x0, y0, x1, y1].map(Math.round)).toEqual([190, 590, 215, 600])
})

test('a caption below, a Roman number on a line of its own and a caption of two lines are read', () => {
  const body = pairTable(60, 620).slice(1)
  const below = layOut(
    document(
      page([
        ...prose(4, 60, 720),
        ...body,
        run('Table 2: Pairwise comparisons.', 60, 556),
        ...prose(4, 60, 500),
      ]),
    ),
  )
  expect(below.tables[0]).toMatchObject({ number: '2', caption: 'Table 2: Pairwise comparisons.' })
  const roman = layOut(
    document(
      page([
        ...prose(4, 60, 720),
        run('TABLE II', 120, 646, { size: 8 }),
        run('PAIRWISE COMPARISONS', 90, 636, { size: 8 }),
        ...body,
        ...prose(4, 60, 500),
      ]),
    ),
  )
  expect(roman.tables[0]).toMatchObject({ number: 'II', caption: 'TABLE II PAIRWISE COMPARISONS' })
})

test('a header over several rows keeps its spanning heads over each of their columns', () => {
  const { tables } = layOut(
    document(
      page([
        ...prose(4, 60, 720),
        run('Table 3. Two outcomes.', 60, 640),
        ...row(
          [
            ['Yield of the plots', 155],
            ['Height of stems', 275],
          ],
          624,
        ),
        ...row(
          [
            ['Pair', 60],
            ['t', 150],
            ['P', 220],
            ['t', 270],
            ['P', 340],
          ],
          612,
        ),
        ...['A–B', 'A–C', 'B–C'].flatMap((pair, i) =>
          row(
            [
              [pair, 60],
              ['2.10', 150],
              ['0.041', 220],
              ['0.30', 270],
              ['0.765', 340],
            ],
            598 - i * 12,
          ),
        ),
      ]),
    ),
  )
  expect(heads(tables[0])).toEqual([
    ['', 'Yield of the plots', 'Yield of the plots', 'Height of stems', 'Height of stems'],
    ['Pair', 't', 'P', 't', 'P'],
  ])
})

test('a label on two lines is one label, a label of a group stays a row, an empty cell stays empty', () => {
  const { tables } = layOut(
    document(
      page([
        ...prose(4, 60, 720),
        run('Table 4. Outcomes.', 60, 640),
        ...row(
          [
            ['Outcome', 60],
            ['t', 200],
            ['P', 260],
          ],
          624,
        ),
        run('Primary', 60, 606),
        ...row(
          [
            ['Grip strength after the', 60],
            ['2.10', 200],
            ['0.041', 260],
          ],
          588,
        ),
        run('fourth week', 60, 578),
        ...row(
          [
            ['Pain at rest', 60],
            ['0.98', 200],
          ],
          560,
        ),
        ...row(
          [
            ['Swelling', 60],
            ['1.40', 200],
            ['0.171', 260],
          ],
          542,
        ),
      ]),
    ),
  )
  expect(texts(tables[0])).toEqual([
    ['Primary', '', ''],
    ['Grip strength after the fourth week', '2.10', '0.041'],
    ['Pain at rest', '0.98', ''],
    ['Swelling', '1.40', '0.171'],
  ])
})

test('tables stand in one column beside prose, or over both columns', () => {
  const column = layOut(
    document(
      page([...prose(20, 40, 700), ...prose(5, 340, 700), ...pairTable(340, 620), ...prose(6, 340, 500)]),
    ),
  )
  expect(texts(column.tables[0])).toEqual(pairs)
  expect(column.prose.text.match(/Readings were taken/g)).toHaveLength(9)
  const wide = [
    run('Table 5. Four outcomes by treatment, with the comparisons of all pairs', 40, 700),
    ...row(
      [
        ['Pair', 40],
        ['t', 160],
        ['P', 240],
        ['t', 340],
        ['P', 430],
        ['n', 520],
      ],
      684,
    ),
    ...[1, 2, 3, 4].flatMap((i) =>
      row(
        [
          [`A–${i}`, 40],
          ['2.10', 160],
          ['0.041', 240],
          ['0.30', 340],
          ['0.765', 430],
          ['12', 520],
        ],
        684 - i * 12,
      ),
    ),
  ]
  const both = layOut(document(page([...wide, ...prose(20, 40, 600), ...prose(20, 340, 600)])))
  expect(both.tables).toHaveLength(1)
  expect(texts(both.tables[0])?.[0]).toEqual(['A–1', '2.10', '0.041', '0.30', '0.765', '12'])
})

test('a turned table is read as it is when the page is turned', () => {
  // u along the baseline becomes y, the line below lies further right
  const turned = [...pairTable(100, -200), ...prose(3, 100, -400)].map((r) => ({
    ...r,
    x: -r.y,
    y: r.x,
    angle: 90,
  }))
  const { tables } = layOut(document(page(turned)))
  expect(texts(tables[0])).toEqual(pairs)
  const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = tables[0]?.rows[0]?.[0]?.boxes[0] ?? []
  expect([x0, y0, x1, y1].map(Math.round)).toEqual([221, 100, 231, 130])
})

test('a table that goes on over the page keeps its header and number', () => {
  const more = pairs.flatMap(([a = '', b = '', c = ''], i) =>
    row(
      [
        [a, 60],
        [b, 140],
        [c, 190],
      ],
      650 - i * 12,
    ),
  )
  const { tables } = layOut(
    document(
      page([...prose(20, 60, 690), ...pairTable(60, 420)], 1),
      page([...more, ...prose(6, 60, 560)], 2),
    ),
  )
  expect(tables.map(({ page: on, number }) => [on, number])).toEqual([
    [1, '1'],
    [2, '1'],
  ])
  expect(heads(tables[1])).toEqual([['Pair', 't', 'P']])
  expect(texts(tables[1])).toEqual(pairs)
})

test('output of a statistics program is a table where its columns are clear', () => {
  const mono = { font: 'mono', size: 8 }
  const lines = [
    '            Estimate Std. Error t value Pr(>|t|)',
    '(Intercept)  1.02887    0.02378  43.258  < 2e-16 ***',
    'dose         0.16480    0.00600  27.478 1.05e-06 ***',
    'longer.name -0.24831    0.01785 -13.915   0.0351 *',
  ]
  // a run for every word, as fixed-width output is drawn
  const runs = lines.flatMap((line, i) =>
    [...line.matchAll(/\S+/g)].map((match) => run(match[0], 60 + match.index * 4, 600 - i * 10, mono)),
  )
  const given = document(page([...prose(6, 60, 720), ...runs, ...prose(6, 60, 520)]))
  given.fonts['mono'] = { family: 'monospace', ascent: 0.75, descent: -0.25, vertical: false }
  const { tables } = layOut(given)
  expect(texts(tables[0])?.map((cells) => cells.slice(0, 4))).toEqual([
    ['(Intercept)', '1.02887', '0.02378', '43.258'],
    ['dose', '0.16480', '0.00600', '27.478'],
    ['longer.name', '-0.24831', '0.01785', '-13.915'],
  ])
  expect(heads(tables[0])?.[0]?.slice(1, 5)).toEqual(['Estimate', 'Std. Error', 't value', 'Pr(>|t|)'])
})

test('running text is no table, in one column, in two, or with wide spaces between words', () => {
  const spaced = [
    'Readings',
    'were',
    'taken',
    'each',
    'morning',
    'by',
    'the',
    'same',
    'person',
    'and',
    'kept',
  ]
  const wide = Array.from({ length: 5 }, (_, line) =>
    spaced.map((word, i) => run(word, 60 + i * 46, 700 - line * 12)),
  ).flat()
  expect(layOut(document(page(wide))).tables).toEqual([])
  expect(layOut(document(page([...prose(20, 40, 650), ...prose(20, 340, 650)]))).tables).toEqual([])
  expect(
    layOut(document(page(block(['Table 2 shows that 12 of 40 plots', 'differed from the others.'], 60, 700))))
      .tables,
  ).toEqual([])
})
