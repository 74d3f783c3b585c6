import { adjustPairs, cellP, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Faulty in its reporting: Holm done rightly, but one comparison has another value in the text than in the table.
const groups = [
  { name: 'quiet', n: 14, mean: 22.8, sd: 4.1 },
  { name: 'traffic', n: 14, mean: 27.0, sd: 4.6 },
  { name: 'pile driving', n: 14, mean: 31.5, sd: 4.4 },
]
const pairs = comparePairs(groups)
const adjusted = adjustPairs(pairs, 'holm')
const p = (i: number) => printP(adjusted[i] ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const gullRoostNoise: Story = {
  key: 'gull-roost-noise',
  manuscript: writePaper({
    title: 'Noise at a harbour roost and the vigilance of herring gulls',
    authors: 'Nuala Frisken, Odo Pellworth',
    runningHead: 'Noise and vigilance at a gull roost',
    layout: 'one column',
    lineNumbers: true,
    abstract: `Harbour works bring noise to roosts. We scored the vigilance of roosting herring gulls on 42 evenings under three sound conditions. Gulls looked up more often during pile driving than on quiet evenings (${p(1)}, Holm-adjusted).`,
    introduction: [
      'A roosting gull that looks up does not sleep. If noise raises vigilance, a season of works may cost birds rest at a time when they can least afford it.',
      'The building of the new quay at Tern Harbour gave us quiet evenings, evenings with road traffic alone and evenings with pile driving, in an order that the works office set without regard to the birds.',
    ],
    methods: [
      'On each of 42 evenings, fourteen of each kind, the share of one-minute scans with a raised head was scored for twenty focal birds between sunset and dark; the evening was the unit of analysis.',
      'The three conditions were compared pairwise by t tests on the pooled variance. P-values of the three pairwise comparisons were adjusted by the Holm procedure. We took 0.05 as the significance level.',
    ],
    results: [
      `Vigilance was higher during pile driving than on quiet evenings (${t(1)}, ${p(1)}) and than on evenings with traffic (${t(2)}, p = 0.033). It was also higher with traffic than on quiet evenings (${t(0)}, ${p(0)}).`,
      {
        caption: 'Table 1. Pairwise comparisons of vigilance (% of scans); p-values are Holm-adjusted.',
        header: ['Comparison', 'Difference', 't', 'df', 'Adjusted p'],
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
      'Pile driving kept gulls awake. The effect of traffic was smaller. Whether lost rest is made up for later in the night we cannot say.',
    ],
  }),
  results: {
    file: 'gull-roost-noise.csv',
    sheets: [
      {
        name: 'pairs',
        rows: [
          ['contrast', 'estimate', 't.ratio', 'df', 'p.value', 'p.holm'],
          ...pairs.map((pair, i) => [
            `${pair.a} - ${pair.b}`,
            pair.difference.toFixed(2),
            pair.t.toFixed(3),
            pair.df,
            pair.raw.toFixed(5),
            cellP(adjusted[i] ?? NaN, 4),
          ]),
        ],
      },
    ],
  },
  form: { alpha: 0.05, correction: 'Holm', primaryOutcome: 'Vigilance', note: '' },
}
