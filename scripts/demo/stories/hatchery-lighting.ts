import { adjustPairs, cellP, compareAll, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Faulty: four groups give six pairs, but the correction counts four; one call does not survive six.
const groups = [
  { name: 'darkness', n: 12, mean: 61.4, sd: 6.8 },
  { name: 'dim blue', n: 12, mean: 68.9, sd: 7.1 },
  { name: 'dim red', n: 12, mean: 64.2, sd: 6.3 },
  { name: 'full spectrum', n: 12, mean: 73.6, sd: 7.4 },
]
const all = compareAll(groups)
const pairs = comparePairs(groups)
const printed = adjustPairs(pairs, 'bonferroni').map((_, i) => Math.min(1, 4 * (pairs[i]?.raw ?? NaN)))
const p = (i: number) => printP(printed[i] ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const hatcheryLighting: Story = {
  key: 'hatchery-lighting',
  manuscript: writePaper({
    title: 'Light in the hatchery: survival of oyster larvae under four lighting regimes',
    authors: 'Corin Athelwick, Brede Sandholm, Ifor Lunt',
    runningHead: 'Oyster larvae under four lights',
    layout: 'two columns',
    abstract: `Hatcheries keep oyster larvae in the dark, in dim colour or in full light, mostly by habit. We counted survivors to settlement in 48 tanks under four lighting regimes. Survival was higher under full spectrum than in darkness (${p(2)}) and under dim blue than in darkness (${p(0)}), both after Bonferroni correction. Hatcheries may gain by giving up darkness.`,
    introduction: [
      'Larvae of the native oyster swim for about two weeks before they settle. Whether light helps or harms them in this time is disputed, and hatcheries differ in what they do.',
      'We compared four regimes that can be had with common lamps. The outcome of interest was survival to settlement.',
    ],
    methods: [
      'Forty-eight tanks of 10 litres were stocked with 2,000 larvae each and kept for fifteen days in darkness, dim blue, dim red or full spectrum light, twelve tanks a regime, drawn by lot. Survivors were counted from photographs by two persons independently and the mean was used.',
      'Groups were compared by analysis of variance and by pairwise t tests on the pooled variance. As four groups were studied, p-values were Bonferroni-corrected for four comparisons. Corrected values below 0.05 were taken as significant.',
    ],
    results: [
      `Survival depended on the regime, F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}. After correction survival was significantly higher under full spectrum than in darkness, ${t(2)}, ${p(2)}, and than under dim red, ${t(5)}, ${p(5)}. It was also significantly higher under dim blue than in darkness, ${t(0)}, ${p(0)}. The other comparisons were not significant: darkness and dim red, ${t(1)}, ${p(1)}; dim blue and dim red, ${t(3)}, ${p(3)}; dim blue and full spectrum, ${t(4)}, ${p(4)}.`,
      {
        caption: 'Table 1. Survival to settlement (%) by lighting regime.',
        header: ['Regime', 'n', 'Mean', 'SD'],
        rows: groups.map((g) => [g.name, String(g.n), g.mean.toFixed(1), g.sd.toFixed(1)]),
      },
    ],
    discussion: [
      'Two of the three lit regimes did better than darkness. Dim blue light is cheap and does not warm the water, so that it may be the better buy even though full spectrum gave the highest counts.',
      'All larvae came from one spawning. A second season with other parents is under way.',
    ],
  }),
  results: {
    file: 'hatchery-lighting.xlsx',
    sheets: [
      {
        name: 'Pairwise',
        rows: [
          ['Survival to settlement, pairwise t tests'],
          [],
          ['Group 1', 'Group 2', 'Mean difference', 't', 'df', 'p (uncorrected)', 'p (corrected)'],
          ...pairs.map((pair, i) => [
            pair.a,
            pair.b,
            Number(pair.difference.toFixed(2)),
            Number(pair.t.toFixed(3)),
            pair.df,
            Number(pair.raw.toFixed(5)),
            cellP(printed[i] ?? NaN, 4),
          ]),
        ],
      },
      {
        name: 'Groups',
        rows: [['Regime', 'n', 'Mean', 'SD'], ...groups.map((g) => [g.name, g.n, g.mean, g.sd])],
      },
    ],
  },
  form: {
    alpha: 0.05,
    correction: 'Bonferroni for four comparisons',
    primaryOutcome: 'Survival to settlement',
    note: 'A second season will follow.',
  },
}
