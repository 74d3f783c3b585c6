import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import { block, document, page, prose, run } from './runs'

const textOf = (...runs: Parameters<typeof page>[0]) => layOut(document(page(runs))).prose.text

test('lines are joined to a paragraph and a word broken at a line end is whole again', () => {
  const text = textOf(
    ...block(
      [
        'The comparison of the four treat-',
        'ments was made with a two-sided',
        'test and a Bonferroni-',
        'corrected level of significance.',
      ],
      60,
      700,
    ),
  )
  expect(text).toBe(
    'The comparison of the four treatments was made with a two-sided test and a Bonferroni-corrected level of significance.',
  )
})

test('a compound that the document writes with a hyphen elsewhere keeps it at a line end', () => {
  const text = textOf(
    ...block(
      ['A double-masked trial was run and the double-', 'masked phase lasted twelve weeks in all.'],
      60,
      700,
    ),
  )
  expect(text).toContain('the double-masked phase')
})

test('an indented line after a finished sentence opens a paragraph', () => {
  const text = textOf(
    ...block(['All readings were taken in one room and entered twice on', 'the same day.'], 60, 700),
    run('The second series followed after a week and was entered', 75, 676),
    run('in the same way by the same person.', 60, 664),
  )
  expect(text.split('\n\n')).toEqual([
    'All readings were taken in one room and entered twice on the same day.',
    'The second series followed after a week and was entered in the same way by the same person.',
  ])
})

test('raised and lowered characters are marked, χ² is written χ2, asterisks and ordinals stand plain', () => {
  const text = textOf(
    run('p = 3 × 10', 60, 700),
    run('−5', 110, 704, { size: 7 }),
    run('(F', 122, 700),
    run('2,38', 132, 698, { size: 7 }),
    run('= 4.1; χ', 150, 700),
    run('2', 190, 704, { size: 7 }),
    run('= 6.2', 198, 700),
    run('∗', 223, 704, { size: 7 }),
    run('; the 2', 228, 700),
    run('nd', 263, 704, { size: 7 }),
    run('day', 275, 700),
    run('a', 290, 704, { size: 7 }),
  )
  expect(text).toBe('p = 3 × 10^-5 (F_2,38 = 4.1; χ2 = 6.2*; the 2nd day^a')
})

test('a dash before a number is a sign after a relation or a bracket and a dash between numbers', () => {
  expect(textOf(run('t = –2.46 (–3.1), − 0.5 and 0.70–0.96 on pages 4 – 7', 60, 700))).toBe(
    't = -2.46 (-3.1), - 0.5 and 0.70–0.96 on pages 4 – 7',
  )
})

test('ligatures, odd spaces, full-width digits and raised decimal points become plain', () => {
  expect(textOf(run('signi\ufb01cant\u2009(p\u00a0=\u202f0\u00b703, ３×10⁻⁸)', 60, 700))).toBe(
    'significant (p = 0.03, 3×10^-8)',
  )
})

test('text drawn twice at one place is read once', () => {
  const text = textOf(run('Results', 60, 700), run('Results', 60.4, 700), ...prose(3, 60, 680))
  expect(text.match(/Results/g)).toHaveLength(1)
})

test('a hidden copy of the page in fonts of its own is dropped, the fonts of the document stay', () => {
  const copy = prose(12, 63, 661, { font: 'embedded' })
  const laidOut = layOut(
    document(
      page([...prose(12, 60, 660), ...copy], 1),
      page(prose(12, 60, 660), 2),
      page(prose(12, 60, 660), 3),
    ),
  )
  expect(laidOut.prose.text.match(/Readings were taken/g)).toHaveLength(9)
})

test('empty pages and empty documents give nothing but the places that could not be read', () => {
  expect(layOut(document())).toMatchObject({ tables: [], unread: [] })
  const { prose: read, unread } = layOut(document(page([], 1), page(prose(4, 60, 700), 2)))
  expect(read.pageOf(0)).toBe(2)
  expect(unread).toEqual([
    { source: 'text', page: 1, row: null, sheet: null, quote: '', boxes: [[0, 0, 600, 800]] },
  ])
})

test('runs without size, with odd numbers or oblique are passed over without an error', () => {
  const { prose: read } = layOut(
    document(
      page([
        run('x', Number.NaN, 10),
        run('y', 10, 10, { size: 0 }),
        run('DRAFT', 200, 300, { angle: 45 }),
        run('Kept.', 60, 700),
      ]),
    ),
  )
  expect(read.text).toContain('Kept.')
  expect(read.text).not.toContain('DRAFT')
})
