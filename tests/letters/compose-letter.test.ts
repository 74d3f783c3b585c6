import { expect, test } from 'vitest'
import { composeLetter, type Letter, type LetterPoint } from '@/lib/letters/compose-letter'
import { escapeMarkdown } from '@/lib/letters/escape-markdown'
import { renderLetter } from '@/lib/letters/render-letter'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'

function makePoint(given: Partial<LetterPoint> = {}): LetterPoint {
  return {
    severity: 'minor',
    familyLabel: 'blade length',
    says: 'An adjusted value is printed as 1.2.',
    asks: 'Please print adjusted values of at most 1.',
    quote: '1.2',
    page: null,
    row: 4,
    sheet: null,
    cites: [],
    ...given,
  }
}

function makeLetter(given: Partial<Letter> = {}): Letter {
  const { greeting, closing } = defaultFullHouseRules
  return {
    house: 'Tern Harbour Core',
    reference: 'THC-2026-0007',
    title: 'Kelp holdfasts under tow',
    round: 1,
    verdict: 'sound after changes',
    greeting,
    closing,
    answerDays: 60,
    points: [
      makePoint(),
      makePoint({
        severity: 'major',
        familyLabel: 'attachment strength, all pairs of rocks',
        says: 'With six pairs the adjusted p lies in [0.069, 0.075], above 0.05.',
        asks: 'Please reconsider this statement, or say which comparisons were planned.',
        quote: 'granite held better than slate (p = .012*)',
        page: 5,
        row: null,
        cites: ['holm', 'no-such-key'],
      }),
    ],
    comments: [{ body: 'The methods are clearly described.', targetLabel: '', page: 3 }],
    cite: (key) => (key === 'holm' ? 'Holm S. Scand J Stat 1979;6:65–70.' : null),
    ...given,
  }
}

const golden = `Dear authors,

Thank you for handing in your manuscript. A statistician has looked at how it handles multiple comparisons.

Manuscript: “Kelp holdfasts under tow” (THC-2026-0007)

**Verdict: Sound after changes.** We have no objection to how the manuscript handles multiple comparisons once the points below are dealt with.

## Points on which a conclusion depends

With these, a conclusion may change or cannot be judged yet.

### Point 1: attachment strength, all pairs of rocks, page 5

> granite held better than slate (p = .012\\*)

What we see: With six pairs the adjusted p lies in \\[0.069, 0.075\\], above 0.05.

What we ask: Please reconsider this statement, or say which comparisons were planned.

See: Holm S. Scand J Stat 1979;6:65–70.

## Points to be put right

These call for a change; no conclusion depends on them.

### Point 2: blade length, results table, row 4

> 1.2

What we see: An adjusted value is printed as 1.2.

What we ask: Please print adjusted values of at most 1.

## Further comments

- (page 3) The methods are clearly described.

## How to read this letter

What is printed in a manuscript is rounded, so each number that we recompute is a range; where we say that something cannot be decided, that is not an error. Reading can miss or misread a number: if we did, please tell us where. A difference between two numbers says nothing about how it came about. What this letter does not mention, such as the design, missing data or tests that are not reported, was not looked at.

If you see a point differently, please say so in your answer; both views will be kept. This review covers the handling of multiple comparisons only and does not replace the policy of the journal or the protocol of the study.

We should be glad to have your answer, point by point, within 60 days.

With kind regards\\
Tern Harbour Core\\
THC-2026-0007
`

test('the letter, whole', () => {
  expect(composeLetter(makeLetter())).toBe(golden)
})

test('the letter as plain text keeps its order, its numbers and its lines within 76 columns', () => {
  const { text } = renderLetter(golden)
  expect(text.split('\n').filter((line) => line.length > 76)).toEqual([])
  expect(text).toContain(
    [
      'Point 1: attachment strength, all pairs of rocks, page 5',
      '--------------------------------------------------------',
      '',
      '> granite held better than slate (p = .012*)',
      '',
      'What we see: With six pairs the adjusted p lies in [0.069, 0.075], above',
      '0.05.',
    ].join('\n'),
  )
  expect(text).toMatch(/With kind regards\nTern Harbour Core\nTHC-2026-0007\n$/)
})

test('without points the letter asks for nothing', () => {
  const body = composeLetter(makeLetter({ verdict: 'sound', points: [], comments: [] }))
  expect(body).toContain('**Verdict: Sound.**')
  expect(body).toContain('no point that we ask you to deal with')
  expect(body).not.toContain('within 60 days')
  expect(body).not.toContain('Further comments')
})

test('the reviewer’s order stands within a severity, and numbers run through', () => {
  const points = [
    makePoint({ severity: 'note', familyLabel: 'd' }),
    makePoint({ severity: 'question', familyLabel: 'c' }),
    makePoint({ familyLabel: 'b' }),
    makePoint({ familyLabel: 'a' }),
  ]
  const body = composeLetter(makeLetter({ points, round: 2 }))
  expect(body.match(/Point \d: \w/g)).toEqual(['Point 1: b', 'Point 2: a', 'Point 3: c', 'Point 4: d'])
  expect(body).toContain('(THC-2026-0007, revision 1)')
})

test('no sentence of the letter accuses', () => {
  // Words that a letter to authors does not use, whatever the verdict.
  const words = /fail|wrong|incorrect|mistake|neglect|p-hack|cherry|mislead|fraud|false|should have/i
  const verdicts = [
    'sound',
    'sound after changes',
    'not supported',
    'cannot be judged from what is given',
  ] as const
  for (const verdict of verdicts) expect(composeLetter(makeLetter({ verdict }))).not.toMatch(words)
})

test('what comes from a manuscript is shown as it is printed, whatever it looks like', () => {
  const printed = [
    '# not a heading',
    '> not a quote',
    '- not a list',
    '3. not a list',
    '*p* < .05, **p** < .01, _n_ = 4',
    '<script>alert(1)</script>',
    '[a link](https://elsewhere.example)',
    '![a picture](https://elsewhere.example/x.png)',
    '`code` and ~~struck~~ and \\backslash',
    '&lt;b&gt; &amp; <https://elsewhere.example>',
    'two\n\nparagraphs',
  ]
  for (const text of printed) {
    const { html, text: plain } = renderLetter(escapeMarkdown(text))
    expect(plain).toBe(`${text.replace(/\s+/g, ' ')}\n`)
    expect(html).toMatch(/^<p>[^<]*<\/p>\n$/)
  }
})

test('a letter renders no HTML of its own, no picture and no script address', () => {
  const { html } = renderLetter(
    '<b>bold</b> <img src=x onerror=alert(1)> ![p](https://elsewhere.example/p.png) [x](javascript:alert(1))',
  )
  expect(html).not.toMatch(/<(b|img|script)\b|href="javascript/)
  expect(html).toContain('&lt;b&gt;')
})

test('lists, nested lists, links and code come out in plain text', () => {
  const { text } = renderLetter(
    '2. first\n3. second\n   - inner [text](https://kelpbay.example/a)\n\n<https://kelpbay.example/b>\n\n```\np <- c(.01)\n```\n\n---\n',
  )
  expect(text).toBe(
    [
      '2. first',
      '',
      '3. second',
      '',
      '   - inner text (https://kelpbay.example/a)',
      '',
      'https://kelpbay.example/b',
      '',
      '    p <- c(.01)',
      '',
      '--------------------',
      '',
    ].join('\n'),
  )
})
