import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { makeLaidOut, makePdfTable } from '@/tests/support/prose'

/** Invented sentences and the pair of each of their p-values, 'A | B', '-' where none is named. */
const PASSAGES: readonly (readonly [text: string, ...pairs: string[]])[] = [
  ['Control vs biochar differed (t(28) = 2.46, p = .020).', 'Control | biochar'],
  ['Biochar plots gave higher yields than control plots (p = .02).', 'Biochar | control'],
  [
    'The difference between the low-dose and the high-dose group was significant (p = .01).',
    'low-dose | high-dose',
  ],
  ['Patients in the placebo group had more pain than those in the drug group (p = .03).', 'placebo | drug'],
  ['Weight was greater in group A than in group B (p = .01) and group C (p = .02).', 'A | B', 'A | C'],
  ['Group A differed from group B (p = .01), but not from group C (p = .40).', 'A | B', 'A | C'],
  [
    'Post hoc tests showed that A was higher than B (p = .01) and C (p = .02), whereas B and C did not differ (p = .60).',
    'A | B',
    'A | C',
    'B | C',
  ],
  [
    'No significant difference was found between Compost and Biochar + compost (p = 1.000).',
    'Compost | Biochar + compost',
  ],
  ['The fast group outperformed the slow group, t(30) = 3.1, p = .004.', 'fast | slow'],
  ['Snails from site 1 were larger than snails from site 3 (P = 0.001).', 'site 1 | site 3'],
  ['Compared with vehicle, drug X increased survival (p = .01).', 'drug X | vehicle'],
  ['Drug X increased survival compared with vehicle (p = .01).', 'Drug X | vehicle'],
  [
    'Control and low did not differ, p = .40; control and high differed, p = .01.',
    'Control | low',
    'control | high',
  ],
  ['Post hoc: control vs. low, p = .40; low vs. high, p = .02.', 'control | low', 'low | high'],
  [
    'Yield differed between wheat and rye (p = .02) and between wheat and oats (p = .03).',
    'wheat | rye',
    'wheat | oats',
  ],
  ['Mean latency was shorter in quiet than in traffic noise (p = .004).', 'quiet | traffic noise'],
  [
    'The trained group (M = 4.1, SD = 1.0) scored higher than the untrained group (M = 3.2, SD = 0.9), t(48) = 3.3, p = .002.',
    'trained | untrained',
  ],
  [
    'Only the high dose differed from control (p = .01); the low (p = .3) did not.',
    'high dose | control',
    'low | control',
  ],
  ['The mean for S3 exceeded that for S1 (p = .01).', 'S3 | S1'],
  ['Yields of Arle and Corv differed (P = 0.002).', 'Arle | Corv'],
  ['The pairwise comparison of Arle with Corv was significant (P = 0.002).', 'Arle | Corv'],
  ['For A vs B the adjusted p-value was 0.03.', 'A | B'],
  ['Significant were A–B (p = .01) and A–C (p = .02).', 'A | B', 'A | C'],
  ['The effect of temperature on growth was significant (F(3, 28) = 5.40, p = .005).', '-'],
  ['Pain scores decreased from baseline to week 4 (p = .01).', '-'],
]

test.each(PASSAGES.map(([text, ...pairs]) => [text, pairs] as const))('pairs: %s', (text, pairs) => {
  const { reports } = read(makeLaidOut(text), null, defaultHouseRules)
  expect(reports.map(({ comparison }) => comparison?.join(' | ') ?? '-')).toEqual(pairs)
})

test('groups of a table of means are known in the sentences', () => {
  const table = makePdfTable([
    ['Routine', 'Mean (cm)', 'SD'],
    ['No warm-up', '40.1', '6.2'],
    ['Static stretching', '37.9', '5.9'],
  ])
  const text =
    'Jump height after static stretching stayed below that without, no warm-up (t(19) = 2.01, p = .004).'
  const { reports } = read(makeLaidOut(text, [table]), null, defaultHouseRules)
  expect(reports[0]?.comparison).toEqual(['Static stretching', 'No warm-up'])
})

test('two treatments of one sentence, each with its value, stand against the control of the table', () => {
  const table = makePdfTable([
    ['Comparison', 't', 'df', 'p'],
    ['pipe vs flat stone', '3.01', '48', '0.0042'],
    ['brick vs flat stone', '1.57', '48', '0.1230'],
    ['turf vs flat stone', '0.39', '48', '0.6971'],
  ])
  const text =
    'For bricks the difference was not significant after correction (t(48) = 1.57, p = .123), nor was it for turf (t(48) = 0.39, p = .697).'
  const { reports } = read(makeLaidOut(text, [table]), null, defaultHouseRules)
  const inText = reports.filter(({ place }) => place.source === 'text')
  expect(inText.map(({ comparison, called }) => [comparison?.join(' | '), called])).toEqual([
    ['brick | flat stone', 'not significant'],
    ['turf | flat stone', 'not significant'],
  ])
})

test('a result of an assumption, a baseline or an overall test is no member of a family', () => {
  const text =
    'Residuals did not depart from the normal distribution (W = 0.969, p = 0.50). ' +
    'Initial values were alike in all conditions (all p > 0.05). ' +
    'Treatment affected yield (F(3, 28) = 5.40, p = 0.005). ' +
    'The interaction of light and site was significant (F(1, 28) = 4.40, p = 0.045). ' +
    'Reef and Bank differed (t(28) = 3.06, p = 0.005).'
  const { reports } = read(makeLaidOut(text), null, defaultHouseRules)
  expect(reports.map(({ role }) => role)).toEqual([
    'assumption',
    'baseline',
    'omnibus',
    'interaction',
    'comparison',
  ])
})

test('the general level comes from the methods, with its place', () => {
  const { alpha } = read(
    makeLaidOut([
      {
        kind: 'methods',
        text: 'The reliability of the scale was α = .81. The level of significance was set at .01.',
      },
    ]),
    null,
    defaultHouseRules,
  )
  expect(alpha).toEqual({ value: 0.01, quote: 'The level of significance was set at .01.', page: 1 })
})

test('without a stated level the house decides', () => {
  const { alpha } = read(makeLaidOut('Reef and Bank differed (p = .004).'), null, {
    ...defaultHouseRules,
    alpha: 0.02,
  })
  expect(alpha).toEqual({ value: 0.02, quote: null, page: null })
})

test('what the methods say of the values gives them their scale', () => {
  const scaleOf = (methods: string) =>
    read(
      makeLaidOut([
        { kind: 'methods', text: methods },
        { kind: 'results', text: 'Reef and Bank differed (t(28) = 3.06, p = .029).' },
      ]),
      null,
      defaultHouseRules,
    ).reports[0]?.scale
  expect(scaleOf('The p-values were Bonferroni-corrected by multiplying each of them by six.')).toBe(
    'adjusted',
  )
  expect(scaleOf('All pairs were compared with Tukey’s test.')).toBe('adjusted')
  expect(scaleOf('The significance level was Bonferroni-corrected to .05/4 = .0125.')).toBe('raw')
  expect(scaleOf('No adjustment for multiple comparisons was made.')).toBe('raw')
  expect(scaleOf('Means were compared in pairs with Bonferroni correction.')).toBe('unknown')
})
