import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import { block, document, page, prose, run, row } from './runs'

const left = (n: number) =>
  Array.from({ length: n }, (_, i) => `left line ${i} with some words in it to fill`)
const right = (n: number) =>
  Array.from({ length: n }, (_, i) => `right line ${i} with other words to fill it`)

test('two columns are read one after the other although their lines share baselines', () => {
  const { prose: read } = layOut(document(page([...block(left(12), 60, 650), ...block(right(12), 300, 650)])))
  expect(read.text.indexOf('left line 11')).toBeLessThan(read.text.indexOf('right line 0'))
  expect(read.text).toContain('left line 0 with some words in it to fill left line 1')
})

test('three columns are read from the left', () => {
  const words = (name: string) => Array.from({ length: 14 }, (_, i) => `${name} ${i} and more words here`)
  const { prose: read } = layOut(
    document(
      page([
        ...block(words('one'), 40, 650),
        ...block(words('two'), 220, 650),
        ...block(words('three'), 400, 650),
      ]),
    ),
  )
  const places = ['one 13', 'two 0', 'two 13', 'three 0'].map((text) => read.text.indexOf(text))
  expect(places).toEqual([...places].sort((a, b) => a - b))
  expect(places).not.toContain(-1)
})

test('a title over both columns comes first and a full-width block divides the columns', () => {
  const wide = 'A title that runs over the whole width of the page and both of its columns'
  const { prose: read } = layOut(
    document(
      page([run(wide, 60, 690, { size: 14 }), ...block(left(10), 60, 650), ...block(right(10), 300, 650)]),
    ),
  )
  expect(read.text.startsWith(wide)).toBe(true)
})

test('a sentence runs on over a column and over a page, past a footnote', () => {
  const first = [...left(10), 'and the value did not differ in any']
  const second = ['of the groups (p = 0.31), which was expected', ...right(10)]
  const note = run('* A note at the foot of the column.', 60, 500, { size: 7 })
  const { prose: read } = layOut(document(page([...block(first, 60, 650), note, ...block(second, 300, 650)])))
  expect(read.text).toContain('did not differ in any of the groups (p = 0.31)')
  const overPage = layOut(
    document(
      page([...prose(8, 60, 650), run('The difference was not significant (t(28) =', 60, 554)], 1),
      page([run('1.20, p = 0.240) in the second week.', 60, 650), ...prose(8, 60, 638)], 2),
    ),
  )
  expect(overPage.prose.text).toContain('(t(28) = 1.20, p = 0.240)')
  const at = overPage.prose.text.indexOf('1.20')
  expect([overPage.prose.pageOf(at - 5), overPage.prose.pageOf(at)]).toEqual([1, 2])
})

test('running heads, feet and page numbers are set aside, in odd and even pages', () => {
  const pages = [1, 2, 3, 4].map((n) =>
    page(
      [
        run(n % 2 ? 'Author A and Author B' : 'A running head of the paper', 60, 770, { size: 8 }),
        run(String(n), 500, 770, { size: 8 }),
        ...prose(10, 60, 650),
        run(`Journal of Invented Things 12 (2031) ${100 + n}`, 200, 30, { size: 8 }),
      ],
      n,
    ),
  )
  const { prose: read } = layOut(document(...pages))
  expect(read.text).not.toMatch(/Author A|running head|Invented Things/)
  expect(read.text).toContain('Readings were taken')
})

test('line numbers in the margin are set aside and the numbers of a table are not', () => {
  const numbered = (from: number) =>
    Array.from({ length: 16 }, (_, i) =>
      run(String(from + i), 40 - String(from + i).length * 3, 650 - i * 12, { size: 6 }),
    )
  const { prose: read } = layOut(
    document(
      page([...prose(16, 60, 650), ...numbered(1)], 1),
      page([...prose(16, 60, 650), ...numbered(17)], 2),
      page([...prose(2, 60, 650), ...numbered(33).slice(0, 2)], 3),
    ),
  )
  expect(read.text).not.toMatch(/\d/)
  const table = layOut(
    document(
      page([
        ...prose(6, 60, 700),
        run('Table 1. Yields.', 60, 600),
        ...row(
          [
            ['No.', 60],
            ['Yield', 160],
            ['p', 260],
          ],
          585,
        ),
        ...[1, 2, 3, 4, 5].flatMap((n) =>
          row(
            [
              [String(n), 60],
              [`4.${n}`, 160],
              [`0.0${n}`, 260],
            ],
            585 - n * 13,
          ),
        ),
      ]),
    ),
  )
  expect(table.tables[0]?.rows.map((cells) => cells[0]?.text)).toEqual(['1', '2', '3', '4', '5'])
})

test('the boxes of a stretch lie on its line, one for each line, and turn with turned text', () => {
  const { prose: read } = layOut(
    document(page(block(['The value was p = 0.012 and', 'therefore below the level.'], 60, 700))),
  )
  const start = read.text.indexOf('p = 0.012')
  const [box] = read.boxesOf(start, start + 9)
  expect(box?.[1]).toBeCloseTo(697.5)
  expect(box?.[3]).toBeCloseTo(707.5)
  expect(box?.[0]).toBeGreaterThan(120)
  expect(box?.[2]).toBeLessThan(182)
  expect(read.boxesOf(start, read.text.length)).toHaveLength(2)
  const turned = layOut(
    document(page(prose(6, 0, 0).map((r, i) => ({ ...r, angle: 90, x: 300 + i * 12, y: 100 })))),
  )
  const [upright] = turned.prose.boxesOf(0, 8)
  expect(upright?.[0]).toBeCloseTo(292.5)
  expect(upright?.[1]).toBeCloseTo(100)
  expect(upright?.[2]).toBeCloseTo(302.5)
})
