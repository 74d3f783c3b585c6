import { comparePairs, compareAll, fixed, printP, printT } from '@/scripts/demo/figures'
import { writePaper } from '@/scripts/demo/stories/story'
import { writeManuscript } from '@/scripts/demo/write-manuscript'
import { writeResults } from '@/scripts/demo/write-results'

// Four tanks give six pairs; the text corrects for three. The second difference does not survive six.
const groups = [
  { name: 'still water', n: 12, mean: 50.2, sd: 6.1 },
  { name: 'slow flow', n: 12, mean: 57.0, sd: 6.4 },
  { name: 'fast flow', n: 12, mean: 61.9, sd: 6.2 },
  { name: 'pulsed flow', n: 12, mean: 54.1, sd: 5.9 },
]
const all = compareAll(groups)
export const pairs = comparePairs(groups)
const corrected = pairs.map((pair) => Math.min(1, 3 * pair.raw))
const say = (i: number) => {
  const pair = pairs[i]
  return pair ? `${printT(pair)}, ${printP(corrected[i] ?? NaN)}` : ''
}

export const title = 'Water flow and the feeding of fan worms'

export const pdf = () =>
  writeManuscript(
    writePaper({
      title,
      authors: 'Sela Dorrimere',
      runningHead: 'Fan worms in flow',
      layout: 'one column',
      abstract: 'Fan worms filter water. We compared feeding in four flows.',
      introduction: ['Flow brings food.'],
      methods: [
        'Forty-eight worms, twelve in each of four flows, were filmed for an hour. All pairs of the four flows were compared by t tests on the pooled variance, and p-values were Bonferroni-corrected for three comparisons. The significance level was 0.05.',
      ],
      results: [
        `Feeding differed between flows, F(${all.df1}, ${all.df2}) = ${fixed(all.F, 2)}, ${printP(all.p)}. Feeding was significantly higher in fast flow than in still water (${say(1)}) and significantly higher in slow flow than in still water (${say(0)}). Fast and pulsed flow differed significantly (${say(5)}). There was no significant difference between still water and pulsed flow (${say(2)}), between slow and fast flow (${say(3)}) and between slow and pulsed flow (${say(4)}).`,
      ],
      discussion: ['Faster water fed the worms better.'],
    }),
  )

export const xlsx = () =>
  writeResults({
    file: 'flow.xlsx',
    sheets: [
      {
        name: 'Pairs',
        rows: [
          ['Comparison', 't', 'df', 'p', 'p adj (Bonferroni)'],
          ...pairs.map((pair, i) => [
            `${pair.a} vs ${pair.b}`,
            Number(pair.t.toFixed(3)),
            pair.df,
            Number(pair.raw.toFixed(5)),
            Number((corrected[i] ?? NaN).toFixed(4)),
          ]),
        ],
      },
    ],
  })
