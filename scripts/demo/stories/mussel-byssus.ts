import { cellP, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Faulty: 0.05 / 6 is 0.0083, the level used is 0.01, and one call lies between the two.
const groups = [
  { name: '8 °C', n: 10, mean: 18.6, sd: 3.4 },
  { name: '12 °C', n: 10, mean: 22.7, sd: 3.6 },
  { name: '16 °C', n: 10, mean: 24.1, sd: 3.3 },
  { name: '20 °C', n: 10, mean: 19.85, sd: 3.5 },
]
const pairs = comparePairs(groups)
const p = (i: number) => printP(pairs[i]?.raw ?? NaN, 4)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const musselByssus: Story = {
  key: 'mussel-byssus',
  manuscript: writePaper({
    title: 'Water temperature and the strength of mussel byssus',
    authors: 'Hanno Quillfeather, Brede Sandholm',
    runningHead: 'Temperature and byssus strength',
    layout: 'one column',
    abstract: `Mussels hold by threads. We kept mussels for six weeks at four temperatures and pulled them off. Threads were stronger at 16 °C than at 8 °C (${p(1)}) and than at 20 °C (${p(5)}); both differences passed the corrected level.`,
    introduction: [
      'Warm summers have been followed by losses of mussels from ropes. Whether the threads themselves weaken in warm water is not settled.',
    ],
    methods: [
      'Forty mussels, ten at each of four temperatures, were kept for six weeks in running sea water and then pulled off at constant speed. The outcome was the force per thread in arbitrary units.',
      'All six pairs of temperatures were compared by t tests on the pooled variance with 36 degrees of freedom. The significance level was lowered by the Bonferroni method to 0.05/6 = 0.01. The p-values given are uncorrected and are to be held against this level.',
    ],
    results: [
      `At the corrected level of 0.01 threads were significantly stronger at 16 °C than at 8 °C (${t(1)}, ${p(1)}) and at 16 °C than at 20 °C (${t(5)}, ${p(5)}). The difference between 8 °C and 12 °C (${t(0)}, ${p(0)}) was not significant, nor were those between 8 °C and 20 °C (${t(2)}, ${p(2)}), between 12 °C and 16 °C (${t(3)}, ${p(3)}) and between 12 °C and 20 °C (${t(4)}, ${p(4)}).`,
      {
        caption: 'Table 1. Pairwise comparisons of force per thread; p-values are uncorrected.',
        header: ['Comparison', 'Difference', 't', 'df', 'p'],
        rows: pairs.map((pair) => [
          `${pair.a} vs ${pair.b}`,
          fixed(pair.difference, 1),
          fixed(pair.t, 2),
          String(pair.df),
          cellP(pair.raw, 4),
        ]),
      },
    ],
    discussion: [
      'Threads were strongest at a middle temperature. Warm summers may weaken the hold of mussels on ropes, but 20 °C was not worse than 8 °C.',
    ],
  }),
  results: null,
  form: { alpha: 0.05, correction: 'Bonferroni, level 0.05/6', primaryOutcome: 'Force per thread', note: '' },
}
