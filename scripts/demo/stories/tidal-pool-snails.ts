import { tail } from '@/lib/checks'
import { cellP, fixed, printP } from '../figures'
import { writePaper, type Story } from './story'

// Faulty: eight correlations, none corrected, and a conclusion that rests on "at least one".
const n = 36
const behaviours = [
  { name: 'crawling speed', r: 0.37 },
  { name: 'time above water', r: -0.35 },
  { name: 'refuge use', r: 0.12 },
  { name: 'grazing bouts', r: 0.21 },
  { name: 'righting time', r: -0.09 },
  { name: 'clustering', r: 0.34 },
  { name: 'response to touch', r: -0.17 },
  { name: 'homing', r: 0.05 },
]
const p = behaviours.map(({ r }) => tail('r', r, [n - 2]))
const say = (i: number) => {
  const b = behaviours[i]
  return b ? `r(${n - 2}) = ${fixed(b.r, 2)}, ${printP(p[i] ?? NaN)}` : ''
}

export const tidalPoolSnails: Story = {
  key: 'tidal-pool-snails',
  manuscript: writePaper({
    title: 'Shell length and eight behaviours of snails in tidal pools',
    authors: 'Odo Pellworth, Corin Athelwick',
    runningHead: 'Size and behaviour of pool snails',
    layout: 'two columns',
    abstract: `Large snails may behave differently from small ones. In 36 snails we related shell length to eight behaviours. Shell length was significantly correlated with crawling speed (${say(0)}), time above water (${say(1)}) and clustering (${say(5)}), which shows that size shapes behaviour in this species.`,
    introduction: [
      'Snails of tidal pools range fourfold in length. Whether behaviour goes with size is not known, and we had no expectation which behaviour might.',
    ],
    methods: [
      'Thirty-six snails from one pool were measured and watched singly for thirty minutes in a tank. Eight behaviours were scored.',
      'The correlation of shell length with each of the eight behaviours was tested by Pearson’s r. P < 0.05 was considered significant.',
    ],
    results: [
      `Shell length was significantly correlated with crawling speed (${say(0)}), with time above water (${say(1)}) and with clustering (${say(5)}). It was not correlated with refuge use (${say(2)}), grazing bouts (${say(3)}), righting time (${say(4)}), response to touch (${say(6)}) or homing (${say(7)}).`,
      {
        caption: 'Table 1. Correlation of shell length with eight behaviours (36 snails).',
        header: ['Behaviour', 'r', 'df', 'p'],
        rows: behaviours.map((b, i) => [b.name, fixed(b.r, 2), String(n - 2), cellP(p[i] ?? NaN)]),
      },
    ],
    discussion: [
      'Three of eight behaviours went with size. We conclude that size shapes behaviour in this species; how it does so remains to be shown.',
    ],
  }),
  results: {
    file: 'tidal-pool-snails.csv',
    sheets: [
      {
        name: 'correlations',
        rows: [
          ['behaviour', 'r', 'n', 'p'],
          ...behaviours.map((b, i) => [b.name, b.r.toFixed(3), n, (p[i] ?? NaN).toFixed(4)]),
        ],
      },
    ],
  },
  form: { alpha: 0.05, correction: '', primaryOutcome: '', note: '' },
}
