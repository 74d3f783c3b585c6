import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import type { TextRun } from '@/lib/checks/types'
import { document, page, run } from './runs'

/** A line of pieces one after the other; those in angle brackets are drawn in a font of symbols. */
function line(text: string, y: number): TextRun[] {
  let x = 60
  return text.split(/(⟨.⟩|⟪.⟫)/).flatMap((piece) => {
    const symbol = /^⟨(.)⟩$/.exec(piece)?.[1]
    const raised = /^⟪(.)⟫$/.exec(piece)?.[1]
    const made = raised
      ? run(raised, x, y + 4, { size: 6 })
      : run(symbol ?? piece, x, y, { font: symbol ? 'symbol' : 'body' })
    x += made.width
    return piece === '' ? [] : [made]
  })
}

const textOf = (...lines: string[]) =>
  layOut(document(page(lines.flatMap((text, i) => line(text, 700 - i * 12))))).prose.text

test('a character that stands where a relation must is read as the relation its values tell', () => {
  expect(
    textOf(
      'The first differed (t(28) ⟨¼⟩ 2.46, p ⟨¼⟩ 0.021), the second',
      'did not (t(28) ⟨¼⟩ 0.31, p ⟨¼⟩ 0.759), in n ⟨¼⟩ 30 plots; others',
      'differed clearly (p ⟨\\⟩ 0.001 and p ⟨\\⟩ 0.01).',
    ),
  ).toBe(
    'The first differed (t(28) = 2.46, p = 0.021), the second did not (t(28) = 0.31, p = 0.759), in n = 30 plots; others differed clearly (p < 0.001 and p < 0.01).',
  )
})

test('letters and digits are repaired only where they are drawn apart from their neighbours', () => {
  expect(textOf('We found (p ⟨o⟩ 0.001) and again (p ⟨o⟩ 0.05) of 50 or so.')).toBe(
    'We found (p < 0.001) and again (p < 0.05) of 50 or so.',
  )
  expect(textOf('In F(2, 38) ⟨5⟩ 4.10, p ⟨5⟩ .024, and F(2, 38) ⟨5⟩ 0.15, p ⟨5⟩ .861.')).toBe(
    'In F(2, 38) = 4.10, p = .024, and F(2, 38) = 0.15, p = .861.',
  )
})

test('a sign and χ that a font damaged are read from where they stand', () => {
  expect(textOf('It fell (t(28) ⟨¼⟩ ⟨À⟩2.46, p ⟨¼⟩ 0.021; v⟪2⟫(2) ⟨¼⟩ 6.15, p ⟨¼⟩ 0.046).')).toBe(
    'It fell (t(28) = -2.46, p = 0.021; χ2(2) = 6.15, p = 0.046).',
  )
})

test('sound text is left alone: references to pages, lists of values, plain letters', () => {
  for (const text of [
    'See p. 05 of the appendix, and P values, .03 and .04, below.',
    'The plasmid p53 and the probe p 24 were used at ¼ strength.',
    'A rise of 5 kg in group o and 4 kg in group Z was seen.',
  ])
    expect(textOf(text)).toBe(text)
})

test('what was repaired is told, and that it is in doubt where only the values speak', () => {
  const lines = [
    'The first differed (t(28) ⟨¼⟩ ⟨À⟩2.46, p ⟨¼⟩ 0.021; v⟪2⟫(2) ⟨¼⟩ 6.15, p ⟨¼⟩ 0.046);',
    'others differed clearly (p ⟨\\⟩ 0.001 and p ⟨\\⟩ 0.01).',
  ]
  const { remarks } = layOut(document(page(lines.flatMap((text, i) => line(text, 700 - i * 12)))))
  expect(remarks?.map(({ says }) => says)).toEqual([
    'A font of this PDF gives "¼" where "=" must stand; it was read as "=" in 4 places.',
    'A font of this PDF gives "\\" where "<" must stand; it was read as "<" in 2 places. Whether "=" is meant the values alone cannot tell; compare the page.',
    'A font of this PDF gives "À" where "−" must stand; it was read as "−" in one place.',
    'A font of this PDF gives "v" where "χ" must stand; it was read as "χ" in one place.',
  ])
})

test('of sound text nothing is told', () => {
  const told = layOut(document(page(line('The first differed (t(28) = 2.46, p = 0.021; see p. 0.5).', 700))))
  expect(told.remarks ?? []).toEqual([])
})
