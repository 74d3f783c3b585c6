import { cellP, compareAll, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Faulty: values are printed as Bonferroni-adjusted, but they are the raw ones.
const groups = [
  { name: 'dense meadow', n: 11, mean: 2.84, sd: 0.62 },
  { name: 'sparse meadow', n: 11, mean: 2.27, sd: 0.55 },
  { name: 'replanted plot', n: 11, mean: 2.22, sd: 0.58 },
  { name: 'bare sand', n: 11, mean: 1.7, sd: 0.49 },
]
const all = compareAll(groups)
const pairs = comparePairs(groups)
const p = (i: number) => printP(pairs[i]?.raw ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const seagrassSediment: Story = {
  key: 'seagrass-sediment',
  manuscript: writePaper({
    title: 'Organic carbon in sediment under dense, sparse and replanted seagrass',
    authors: 'Brede Sandholm, Nuala Frisken',
    runningHead: 'Carbon under seagrass',
    layout: 'one column',
    abstract: `Seagrass stores carbon in the sand beneath it. We took 44 cores from four kinds of bottom in Tern Bay. Organic carbon was higher under dense meadow than under sparse meadow (Bonferroni-adjusted ${p(0)}) and than in replanted plots (Bonferroni-adjusted ${p(1)}), and lowest in bare sand. Four years after planting, replanted plots had not caught up.`,
    introduction: [
      'Replanting of seagrass is paid for partly by the carbon that it is hoped to store. How soon a replanted plot stores as much as an old meadow is therefore of interest beyond the bay.',
      'We compared organic carbon in the top 20 cm of sediment under dense meadow, sparse meadow, plots replanted four years ago and bare sand.',
    ],
    methods: [
      'Eleven cores were taken at random positions from each of the four kinds of bottom within one week in June. Organic carbon was measured by loss on ignition and is given in per cent of dry mass.',
      'After analysis of variance all pairs of bottom types were compared by t tests on the pooled variance. A Bonferroni correction for the six comparisons was applied and adjusted p-values are reported; values below 0.05 were considered significant.',
    ],
    results: [
      `Organic carbon differed between bottom types (F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}). It was significantly higher under dense meadow than under sparse meadow (${t(0)}, adjusted ${p(0)}), in replanted plots (${t(1)}, adjusted ${p(1)}) and in bare sand (${t(2)}, adjusted ${p(2)}). Sparse meadow had significantly more than bare sand (${t(4)}, adjusted ${p(4)}), and so had replanted plots (${t(5)}, adjusted ${p(5)}). Sparse meadow and replanted plots did not differ (${t(3)}, adjusted ${p(3)}).`,
      {
        caption: 'Table 1. Pairwise comparisons of organic carbon (% of dry mass). p: Bonferroni-adjusted.',
        header: ['Comparison', 'Difference', 'SE', 't', 'df', 'Adjusted p'],
        rows: pairs.map((pair) => [
          `${pair.a} vs ${pair.b}`,
          fixed(pair.difference, 2),
          pair.se.toFixed(3),
          fixed(pair.t, 2),
          String(pair.df),
          cellP(pair.raw),
        ]),
      },
    ],
    discussion: [
      'Dense meadow held the most carbon. That replanted plots lag behind fits with the slow growth of rhizomes. Cores were taken in one week only, and the season matters.',
    ],
  }),
  results: null,
  form: {
    alpha: 0.05,
    correction: 'Bonferroni, six comparisons',
    primaryOutcome: 'Organic carbon',
    note: 'The raw table can be sent on request.',
  },
}
