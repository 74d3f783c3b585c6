import { pDunnettFromT } from '@/lib/checks/procedures/dunnett'
import { cellP, compareAll, compareWithFirst, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Correct: four coatings against one control, Dunnett.
const groups = [
  { name: 'uncoated', n: 9, mean: 58.1, sd: 8.3 },
  { name: 'silicone', n: 9, mean: 31.7, sd: 7.9 },
  { name: 'copper paint', n: 9, mean: 36.4, sd: 8.8 },
  { name: 'waxed', n: 9, mean: 53.2, sd: 9.1 },
  { name: 'ceramic', n: 9, mean: 43.9, sd: 7.6 },
]
const all = compareAll(groups)
const pairs = compareWithFirst(groups)
const adjusted = pairs.map((pair) => pDunnettFromT(pair.t, pairs.length, pair.df))
const p = (i: number) => printP(adjusted[i] ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const hullCoatings: Story = {
  key: 'hull-coatings',
  manuscript: writePaper({
    title: 'Fouling on four hull coatings after one summer at a sheltered mooring',
    authors: 'Ifor Lunt, Sela Dorrimere',
    runningHead: 'Fouling on four hull coatings',
    layout: 'two columns',
    abstract: `Boat owners choose between coatings on little evidence. Panels with four coatings and uncoated panels hung at one mooring from May to September. Cover by fouling was lower than on uncoated panels for silicone, copper paint and ceramic (Dunnett’s test, all adjusted p below 0.01) but not for wax (${p(2)}).`,
    introduction: [
      'What grows on a hull costs fuel. Coatings differ in price by a factor of ten and in what they give off to the water.',
      'We asked which of four coatings keep fouling below that of bare panels over one summer. Comparisons between coatings were not planned.',
    ],
    methods: [
      'Forty-five panels, nine of each kind, hung at 1 m depth in random order from one pontoon. Cover by fouling in per cent was read from photographs at the end of September.',
      'Each of the four coatings was compared with the uncoated control by Dunnett’s test (two-sided) after a one-way analysis of variance. The p-values given are those of Dunnett’s test and need no further correction. The level of significance was 0.05.',
    ],
    results: [
      `Cover differed between the five groups (F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}). Compared with uncoated panels, cover was lower on silicone (${t(0)}, ${p(0)}), copper paint (${t(1)}, ${p(1)}) and ceramic (${t(3)}, ${p(3)}). Waxed panels did not differ from uncoated ones (${t(2)}, ${p(2)}).`,
      {
        caption:
          'Table 1. Differences in cover (%) from the uncoated control, with p-values of Dunnett’s test.',
        header: ['Coating', 'Difference', 't', 'df', 'p (Dunnett)'],
        rows: pairs.map((pair, i) => [
          `${pair.a} vs ${pair.b}`,
          fixed(pair.difference, 1),
          fixed(pair.t, 2),
          String(pair.df),
          cellP(adjusted[i] ?? NaN),
        ]),
      },
    ],
    discussion: [
      'Three of four coatings kept fouling down. Wax did not, at least not by enough to be seen here. The mooring is sheltered; a hull that moves may foul less.',
    ],
  }),
  results: {
    file: 'hull-coatings.csv',
    sheets: [
      {
        name: 'against control',
        rows: [
          ['Comparison', 'Difference', 't', 'df', 'p (Dunnett)'],
          ...pairs.map((pair, i) => [
            `${pair.a} vs ${pair.b}`,
            pair.difference.toFixed(2),
            pair.t.toFixed(3),
            pair.df,
            cellP(adjusted[i] ?? NaN, 4),
          ]),
        ],
      },
    ],
  },
  form: { alpha: 0.05, correction: 'Dunnett against uncoated', primaryOutcome: 'Cover by fouling', note: '' },
}
