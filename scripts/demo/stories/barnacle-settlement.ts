import { adjust, tail } from '@/lib/checks'
import { cellP, fixed } from '../figures'
import { writePaper, type Story } from './story'

// Correct: twelve traits, exploratory, false discovery rate by Benjamini and Hochberg.
const df = 46
const traits: [string, number][] = [
  ['base diameter', 3.61],
  ['shell height', 2.94],
  ['opercular width', 1.12],
  ['cirral beat', -3.17],
  ['closing time', 0.48],
  ['dry mass', 2.71],
  ['brood size', 1.63],
  ['settling depth', -0.35],
  ['distance to neighbour', -2.58],
  ['growth rate', 3.32],
  ['shell porosity', -0.91],
  ['colour score', 0.17],
]
const raw = traits.map(([, t]) => tail('t', t, [df]))
const q = adjust('bh', raw)
const found = q.filter((value) => value < 0.05).length

export const barnacleSettlement: Story = {
  key: 'barnacle-settlement',
  manuscript: writePaper({
    title: 'Twelve traits of barnacles on rough and smooth panels: an exploratory survey',
    authors: 'Corin Athelwick, Nuala Frisken',
    runningHead: 'Traits of barnacles on two panels',
    layout: 'two columns',
    abstract: `Which traits of barnacles go with the roughness of the ground is not known. In an exploratory survey we compared twelve traits between rough and smooth panels, 24 panels of each kind. At a false discovery rate of 5 %, ${found} traits differed.`,
    introduction: [
      'Barnacles settle where they can hold. We surveyed traits without a prior hypothesis, to find those worth a planned study.',
    ],
    methods: [
      'Forty-eight panels, half of them rough, hung for one season. Twelve traits were measured on the barnacle nearest to the centre of each panel.',
      'Each trait was compared between panel types by a t test. The twelve p-values were adjusted by the Benjamini–Hochberg procedure, and traits with an adjusted value below 0.05 are reported as different, which controls the false discovery rate at 5 %.',
    ],
    results: [
      `At a false discovery rate of 5 %, ${found} of the twelve traits differed between rough and smooth panels (Table 1).`,
      {
        caption:
          'Table 1. Rough against smooth panels: twelve traits with raw and Benjamini–Hochberg-adjusted p-values.',
        header: ['Trait', 't', 'df', 'p', 'Adjusted p'],
        rows: traits.map(([name, t], i) => [
          name,
          fixed(t, 2),
          String(df),
          cellP(raw[i] ?? NaN),
          cellP(q[i] ?? NaN),
        ]),
      },
    ],
    discussion: ['The survey points to size and growth. It was not planned to confirm any single trait.'],
  }),
  results: {
    file: 'barnacle-settlement.xlsx',
    sheets: [
      {
        name: 'Traits',
        rows: [
          ['trait', 't', 'df', 'p', 'p adj (BH)'],
          ...traits.map(([name, t], i) => [
            name,
            t,
            df,
            Number((raw[i] ?? NaN).toFixed(5)),
            Number((q[i] ?? NaN).toFixed(5)),
          ]),
        ],
      },
    ],
  },
  form: {
    alpha: 0.05,
    correction: 'Benjamini–Hochberg over twelve traits',
    primaryOutcome: '',
    note: 'Exploratory.',
  },
}
