import { expect, test } from 'vitest'
import { layOut } from '@/lib/checks/text/lay-out'
import { document, page, prose, run } from './runs'

type Part = string | { head: string; size?: number; font?: string }

/** A paper of headings and paragraphs of running text, from the top of one page. */
function paper(parts: readonly Part[]) {
  let y = 760
  const runs = parts.flatMap((part) => {
    y -= 24
    if (typeof part !== 'string')
      return [run(part.head, 60, y, { size: part.size ?? 10, font: part.font ?? 'heading' })]
    const text = [run(part, 60, y), ...prose(2, 60, y - 12)]
    y -= 24
    return text
  })
  return layOut(document(page(runs))).prose
}

const kinds = (parts: readonly Part[]) =>
  paper(parts).sections.map(({ kind, heading }) => `${kind}:${heading}`)

test('headings open sections, with or without numbers, and subheadings stay within theirs', () => {
  expect(
    kinds([
      { head: 'A study of four treatments', size: 16 },
      { head: 'Abstract' },
      'Four treatments were compared.',
      { head: '1. Introduction' },
      'Much has been written.',
      { head: '2. Materials and Methods' },
      'Plots were laid out.',
      { head: '2.1. Statistical analysis' },
      'Means were compared.',
      { head: '3 Results' },
      'The first differed.',
      { head: '3.1 Grain yield' },
      'Yield rose.',
      { head: '4. Discussion' },
      'This was expected.',
      { head: 'References' },
      '[1] Author A. A title. 2004.',
    ]),
  ).toEqual([
    'title:',
    'abstract:Abstract',
    'introduction:Introduction',
    'methods:Materials and Methods',
    'methods:Statistical analysis',
    'results:Results',
    'results:Grain yield',
    'discussion:Discussion',
    'references:References',
  ])
})

test('capitals, Roman numbers and run-in headings are known', () => {
  expect(
    kinds([
      { head: 'A STUDY OF FOUR TREATMENTS AND MORE', size: 16 },
      'Abstract—Four treatments were compared.',
      'Index Terms—treatment, comparison.',
      { head: 'I. INTRODUCTION', font: 'body' },
      'Much has been written.',
      { head: 'II. METHODS', font: 'body' },
      'Plots were laid out.',
      { head: 'R E S U L T S', font: 'body' },
      'The first differed.',
    ]),
  ).toEqual([
    'title:',
    'abstract:Abstract',
    'other:Index Terms',
    'introduction:INTRODUCTION',
    'methods:METHODS',
    'results:R E S U L T S',
  ])
})

test('a first-rank heading of unknown words after the introduction is no part of the introduction', () => {
  expect(
    kinds([
      { head: '1 Introduction' },
      'Much has been written.',
      { head: '2 Playing with blocks' },
      'A test gave p = 0.01.',
    ]),
  ).toEqual(['introduction:Introduction', 'other:Playing with blocks'])
})

test('a paper without any heading is one section, and a sentence is never a heading', () => {
  expect(kinds(['Results were entered twice by different persons'])).toEqual(['other:'])
})

test('sections cover the text without gaps', () => {
  const { sections, text } = paper([{ head: 'Methods' }, 'Plots were laid out.', { head: 'Results' }, 'One.'])
  expect(sections[0]?.start).toBe(0)
  expect(sections.at(-1)?.end).toBe(text.length)
  for (const [i, section] of sections.slice(1).entries()) expect(section.start).toBe(sections[i]?.end)
})
