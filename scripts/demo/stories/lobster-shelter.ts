import { cellP, compareWithFirst, fixed, printP, printT, adjustPairs } from '../figures'
import { writePaper, type Story } from './story'

// Faulty: one printed p does not follow from its t and degrees of freedom (a slip of one digit).
const groups = [
  { name: 'flat stone', n: 13, mean: 6.1, sd: 1.9 },
  { name: 'clay pipe', n: 13, mean: 8.4, sd: 2.0 },
  { name: 'brick', n: 13, mean: 7.3, sd: 1.8 },
  { name: 'turf', n: 13, mean: 6.4, sd: 2.1 },
]
const pairs = compareWithFirst(groups)
const slip = 0.0124
const adjusted = adjustPairs(pairs, 'bonferroni')
const raw = pairs.map((pair, i) => (i === 1 ? slip : pair.raw))
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const lobsterShelter: Story = {
  key: 'lobster-shelter',
  manuscript: writePaper({
    title: 'Shelter choice of young lobsters: three shelters against flat stone',
    authors: 'Brede Sandholm',
    runningHead: 'Shelter choice of young lobsters',
    layout: 'one column',
    abstract:
      'Young lobsters hide by day. We offered three artificial shelters beside flat stone. Clay pipes were used longer than flat stone; bricks and turf were not, after Bonferroni correction for three comparisons.',
    introduction: [
      'Releases of young lobsters fail when the animals find no hole. Cheap shelters might help.',
    ],
    methods: [
      'Fifty-two lobsters, thirteen a shelter, were watched for one day each; the outcome was hours spent in the shelter. Each of three shelters was compared with flat stone by a t test on the pooled variance.',
      'The three comparisons were Bonferroni-corrected (m = 3). Both uncorrected and corrected p-values are given in the table. The level was 0.05.',
    ],
    results: [
      `Clay pipes were used longer than flat stone (${t(0)}, uncorrected ${printP(raw[0] ?? NaN, 4)}). For bricks the difference was not significant after correction (${t(1)}, uncorrected ${printP(slip, 4)}), nor was it for turf (${t(2)}, uncorrected ${printP(raw[2] ?? NaN, 4)}).`,
      {
        caption: 'Table 1. Hours in shelter compared with flat stone.',
        header: ['Comparison', 'Difference', 't', 'df', 'p uncorrected', 'p corrected'],
        rows: pairs.map((pair, i) => [
          `${pair.a} vs ${pair.b}`,
          fixed(pair.difference, 1),
          fixed(pair.t, 2),
          String(pair.df),
          cellP(raw[i] ?? NaN, 4),
          cellP(adjusted[i] ?? NaN, 4),
        ]),
      },
    ],
    discussion: ['Clay pipes are cheap and were used. Whether they help survival is another question.'],
  }),
  results: null,
  form: { alpha: 0.05, correction: 'Bonferroni, m = 3', primaryOutcome: 'Hours in shelter', note: '' },
}
