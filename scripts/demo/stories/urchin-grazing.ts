import { writePaper, type Story } from './story'

// Cannot be decided: 0.008 stands for 0.0075 to 0.0085, and times six that lies on both sides of 0.05.
const rows: [string, string, string][] = [
  ['red algae', 'brown algae', '0.002'],
  ['red algae', 'green algae', '0.008'],
  ['red algae', 'biofilm', '0.31'],
  ['brown algae', 'green algae', '0.74'],
  ['brown algae', 'biofilm', '0.022'],
  ['green algae', 'biofilm', '0.19'],
]

export const urchinGrazing: Story = {
  key: 'urchin-grazing',
  manuscript: writePaper({
    title: 'Grazing of green sea urchins on four diets',
    authors: 'Nuala Frisken, Hanno Quillfeather',
    runningHead: 'Urchins on four diets',
    layout: 'two columns',
    abstract:
      'Green sea urchins eat what they find. We weighed what 40 urchins ate of four diets. Urchins ate more red than brown algae (p = 0.002) and more red than green algae (p = 0.008), both significant after Bonferroni correction.',
    introduction: ['Urchins can turn a kelp bed into bare rock. What they prefer decides where they do it.'],
    methods: [
      'Forty urchins, ten on each of four diets, were fed for five days; eaten mass was weighed daily and averaged. Diets were compared pairwise by rank-sum tests because the data were skewed.',
      'All six pairwise comparisons were Bonferroni-corrected: an uncorrected p-value was called significant when it was below 0.05/6. The p-values reported are uncorrected.',
    ],
    results: [
      'More was eaten of red than of brown algae (p = 0.002) and of red than of green algae (p = 0.008); both differences were significant after correction. None of the other four comparisons was significant (Table 1).',
      {
        caption: 'Table 1. Uncorrected p-values of the six pairwise comparisons of diets.',
        header: ['Comparison', 'p'],
        rows: rows.map(([a, b, p]) => [`${a} vs ${b}`, p]),
      },
    ],
    discussion: [
      'Red algae were preferred. The diets differed in water content, which we did not correct for.',
    ],
  }),
  results: null,
  form: { alpha: 0.05, correction: 'Bonferroni, six pairs', primaryOutcome: 'Eaten mass', note: '' },
}
