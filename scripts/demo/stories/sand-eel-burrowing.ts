import { pTukeyFromT } from '@/lib/checks/procedures/tukey'
import { cellP, compareAll, comparePairs, fixed, printP, printT } from '../figures'
import { writePaper, type Story } from './story'

// Correct: three sediments, Tukey's HSD.
const groups = [
  { name: 'coarse sand', n: 16, mean: 4.1, sd: 1.2 },
  { name: 'fine sand', n: 16, mean: 5.4, sd: 1.4 },
  { name: 'muddy sand', n: 16, mean: 7.2, sd: 1.5 },
]
const all = compareAll(groups)
const pairs = comparePairs(groups)
const adjusted = pairs.map((pair) => pTukeyFromT(pair.t, groups.length, pair.df))
const p = (i: number) => printP(adjusted[i] ?? NaN)
const t = (i: number) => {
  const pair = pairs[i]
  return pair ? printT(pair) : ''
}

export const sandEelBurrowing: Story = {
  key: 'sand-eel-burrowing',
  manuscript: writePaper({
    title: 'How fast sand eels burrow into three sediments',
    authors: 'Ifor Lunt',
    runningHead: 'Burrowing of sand eels',
    layout: 'one column',
    lineNumbers: true,
    abstract: `Sand eels escape by burrowing. We timed 48 fish in three sediments. Fish needed longer in muddy sand than in coarse sand (${p(1)}) and in fine sand (${p(2)}, Tukey’s HSD).`,
    introduction: [
      'Sand eels are picky about where they lie. If some sands take longer to enter, they are also more dangerous.',
    ],
    methods: [
      'Forty-eight fish were released singly over one of three sediments, sixteen a sediment, and the time from release to full cover was taken from film in seconds.',
      'Burrowing times were compared by analysis of variance followed by Tukey’s HSD test for all three pairs; p-values are those of Tukey’s test. Alpha was 0.05.',
    ],
    results: [
      `Burrowing time depended on the sediment, F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}. Fish were slower in muddy sand than in coarse sand (${t(1)}, ${p(1)}) and than in fine sand (${t(2)}, ${p(2)}), and slower in fine than in coarse sand (${t(0)}, ${p(0)}).`,
      {
        caption: 'Table 1. Pairwise differences in burrowing time (s); p-values from Tukey’s HSD.',
        header: ['Comparison', 'Difference', 't', 'df', 'p (Tukey)'],
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
      'The finer the sediment, the longer the burrowing. In the field fish may choose sand for this reason.',
    ],
  }),
  results: null,
  form: { alpha: 0.05, correction: 'Tukey HSD, three pairs', primaryOutcome: 'Burrowing time', note: '' },
}
