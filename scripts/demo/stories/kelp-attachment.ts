import { adjustPairs, cellP, compareAll, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Correct: all six pairs, Bonferroni, adjusted values printed and used.
const groups = [
  { name: 'granite', n: 10, mean: 41.2, sd: 5.9 },
  { name: 'slate', n: 10, mean: 38.7, sd: 6.4 },
  { name: 'concrete', n: 10, mean: 31.5, sd: 5.2 },
  { name: 'oyster shell', n: 10, mean: 27.9, sd: 6.1 },
]
const all = compareAll(groups)
const pairs = comparePairs(groups)
const adjusted = adjustPairs(pairs, 'bonferroni')
const p = (i: number) => printP(adjusted[i] ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const kelpAttachment: Story = {
  key: 'kelp-attachment',
  manuscript: writePaper({
    title: 'Attachment strength of juvenile sugar kelp on four substrates in a tidal race',
    authors: 'Sela Dorrimere, Hanno Quillfeather',
    runningHead: 'Kelp attachment on four substrates',
    layout: 'one column',
    abstract: `Restoration of kelp needs substrates that hold in current. We grew juvenile sugar kelp on granite, slate, concrete and oyster shell for eleven weeks and measured the force at which the holdfast came loose. Attachment differed between substrates (F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}). Plants on granite held better than plants on oyster shell (${p(2)}, Bonferroni-adjusted). We recommend granite for the outer plots.`,
    introduction: [
      'A holdfast grips by growing into what it stands on. Rough and hard surfaces are thought to serve best, but the surfaces that are cheap to lay out, such as shell and concrete, have seldom been compared with rock in the same water.',
      'The narrows at Tern Harbour run at up to two metres a second on a spring tide, which makes them a hard test for a young plant. We asked whether attachment strength depends on the substrate and, if so, between which of the four.',
    ],
    methods: [
      'Forty plates of 20 by 20 cm, ten of each of four substrates, were seeded with spores from the same eight parents and hung at 3 m depth in random order. After eleven weeks one plant a plate, chosen by lot beforehand, was pulled at a right angle to the plate with a spring balance until it came loose; the force was read in newton by an observer who did not know the purpose of the study.',
      'Attachment strength was compared by one-way analysis of variance, followed by pairwise t tests on the pooled variance. All six pairwise comparisons between the four substrates were made, and their p-values were adjusted by the Bonferroni correction for six comparisons; adjusted values are given throughout. The significance level was 0.05, two-sided.',
    ],
    results: [
      `Attachment strength differed between the substrates (F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}). Plants on granite held better than plants on concrete (${t(1)}, ${p(1)}) and on oyster shell (${t(2)}, ${p(2)}). Plants on slate held better than plants on oyster shell (${t(4)}, ${p(4)}). Granite and slate did not differ significantly (${t(0)}, ${p(0)}), nor did slate and concrete (${t(3)}, ${p(3)}) or concrete and oyster shell (${t(5)}, ${p(5)}).`,
      {
        caption:
          'Table 1. Pairwise differences in attachment strength (N) between substrates, with Bonferroni-adjusted p-values.',
        header: ['Comparison', 'Difference', 'SE', 't', 'df', 'Adjusted p'],
        rows: pairs.map((pair, i) => [
          `${pair.a} vs ${pair.b}`,
          fixed(pair.difference, 1),
          pair.se.toFixed(2),
          fixed(pair.t, 2),
          String(pair.df),
          cellP(adjusted[i] ?? NaN),
        ]),
      },
    ],
    discussion: [
      'Rock held young kelp better than shell did. The difference between slate and concrete pointed the same way but could not be told from chance with ten plates a group.',
      'The plates hung free of the bottom, so that grazing played no part; on the sea bed the order may be another. For the outer plots, where current is the chief danger, granite is the safer choice.',
    ],
  }),
  results: {
    file: 'kelp-attachment.csv',
    sheets: [
      {
        name: 'pairs',
        rows: [
          ['Comparison', 'estimate', 'SE', 'df', 't', 'p', 'p adj (Bonferroni)'],
          ...pairs.map((pair, i) => [
            `${pair.a} vs ${pair.b}`,
            pair.difference.toFixed(2),
            pair.se.toFixed(3),
            pair.df,
            pair.t.toFixed(3),
            pair.raw.toFixed(5),
            cellP(adjusted[i] ?? NaN, 4),
          ]),
        ],
      },
    ],
  },
  form: {
    alpha: 0.05,
    correction: 'Bonferroni, six pairwise comparisons',
    primaryOutcome: 'Attachment strength',
    note: '',
  },
}
