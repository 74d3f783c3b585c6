import { expect } from 'vitest'
import { writeSummaryScript } from '@/lib/checks/r-script/summary-script'
import type { SummaryGroup } from '@/lib/checks/summary/groups'
import { summarize } from '@/lib/checks/summary/summarize'
import { runR, testWithR } from '../support/rscript'

// R computes again what the calculator shows of groups; the groups are invented.

const printed: SummaryGroup[] = [
  { group: 'granite', n: 10, mean: 41.2, sd: 5.9, meanDecimals: 1, spreadDecimals: 1 },
  { group: '"slate"; stop()', n: 12, mean: 38.7, sd: 6.4, meanDecimals: 1, spreadDecimals: 1 },
  { group: 'concrete', n: 8, mean: 33.1, sd: 5.2, meanDecimals: 1, spreadDecimals: 1 },
  { group: 'oyster shell', n: 10, mean: 29.4, sd: 6.1, meanDecimals: 1, spreadDecimals: 1 },
]
const withErrors = printed.map(({ group, n, mean, sd = 0 }): SummaryGroup => ({ group, n, mean, se: sd / 3 }))

testWithR('R agrees with all pairs and with a control, printed or exact, from sd or se', () => {
  for (const groups of [printed, withErrors]) {
    for (const options of [{}, { control: 'concrete', alpha: 0.01 }]) {
      expect(runR(writeSummaryScript(groups, summarize(groups, options))).trim()).toBe('agrees')
    }
  }
})

testWithR('R tells a number that was changed', () => {
  const summary = summarize(printed)
  const [one] = summary.comparisons
  if (one) one.difference += 0.001
  expect(() => runR(writeSummaryScript(printed, summary))).toThrow(/ended with 1/)
})
